import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { http, HttpResponse, type JsonBodyType } from 'msw';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import type { Program } from '@slighthill/shared/contracts/clinic';
import type { Patient } from '@slighthill/shared/contracts/patient';
import type { TrendResponse } from '@slighthill/shared/contracts/trend';
import type { Problem } from '@slighthill/shared/errors';
import { createQueryClient } from '../../../lib/query-client';
import { SessionContext } from '../../../lib/session';
import { coordinator } from '../../../testing/people';
import { server } from '../../../testing/server';
import { Component as DetailsPage } from '../details-page';
import { RecordPage } from '../record-page';
import { Component as SummaryPage } from '../summary-page';

export interface Seen {
  method: string;
  path: string;
  query: Record<string, string>;
  body: unknown;
}

interface World {
  patient?: Patient | Problem;
  /** In order; the last one stays. */
  trends?: (TrendResponse | Problem)[];
  programs?: Program[];
  /** Answers to writes by path; null is 204. */
  writes?: Record<string, JsonBodyType | Problem>;
}

const respond = (value: object | null): Response => {
  if (value === null) return new HttpResponse(null, { status: 204 });
  if (!('status' in value) || !('detail' in value)) return HttpResponse.json(value);
  return HttpResponse.json(value, {
    status: Number(value.status),
    headers: { 'content-type': 'application/problem+json' },
  });
};

/** One record at an address, with the API's answers planned; returns what was asked of it. */
export const renderRecord = (address: string, world: World) => {
  const seen: Seen[] = [];
  const note = async (request: Request): Promise<Seen> => {
    const url = new URL(request.url);
    const text = await request.text();
    const entry = {
      method: request.method,
      path: url.pathname,
      query: Object.fromEntries(url.searchParams),
      body: text === '' ? undefined : (JSON.parse(text) as unknown),
    };
    seen.push(entry);
    return entry;
  };
  let trendsAsked = 0;
  server.use(
    http.get('*/api/patients/:id', async ({ request }) => {
      await note(request);
      const { patient } = world;
      return respond(patient && 'detail' in patient ? patient : { patient });
    }),
    http.get('*/api/patients/:id/trends', async ({ request }) => {
      await note(request);
      const answers = world.trends ?? [];
      trendsAsked += 1;
      return respond(
        answers[Math.min(trendsAsked, answers.length) - 1] ?? { pattern: null, enrollment: null, series: [] },
      );
    }),
    http.get('*/api/programs', () => HttpResponse.json({ items: world.programs ?? [], nextCursor: null })),
    ...(['post', 'patch'] as const).map((method) =>
      http[method]('*/api/*', async ({ request }) => {
        const { path } = await note(request);
        const answer = world.writes?.[path];
        return respond((answer ?? null) as object | null);
      }),
    ),
  );
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retry: false } });
  const router = createMemoryRouter(
    [
      {
        path: '/patients/:patientId',
        element: <RecordPage recordMenu={() => <button type="button">Record</button>} />,
        children: [
          { path: 'summary', element: <SummaryPage /> },
          { path: 'details', element: <DetailsPage /> },
          { path: 'tests/:kind/:testId', element: <p>The test itself</p> },
        ],
      },
    ],
    { initialEntries: [address] },
  );
  const { unmount } = render(
    <QueryClientProvider client={client}>
      <SessionContext value={coordinator}>
        <RouterProvider router={router} />
      </SessionContext>
    </QueryClientProvider>,
  );
  return {
    user: userEvent.setup(),
    seen,
    unmount,
    address: () => `${router.state.location.pathname}${router.state.location.search}`,
  };
};
