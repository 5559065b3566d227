import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { PatientListItem, patientLists } from '@slighthill/shared/contracts/patient';
import { apiFetch } from '../../lib/api-fetch';

export type PatientListName = (typeof patientLists)[number];

interface PatientPage {
  items: PatientListItem[];
  nextCursor: string | null;
}

export const patientListQuery = (list: PatientListName, search: string) =>
  infiniteQueryOptions({
    queryKey: ['patients', 'list', list, search],
    queryFn: ({ pageParam, signal }) =>
      apiFetch<PatientPage>('/api/patients', { query: { list, search, cursor: pageParam, limit: 50 }, signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
    // While the next answer is on its way the rows on the page stay, so that typing does not make it flicker.
    placeholderData: keepPreviousData,
  });

export interface PersonToCheck {
  givenName: string;
  familyName: string;
  birthDate: string;
}

export interface KnownPatient extends PersonToCheck {
  id: string;
  recordNumber: string;
}

export const duplicateQuery = (person: PersonToCheck) =>
  queryOptions({
    queryKey: ['patients', 'duplicate-check', person],
    queryFn: ({ signal }) =>
      apiFetch<{ items: KnownPatient[] }>('/api/patients/duplicate-check', { method: 'POST', body: person, signal }),
    staleTime: 0,
    gcTime: 0,
    retry: false,
  });
