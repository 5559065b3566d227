import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { createQueryClient } from '../../../lib/query-client';
import { SessionContext } from '../../../lib/session';
import { coordinator } from '../../../testing/people';
import { plan, type Seen } from './record-api';
import { prediction } from './record-data';

export interface RecordRequests {
  kept: Seen[];
  discarded: Seen[];
  predicted: Seen[];
}

/** The answers most drawers need: no draft, no earlier test, predictions. */
export const planQuietRecord = (): RecordRequests => {
  plan('GET /api/drafts/:form/:id', { draft: null });
  plan('GET /api/patients/:id/tests', { items: [], nextCursor: null });
  return {
    kept: plan('PUT /api/drafts/:form/:id', { draft: null }),
    discarded: plan('DELETE /api/drafts/:form/:id', null),
    predicted: plan('POST /api/predictions', prediction),
  };
};

/** A piece of the record at its address, signed in as a coordinator. */
export const renderRecord = (element: ReactNode, path = '/patients/x/tests', at = path) => {
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retry: false } });
  const router = createMemoryRouter(
    [
      { path, element },
      { path: '*', element: <p>Elsewhere</p> },
    ],
    { initialEntries: [at] },
  );
  const view = render(
    <QueryClientProvider client={client}>
      <SessionContext value={coordinator}>
        <RouterProvider router={router} />
      </SessionContext>
    </QueryClientProvider>,
  );
  return { ...view, user: userEvent.setup(), router };
};
