import type { Draft } from '@slighthill/shared/contracts/draft';
import type { fileEntryDetail, fileEntryList, fileEntryResponse } from '@slighthill/shared/contracts/file-entry';
import type {
  bodySizeResponse,
  measurementDetail,
  measurementResponse,
  testList,
} from '@slighthill/shared/contracts/measurement';
import type { patientResponse } from '@slighthill/shared/contracts/patient';
import type { PredictionResponse } from '@slighthill/shared/contracts/prediction';
import type { spirometryCreated, spirometryTestDetail } from '@slighthill/shared/contracts/spirometry-test';
import type { Problem } from '@slighthill/shared/errors';
import { http, HttpResponse, type JsonBodyType } from 'msw';
import type { z } from 'zod';
import { server } from '../../../testing/server';

/** What each address of a record answers, by the contracts; a colon stands for any id. */
interface RecordAnswers {
  'GET /api/patients/:id': z.infer<typeof patientResponse>;
  'GET /api/patients/:id/tests': z.infer<typeof testList>;
  'GET /api/patients/:id/file-entries': z.infer<typeof fileEntryList>;
  'POST /api/patients/:id/file-entries': z.infer<typeof fileEntryResponse>;
  'GET /api/file-entries/:id': z.infer<typeof fileEntryDetail>;
  'POST /api/file-entries/:id/release': z.infer<typeof fileEntryResponse>;
  'GET /api/spirometry-tests/:id': z.infer<typeof spirometryTestDetail>;
  'POST /api/spirometry-tests/:id/void': z.infer<typeof spirometryTestDetail>;
  'POST /api/spirometry-tests/:id/amend': z.infer<typeof spirometryTestDetail>;
  'GET /api/measurements/:id': z.infer<typeof measurementDetail>;
  'POST /api/patients/:id/spirometry-tests': z.infer<typeof spirometryCreated>;
  'POST /api/patients/:id/measurements': z.infer<typeof measurementResponse>;
  'POST /api/patients/:id/body-sizes': z.infer<typeof bodySizeResponse>;
  'POST /api/predictions': PredictionResponse;
  'GET /api/drafts/:form/:id': { draft: Draft | null };
  'PUT /api/drafts/:form/:id': { draft: Draft | null };
  'DELETE /api/drafts/:form/:id': null;
}

type Address = keyof RecordAnswers;
type Reply<At extends Address> = RecordAnswers[At] | Problem | 'unreachable';

export interface Seen {
  path: string;
  body: Record<string, unknown> | undefined;
}

const isProblem = (value: unknown): value is Problem =>
  typeof value === 'object' && value !== null && 'type' in value && 'detail' in value && 'status' in value;

const respond = (value: unknown): Response => {
  if (value === 'unreachable') return HttpResponse.error();
  if (value === null) return new HttpResponse(null, { status: 204 });
  if (!isProblem(value)) return HttpResponse.json(value as JsonBodyType);
  return HttpResponse.json(value, { status: value.status, headers: { 'content-type': 'application/problem+json' } });
};

/** Plans the answers of one address, in order; the last one stays. Returns the requests it saw. */
export const plan = <At extends Address>(at: At, ...replies: [Reply<At>, ...Reply<At>[]]): Seen[] => {
  const seen: Seen[] = [];
  const [method = 'GET', path = '/'] = at.split(' ');
  const handle = { GET: http.get, POST: http.post, PUT: http.put, DELETE: http.delete }[method] ?? http.get;
  server.use(
    handle(`*${path}`, async ({ request }) => {
      const text = await request.text();
      const body = text === '' ? undefined : (JSON.parse(text) as Record<string, unknown>);
      seen.push({ path: new URL(request.url).pathname, body });
      return respond(replies[Math.min(seen.length, replies.length) - 1]);
    }),
  );
  return seen;
};
