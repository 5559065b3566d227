import { useMutation, useQueryClient } from '@tanstack/react-query';
import type {
  Clinic,
  ClinicPatch,
  Program,
  ProgramCreate,
  ProgramPatch,
  StaffUser,
  UserCreate,
  UserPatch,
} from '@slighthill/shared/contracts/clinic';
import { apiFetch } from '../../lib/api-fetch';
import { meQuery } from '../../lib/session';

export interface IssuedInvitation {
  path: string;
  expiresAt: string;
}

export interface SavedUser {
  user: StaffUser;
  invitation: IssuedInvitation | null;
}

const useClinicMutation = <Variables, Result>(key: string, mutationFn: (variables: Variables) => Promise<Result>) => {
  const client = useQueryClient();
  return useMutation({ mutationFn, onSuccess: () => client.invalidateQueries({ queryKey: ['clinic', key] }) });
};

export const useCreateUser = () =>
  useClinicMutation('users', (body: UserCreate) => apiFetch<SavedUser>('/api/users', { method: 'POST', body }));

export const useChangeUser = (id: string) =>
  useClinicMutation('users', (body: UserPatch) =>
    apiFetch<{ user: StaffUser }>(`/api/users/${id}`, { method: 'PATCH', body }),
  );

export const useInviteUser = () =>
  useClinicMutation('users', (id: string) =>
    apiFetch<{ invitation: IssuedInvitation }>(`/api/users/${id}/invitation`, { method: 'POST' }),
  );

export const useCreateProgram = () =>
  useClinicMutation('programs', (body: ProgramCreate) =>
    apiFetch<{ program: Program }>('/api/programs', { method: 'POST', body }),
  );

export const useChangeProgram = (id: string) =>
  useClinicMutation('programs', (body: ProgramPatch) =>
    apiFetch<{ program: Program }>(`/api/programs/${id}`, { method: 'PATCH', body }),
  );

/** The clinic's rules travel with the session too, so both are read again. */
export const useChangeClinic = () => {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: ClinicPatch) => apiFetch<{ clinic: Clinic }>('/api/clinic', { method: 'PATCH', body }),
    onSuccess: async () => {
      await Promise.all([
        client.invalidateQueries({ queryKey: ['clinic'], exact: true }),
        client.invalidateQueries({ queryKey: meQuery.queryKey, exact: true }),
      ]);
    },
  });
};
