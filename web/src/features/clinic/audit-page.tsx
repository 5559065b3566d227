import { useInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { usePageTitle } from '../../lib/page-title';
import { EmptyState } from '../../ui/empty-state';
import { PageHeader } from '../../ui/page-header';
import { HeaderCell, Table, TableBody, TableHead } from '../../ui/table';
import { AuditFilters } from './audit-filters';
import { AuditRow } from './audit-row';
import { ListState } from './list-state';
import { auditQuery, type AuditFilter } from './queries';

const noFilter: AuditFilter = { from: '', to: '', actor: '', patient: null };

/** Who saw or changed what, newest first. Names and record numbers, nothing clinical. */
export const Component = () => {
  usePageTitle('Audit trail');
  const [filter, setFilter] = useState(noFilter);
  const query = useInfiniteQuery(auditQuery(filter));
  const events = query.data?.pages.flatMap((page) => page.items) ?? [];
  return (
    <>
      <PageHeader title="Audit trail" note="Every sign-in, and every read and change of a record" />
      <AuditFilters filter={filter} onChange={setFilter} onClear={() => setFilter(noFilter)} />
      <div className="mt-4">
        {events.length > 0 && (
          <Table caption="Audit trail, newest first" busy={query.isPlaceholderData}>
            <TableHead>
              <HeaderCell>When</HeaderCell>
              <HeaderCell>Who</HeaderCell>
              <HeaderCell>What</HeaderCell>
              <HeaderCell>Patients</HeaderCell>
              <HeaderCell>From</HeaderCell>
            </TableHead>
            <TableBody>
              {events.map((event) => (
                <AuditRow key={event.id} event={event} onPatient={(patient) => setFilter({ ...filter, patient })} />
              ))}
            </TableBody>
          </Table>
        )}
        {query.isSuccess && events.length === 0 && <EmptyState>Nothing was recorded under these filters.</EmptyState>}
        <ListState query={query} label="Loading the audit trail" />
      </div>
    </>
  );
};
