import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Patient, PatientCreate } from '@slighthill/shared/contracts/patient';
import { apiFetch } from '../../lib/api-fetch';

export const useCreatePatient = () => {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: PatientCreate) =>
      apiFetch<{ patient: Patient }>('/api/patients', { method: 'POST', body }).then(({ patient }) => patient),
    onSuccess: () => client.invalidateQueries({ queryKey: ['patients', 'list'] }),
  });
};
