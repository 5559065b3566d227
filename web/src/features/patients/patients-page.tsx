import { useInfiniteQuery } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { Outlet, useSearchParams } from 'react-router-dom';
import { describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { useAbility } from '../../lib/session';
import { useDebounced } from '../../lib/use-debounced';
import { Button, ButtonLink } from '../../ui/button';
import { EmptyState } from '../../ui/empty-state';
import { ErrorNotice } from '../../ui/error-notice';
import { MarginNav } from '../../ui/margin-nav';
import { MarginSection } from '../../ui/margin-section';
import { PageHeader } from '../../ui/page-header';
import { SkeletonRows } from '../../ui/skeleton';
import { PatientTable } from './patient-table';
import { patientListQuery, type PatientListName } from './queries';
import { SearchBox } from './search-box';

const lists: Record<PatientListName, string> = { current: 'Current', finished: 'Finished', all: 'All' };
const listNames = Object.keys(lists) as PatientListName[];

const emptyWords = (list: PatientListName, search: string): string => {
  if (search !== '') return `No patient under ${lists[list]} matches what you typed.`;
  if (list === 'current') return 'No one is in a program at the moment.';
  return list === 'finished' ? 'No one has finished a program yet.' : 'There are no patients yet.';
};

const countWords = (count: number, more: boolean): string =>
  `${count === 1 ? '1 patient' : `${count} patients`}${more ? ' shown, there are more' : ''}`;

export const Component = () => {
  usePageTitle('Patients');
  const [params] = useSearchParams();
  const list = listNames.find((name) => name === params.get('list')) ?? 'current';
  const [typed, setTyped] = useState('');
  const search = useDebounced(typed.trim(), 200);
  const mayAdd = useAbility('patients:write');
  const place = useRef<HTMLDivElement>(null);
  const query = useInfiniteQuery(patientListQuery(list, search));
  const patients = query.data?.pages.flatMap((page) => page.items) ?? [];
  const empty = query.isSuccess && patients.length === 0 && !query.isPlaceholderData;
  // The first patient's button stands in the empty page itself; a page has one.
  const offersFirst = empty && mayAdd && search === '' && list === 'all';
  const newPatient = (
    <ButtonLink kind="main" icon="plus" to={{ pathname: '/patients/new', search: params.toString() }}>
      New patient
    </ButtonLink>
  );

  return (
    <div className="page-frame py-6">
      <MarginSection
        margin={
          <MarginNav
            label="Lists of patients"
            items={listNames.map((name) => ({
              to: `/patients?list=${name}`,
              label: lists[name],
              current: name === list,
            }))}
          />
        }
      >
        <PageHeader
          title={lists[list] === 'All' ? 'All patients' : `${lists[list]} patients`}
          note={
            <span role="status">{query.isSuccess && !empty ? countWords(patients.length, query.hasNextPage) : ''}</span>
          }
          actions={
            <>
              <SearchBox
                value={typed}
                onValueChange={setTyped}
                onLeaveDown={() => place.current?.querySelector<HTMLElement>('[data-row-link]')?.focus()}
              />
              {mayAdd && !offersFirst && newPatient}
            </>
          }
        />
        <div ref={place} className="mt-4">
          {query.isPending && <SkeletonRows label="Loading patients" rows={10} bars={[18, 5, 10, 8, 12, 16, 14]} />}
          {query.error && (
            <ErrorNotice className="my-4" onRetry={() => void query.refetch()} retrying={query.isFetching}>
              {`The list could not be loaded. ${describeProblem(query.error)}`}
            </ErrorNotice>
          )}
          {patients.length > 0 && <PatientTable patients={patients} busy={query.isPlaceholderData} />}
          {empty && <EmptyState action={offersFirst ? newPatient : undefined}>{emptyWords(list, search)}</EmptyState>}
          {query.hasNextPage && (
            <Button
              className="mt-5"
              onClick={() => void query.fetchNextPage()}
              saving={query.isFetchingNextPage}
              savingLabel="Loading"
            >
              Show more
            </Button>
          )}
        </div>
      </MarginSection>
      <Outlet />
    </div>
  );
};
