import type { UseInfiniteQueryResult } from '@tanstack/react-query';
import { describeProblem } from '../../lib/api-problem';
import { Button } from '../../ui/button';
import { ErrorNotice } from '../../ui/error-notice';
import { SkeletonRows } from '../../ui/skeleton';

interface ListStateProps {
  query: Pick<
    UseInfiniteQueryResult,
    'isPending' | 'error' | 'isFetching' | 'refetch' | 'hasNextPage' | 'fetchNextPage' | 'isFetchingNextPage'
  >;
  /** "Loading users" */
  label: string;
}

/** What stands around a list: its skeleton, its error, and the way to more rows. What was loaded stays. */
export const ListState = ({ query, label }: ListStateProps) => (
  <>
    {query.isPending && <SkeletonRows label={label} />}
    {query.error && (
      <ErrorNotice className="my-4" onRetry={() => void query.refetch()} retrying={query.isFetching}>
        {`This could not be loaded. ${describeProblem(query.error)}`}
      </ErrorNotice>
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
  </>
);
