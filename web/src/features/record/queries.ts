import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { Program } from '@slighthill/shared/contracts/clinic';
import type { Patient } from '@slighthill/shared/contracts/patient';
import type { TrendResponse } from '@slighthill/shared/contracts/trend';
import { apiFetch } from '../../lib/api-fetch';

/** Everything about one patient is kept under the patient's id, so that one save can renew all of it. */
export const patientQuery = (patientId: string) =>
  queryOptions({
    queryKey: ['patient', patientId],
    queryFn: ({ signal }) =>
      apiFetch<{ patient: Patient }>(`/api/patients/${patientId}`, { signal }).then(({ patient }) => patient),
  });

/** How the trends are looked at; what is null follows the clinic's rules. */
export interface TrendRules {
  referenceSet: string | null;
  group: string | null;
  gradingRule: string | null;
  ratioRule: string | null;
}

export const trendsQuery = (patientId: string, rules: TrendRules) =>
  queryOptions({
    queryKey: ['patient', patientId, 'trends', rules],
    queryFn: ({ signal }) =>
      apiFetch<TrendResponse>(`/api/patients/${patientId}/trends`, { query: { ...rules }, signal }),
    placeholderData: keepPreviousData,
  });

export const programChoicesQuery = queryOptions({
  queryKey: ['program-choices'],
  queryFn: ({ signal }) =>
    apiFetch<{ items: Program[] }>('/api/programs', { query: { limit: 100 }, signal }).then(({ items }) =>
      items.filter((program) => !program.retired),
    ),
});
