import { useMutation, useQueryClient } from '@tanstack/react-query';
import { apiFetch } from '../../lib/api-fetch';

interface Save {
  path: string;
  body: unknown;
}

/**
 * Writes something about one patient and renews all that is shown about this patient: header, tests, file, trends.
 * Lists of patients are renewed as well, since they show the last test and the flags.
 */
export const useSaveAboutPatient = <Answer>(patientId: string) => {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ path, body }: Save) => apiFetch<Answer>(path, { method: 'POST', body }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({
          predicate: ({ queryKey }) => queryKey.includes(patientId) && queryKey[0] !== 'draft',
        }),
        client.invalidateQueries({ queryKey: ['patients', 'list'] }),
      ]),
  });
};
