import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense, useState } from 'react';
import { describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { EmptyState } from '../../ui/empty-state';
import { ErrorNotice } from '../../ui/error-notice';
import { SkeletonBar } from '../../ui/skeleton';
import { VisuallyHidden } from '../../ui/visually-hidden';
import { PatternSummary } from './pattern-summary';
import { trendsQuery } from './queries';
import { useRecord } from './record-context';
import { TrendNotes } from './trend-notes';
import { useSummaryView } from './use-summary-view';

const SummaryCharts = lazy(() => import('./summary-charts').then((module) => ({ default: module.SummaryCharts })));

const ChartsSkeleton = () => (
  <div role="status" data-skeleton className="mt-6">
    <VisuallyHidden>Loading the charts</VisuallyHidden>
    <div aria-hidden="true" className="flex flex-col gap-4">
      <SkeletonBar widthPercent={36} heightPx={24} />
      <SkeletonBar widthPercent={100} heightPx={300} />
      <div className="flex gap-6">
        {[1, 2, 3, 4].map((place) => (
          <SkeletonBar key={place} widthPercent={24} heightPx={130} />
        ))}
      </div>
    </div>
  </div>
);

const SummarySkeleton = () => (
  <>
    <div aria-hidden="true" className="grid gap-x-6 gap-y-2 margin:grid-cols-[264px_minmax(0,1fr)]">
      <SkeletonBar widthPercent={90} heightPx={26} />
      <div className="flex flex-col gap-2">
        <SkeletonBar widthPercent={95} />
        <SkeletonBar widthPercent={70} />
      </div>
    </div>
    <ChartsSkeleton />
  </>
);

const caution =
  'For licensed staff. It supports your judgment and does not diagnose. Local protocol and the treating clinician decide.';

export const Component = () => {
  const { patient, record } = useRecord();
  const view = useSummaryView();
  const query = useQuery(trendsQuery(patient.id, view.rules));
  const [kept, setKept] = useState(query.data);
  usePageTitle(`${patient.givenName} ${patient.familyName}`);
  // What was loaded stays when another view of it cannot be.
  if (query.data && query.data !== kept) setKept(query.data);
  const trends = query.data ?? kept;

  const problem = query.error && (
    <ErrorNotice className="mb-5" onRetry={() => void query.refetch()} retrying={query.isFetching}>
      {trends ? 'This view could not be loaded. ' : 'The summary could not be loaded. '}
      {describeProblem(query.error)}
      {trends ? ' What was loaded stays here.' : ''}
    </ErrorNotice>
  );
  if (!trends) return problem ?? <SummarySkeleton />;

  const series = view.seriesOf(trends.series);
  if (!series) {
    return (
      <>
        {problem}
        <h2 className="text-record">Summary</h2>
        <EmptyState action={record}>No tests yet. The summary starts with the first one.</EmptyState>
      </>
    );
  }
  return (
    <>
      {problem}
      <PatternSummary trends={trends} view={view} />
      <Suspense fallback={<ChartsSkeleton />}>
        <SummaryCharts trends={trends} series={series} view={view} />
      </Suspense>
      <div className="mt-6 grid gap-x-6 gap-y-3 border-t border-line pt-3.5 print:mt-3 print:pt-2 row:grid-cols-2">
        <TrendNotes series={series} />
        <p className="text-note text-ink-soft">{caution}</p>
      </div>
    </>
  );
};
