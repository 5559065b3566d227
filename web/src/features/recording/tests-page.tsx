import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { Button } from '../../ui/button';
import { EmptyState } from '../../ui/empty-state';
import { ErrorNotice } from '../../ui/error-notice';
import { PageHeader } from '../../ui/page-header';
import { SkeletonRows } from '../../ui/skeleton';
import { patientQuery, testListQuery } from './queries';
import { RecordMenu } from './record-menu';
import { TestTable } from './tests/test-table';

const countWords = (count: number, more: boolean): string =>
  more ? `${count} shown, there are more` : `${count === 1 ? '1 test' : `${count} tests`}`;

/** Every test of one patient, newest first; what was voided stays, struck through. */
export const Component = () => {
  const { patientId = '' } = useParams();
  const patient = useQuery(patientQuery(patientId)).data;
  const query = useInfiniteQuery(testListQuery(patientId));
  const tests = query.data?.pages.flatMap((page) => page.items) ?? [];
  usePageTitle(patient ? `Tests, ${patient.givenName} ${patient.familyName}` : 'Tests');

  return (
    <>
      <PageHeader
        level={2}
        title="Tests"
        note={query.isSuccess && tests.length > 0 && countWords(tests.length, query.hasNextPage)}
      />
      <div className="mt-3">
        {query.isPending && <SkeletonRows label="Loading tests" rows={8} bars={[12, 22, 30, 14]} />}
        {query.error && (
          <ErrorNotice className="my-4" onRetry={() => void query.refetch()} retrying={query.isFetching}>
            {`The tests could not be loaded. ${describeProblem(query.error)}`}
          </ErrorNotice>
        )}
        {tests.length > 0 && <TestTable patientId={patientId} tests={tests} />}
        {query.isSuccess && tests.length === 0 && (
          <EmptyState action={patient && <RecordMenu patient={patient} />}>No test is in this record yet.</EmptyState>
        )}
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
    </>
  );
};
