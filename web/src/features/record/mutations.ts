import { useMutation, useQueryClient } from '@tanstack/react-query';
import type {
  Enrollment,
  EnrollmentCreate,
  EnrollmentPatch,
  Patient,
  PatientPatch,
} from '@slighthill/shared/contracts/patient';
import { apiFetch } from '../../lib/api-fetch';

/** Renews all that is shown about one patient, and the lists that name the patient. */
const useRenewPatient = (patientId: string): (() => Promise<unknown>) => {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: ['patient', patientId] }),
      client.invalidateQueries({ queryKey: ['patients', 'list'] }),
    ]);
};

export const useEditPatient = (patientId: string) => {
  const renew = useRenewPatient(patientId);
  return useMutation({
    mutationFn: (body: PatientPatch) =>
      apiFetch<{ patient: Patient }>(`/api/patients/${patientId}`, { method: 'PATCH', body }),
    // Also after a refusal: someone else's change is then what the page shows.
    onSettled: renew,
  });
};

export const useEnroll = (patientId: string) => {
  const renew = useRenewPatient(patientId);
  return useMutation({
    mutationFn: (body: EnrollmentCreate) =>
      apiFetch<{ enrollment: Enrollment }>(`/api/patients/${patientId}/enrollments`, { method: 'POST', body }),
    // Also after a refusal: someone else's change is then what the page shows.
    onSettled: renew,
  });
};

export const useChangeEnrollment = (patientId: string, enrollmentId: string) => {
  const renew = useRenewPatient(patientId);
  return useMutation({
    mutationFn: (body: EnrollmentPatch) =>
      apiFetch<{ enrollment: Enrollment }>(`/api/enrollments/${enrollmentId}`, { method: 'PATCH', body }),
    // Also after a refusal: someone else's change is then what the page shows.
    onSettled: renew,
  });
};

export const useResolveFlag = (patientId: string, flagId: string) => {
  const renew = useRenewPatient(patientId);
  return useMutation({
    mutationFn: (body: { version: number; note: string }) =>
      apiFetch<unknown>(`/api/flags/${flagId}/resolve`, { method: 'POST', body }),
    // Also after a refusal: someone else's change is then what the page shows.
    onSettled: renew,
  });
};
