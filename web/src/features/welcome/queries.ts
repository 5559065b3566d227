import { queryOptions } from '@tanstack/react-query';
import type { CurrentUser, Invitation } from '@slighthill/shared/contracts/auth';
import { apiFetch } from '../../lib/api-fetch';

/** The token travels in a body, so that no log or history holds it. */
export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitation', token],
    queryFn: ({ signal }) =>
      apiFetch<Invitation>('/api/auth/invitation/look-up', {
        method: 'POST',
        body: { token },
        signal,
        expectSignedOut: true,
      }),
    staleTime: Number.POSITIVE_INFINITY,
  });

export const acceptInvitation = async (token: string, password: string): Promise<CurrentUser> => {
  const { user } = await apiFetch<{ user: CurrentUser }>('/api/auth/invitation/accept', {
    method: 'POST',
    body: { token, password },
    expectSignedOut: true,
  });
  return user;
};
