import { QueryClientProvider } from '@tanstack/react-query';
import type { CurrentUser } from '@slighthill/shared/contracts/auth';
import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { routes } from '../app/routes';
import { createQueryClient } from '../lib/query-client';
import { answer, type SeenRequest } from './answer';
import { problem } from './problem';

interface RenderedApp {
  user: ReturnType<typeof userEvent.setup>;
  /** Where the app is now: path and search. */
  address: () => string;
  /** The keep-alives it sent. */
  activity: SeenRequest[];
}

/** The whole app at an address, signed in as someone or as nobody. */
export const renderApp = (path: string, signedIn: CurrentUser | null): RenderedApp => {
  answer('GET /api/auth/me', signedIn ? { user: signedIn } : problem('not-signed-in', 'Sign in to go on.'));
  const activity = answer('POST /api/auth/activity', null);
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retry: false } });
  const router = createMemoryRouter(routes, { initialEntries: [path] });
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return {
    user: userEvent.setup(),
    address: () => `${router.state.location.pathname}${router.state.location.search}`,
    activity,
  };
};
