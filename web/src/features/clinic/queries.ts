import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { AuditEventRow, Clinic, Program, StaffUser } from '@slighthill/shared/contracts/clinic';
import { apiFetch } from '../../lib/api-fetch';

interface Page<Item> {
  items: Item[];
  nextCursor: string | null;
}

export const clinicQuery = queryOptions({
  queryKey: ['clinic'],
  queryFn: ({ signal }) => apiFetch<{ clinic: Clinic }>('/api/clinic', { signal }).then(({ clinic }) => clinic),
});

export const usersQuery = infiniteQueryOptions({
  queryKey: ['clinic', 'users'],
  queryFn: ({ pageParam, signal }) =>
    apiFetch<Page<StaffUser>>('/api/users', { query: { cursor: pageParam, limit: 100 }, signal }),
  initialPageParam: null as string | null,
  getNextPageParam: (page) => page.nextCursor,
});

export const programsQuery = infiniteQueryOptions({
  queryKey: ['clinic', 'programs'],
  queryFn: ({ pageParam, signal }) =>
    apiFetch<Page<Program>>('/api/programs', { query: { cursor: pageParam, limit: 100 }, signal }),
  initialPageParam: null as string | null,
  getNextPageParam: (page) => page.nextCursor,
});

export interface AuditFilter {
  from: string;
  to: string;
  actor: string;
  patient: { id: string; name: string } | null;
}

export const auditQuery = (filter: AuditFilter) =>
  infiniteQueryOptions({
    queryKey: ['clinic', 'audit', filter],
    queryFn: ({ pageParam, signal }) =>
      apiFetch<Page<AuditEventRow>>('/api/audit-events', {
        query: {
          cursor: pageParam,
          limit: 50,
          from: filter.from,
          to: filter.to,
          actor: filter.actor,
          patient: filter.patient?.id,
        },
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
    placeholderData: keepPreviousData,
  });
