import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { Draft, DraftForm } from '@slighthill/shared/contracts/draft';
import type { FileEntry, FileEntryDetail } from '@slighthill/shared/contracts/file-entry';
import type { TestKind, TestListItem } from '@slighthill/shared/contracts/measurement';
import type { Patient } from '@slighthill/shared/contracts/patient';
import type { PredictionBody, PredictionResponse } from '@slighthill/shared/contracts/prediction';
import { apiFetch } from '../../lib/api-fetch';
import type { TestDetail } from './tests/test-detail';

interface Page<Item> {
  items: Item[];
  nextCursor: string | null;
}

/** Everything about one patient is kept under the patient's id, so that one save can renew all of it. */
export const patientQuery = (patientId: string) =>
  queryOptions({
    queryKey: ['patient', patientId],
    queryFn: ({ signal }) =>
      apiFetch<{ patient: Patient }>(`/api/patients/${patientId}`, { signal }).then(({ patient }) => patient),
  });

export const testListQuery = (patientId: string) =>
  infiniteQueryOptions({
    queryKey: ['patient', patientId, 'tests', 'list'],
    queryFn: ({ pageParam, signal }) =>
      apiFetch<Page<TestListItem>>(`/api/patients/${patientId}/tests`, {
        query: { cursor: pageParam, limit: 50 },
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
  });

/** The newest tests, for what a form asks when a value is far from the last one. */
export const recentTestsQuery = (patientId: string) =>
  queryOptions({
    queryKey: ['patient', patientId, 'tests', 'recent'],
    queryFn: ({ signal }) =>
      apiFetch<Page<TestListItem>>(`/api/patients/${patientId}/tests`, { query: { limit: 100 }, signal }).then(
        (page) => page.items,
      ),
  });

export const testPaths: Record<TestKind, string> = {
  'spirometry-test': 'spirometry-tests',
  measurement: 'measurements',
  'body-size': 'body-sizes',
};

export const testDetailQuery = (patientId: string, kind: TestKind, id: string) =>
  queryOptions({
    queryKey: ['patient', patientId, 'tests', kind, id],
    queryFn: async ({ signal }): Promise<TestDetail> => {
      const answer = await apiFetch<object>(`/api/${testPaths[kind]}/${id}`, { signal });
      return { kind, ...answer } as TestDetail;
    },
    staleTime: 0,
  });

export const fileListQuery = (patientId: string) =>
  infiniteQueryOptions({
    queryKey: ['patient', patientId, 'file', 'list'],
    queryFn: ({ pageParam, signal }) =>
      apiFetch<Page<FileEntry>>(`/api/patients/${patientId}/file-entries`, {
        query: { cursor: pageParam, limit: 100 },
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
  });

export const fileEntryQuery = (patientId: string, id: string) =>
  queryOptions({
    queryKey: ['patient', patientId, 'file', id],
    queryFn: ({ signal }) => apiFetch<FileEntryDetail>(`/api/file-entries/${id}`, { signal }),
    staleTime: 0,
  });

export const draftQuery = (form: DraftForm, subject: string) =>
  queryOptions({
    queryKey: ['draft', form, subject],
    queryFn: ({ signal }) =>
      apiFetch<{ draft: Draft | null }>(`/api/drafts/${form}/${subject}`, { signal }).then(({ draft }) => draft),
    staleTime: 0,
    gcTime: 0,
    retry: false,
  });

/** Keyed by what was asked: an answer to an older question can never stand for a newer one. */
export const predictionQuery = (body: PredictionBody | null) =>
  queryOptions({
    queryKey: ['prediction', body],
    queryFn: ({ signal }) => apiFetch<PredictionResponse>('/api/predictions', { method: 'POST', body, signal }),
    enabled: body !== null,
    placeholderData: keepPreviousData,
    staleTime: 60_000,
    gcTime: 60_000,
  });
