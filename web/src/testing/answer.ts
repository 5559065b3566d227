import type { Problem } from '@slighthill/shared/errors';
import type { Invitation, userResponse } from '@slighthill/shared/contracts/auth';
import type {
  auditList,
  clinicResponse,
  programList,
  staffUserCreated,
  userList,
} from '@slighthill/shared/contracts/clinic';
import type { MeHome } from '@slighthill/shared/contracts/me';
import type { duplicateList, patientList, patientResponse } from '@slighthill/shared/contracts/patient';
import { http, HttpResponse, type JsonBodyType } from 'msw';
import { server } from './server';

type Parsed<Schema extends { _output: unknown }> = Schema['_output'];

/** What each address answers, by the contracts; a test cannot plan an answer the API could not give. */
interface Answers {
  'GET /api/auth/me': Parsed<typeof userResponse>;
  'POST /api/auth/sign-in': Parsed<typeof userResponse>;
  'POST /api/auth/sign-out': null;
  'POST /api/auth/activity': null;
  'POST /api/auth/invitation/look-up': Invitation;
  'POST /api/auth/invitation/accept': Parsed<typeof userResponse>;
  'GET /api/patients': Parsed<typeof patientList>;
  'POST /api/patients': Parsed<typeof patientResponse>;
  'GET /api/patients/:id': Parsed<typeof patientResponse>;
  'POST /api/patients/duplicate-check': Parsed<typeof duplicateList>;
  'GET /api/users': Parsed<typeof userList>;
  'POST /api/users': Parsed<typeof staffUserCreated>;
  'GET /api/programs': Parsed<typeof programList>;
  'GET /api/clinic': Parsed<typeof clinicResponse>;
  'PATCH /api/clinic': Parsed<typeof clinicResponse>;
  'GET /api/audit-events': Parsed<typeof auditList>;
  'GET /api/me/home': MeHome;
}

export type Address = keyof Answers;

export interface SeenRequest {
  url: URL;
  body: unknown;
}

type Answer<At extends Address> = Answers[At] | Problem | 'unreachable';

const isProblem = (value: unknown): value is Problem =>
  typeof value === 'object' && value !== null && 'type' in value && 'detail' in value && 'status' in value;

const respond = (value: unknown): Response => {
  if (value === 'unreachable') return HttpResponse.error();
  if (value === null) return new HttpResponse(null, { status: 204 });
  if (!isProblem(value)) return HttpResponse.json(value as JsonBodyType);
  const retryAfter: Record<string, string> = value.status === 429 ? { 'retry-after': '120' } : {};
  return HttpResponse.json(value, {
    status: value.status,
    headers: { 'content-type': 'application/problem+json', ...retryAfter },
  });
};

/** Plans the answers of one address, in order; the last one stays. Returns the requests it saw. */
export const answer = <At extends Address>(at: At, ...answers: [Answer<At>, ...Answer<At>[]]): SeenRequest[] => {
  const seen: SeenRequest[] = [];
  const [method = 'GET', path = '/'] = at.split(' ');
  const handle = http[method === 'GET' ? 'get' : method === 'PATCH' ? 'patch' : 'post'];
  server.use(
    handle(`*${path}`, async ({ request }) => {
      const text = await request.text();
      seen.push({ url: new URL(request.url), body: text === '' ? undefined : JSON.parse(text) });
      return respond(answers[Math.min(seen.length, answers.length) - 1]);
    }),
  );
  return seen;
};
