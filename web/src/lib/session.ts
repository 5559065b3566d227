import { queryOptions, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { CurrentUser } from '@slighthill/shared/contracts/auth';
import type { Ability } from '@slighthill/shared/permissions';
import { createContext, use } from 'react';
import { apiFetch } from './api-fetch';
import { announceSession } from './session-channel';

export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: async ({ signal }) => {
    const { user } = await apiFetch<{ user: CurrentUser }>('/api/auth/me', { signal, expectSignedOut: true });
    return user;
  },
  staleTime: Number.POSITIVE_INFINITY,
});

export const SessionContext = createContext<CurrentUser | null>(null);

/** The signed-in person. Only for pages behind the sign-in. */
export const useSessionUser = (): CurrentUser => {
  const user = use(SessionContext);
  if (!user) throw new Error('useSessionUser is for pages behind the sign-in');
  return user;
};

export const useAbility = (ability: Ability): boolean => useSessionUser().abilities.includes(ability);

export const useClinicZone = (): string => useSessionUser().clinic.timeZone;

/** A wrong password answers 401 too, which is not the end of a session. */
export const signIn = async (email: string, password: string): Promise<CurrentUser> => {
  const { user } = await apiFetch<{ user: CurrentUser }>('/api/auth/sign-in', {
    method: 'POST',
    body: { email, password },
    expectSignedOut: true,
  });
  announceSession({ kind: 'signed-in', userId: user.id });
  return user;
};

const endSession = async (client: QueryClient): Promise<void> => {
  try {
    await apiFetch('/api/auth/sign-out', { method: 'POST', expectSignedOut: true });
  } catch {
    // Signed out already, or out of reach: either way this browser forgets what it showed.
  }
  announceSession({ kind: 'signed-out' });
  client.clear();
  window.location.assign('/sign-in');
};

export const useSignOut = (): (() => Promise<void>) => {
  const client = useQueryClient();
  return () => endSession(client);
};
