import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { fileEntryKinds } from '@slighthill/shared/contracts/file-entry';
import { useParams } from 'react-router-dom';
import { describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { Button } from '../../ui/button';
import { EmptyState } from '../../ui/empty-state';
import { ErrorNotice } from '../../ui/error-notice';
import { PageHeader } from '../../ui/page-header';
import { SkeletonRows } from '../../ui/skeleton';
import { FileRow } from './file/file-row';
import { kindLabel } from './file/file-words';
import { fileListQuery, patientQuery } from './queries';
import { RecordMenu } from './record-menu';

/** Holds stand first: they decide whether anyone may exercise. */
const order = ['safety-hold', ...fileEntryKinds.filter((kind) => kind !== 'safety-hold')] as const;

/** What matters beside the tests, by kind, each with its date, who entered it and its history. */
export const Component = () => {
  const { patientId = '' } = useParams();
  const patient = useQuery(patientQuery(patientId)).data;
  const query = useInfiniteQuery(fileListQuery(patientId));
  const entries = query.data?.pages.flatMap((page) => page.items) ?? [];
  usePageTitle(patient ? `File, ${patient.givenName} ${patient.familyName}` : 'File');
  const groups = order
    .map((kind) => ({ kind, items: entries.filter((entry) => entry.kind === kind) }))
    .filter(({ items }) => items.length > 0);

  return (
    <>
      <PageHeader level={2} title="File" />
      <div className="mt-3 flex flex-col gap-6">
        {query.isPending && <SkeletonRows label="Loading the file" rows={6} bars={[14, 50, 14]} />}
        {query.error && (
          <ErrorNotice onRetry={() => void query.refetch()} retrying={query.isFetching}>
            {`The file could not be loaded. ${describeProblem(query.error)}`}
          </ErrorNotice>
        )}
        {patient &&
          groups.map(({ kind, items }) => (
            <section key={kind} aria-labelledby={`file-${kind}`}>
              <h3 id={`file-${kind}`} className="mb-2 text-chart">
                {kindLabel(kind)}
              </h3>
              <ul>
                {items.map((entry) => (
                  <FileRow key={entry.id} patient={patient} entry={entry} onStale={() => void query.refetch()} />
                ))}
              </ul>
            </section>
          ))}
        {query.isSuccess && entries.length === 0 && (
          <EmptyState action={patient && <RecordMenu patient={patient} />}>Nothing is in this file yet.</EmptyState>
        )}
        {query.hasNextPage && (
          <Button
            className="self-start"
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
