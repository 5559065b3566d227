import { useQuery, useQueryClient } from '@tanstack/react-query';
import { testKinds } from '@slighthill/shared/contracts/measurement';
import { lazy, Suspense, useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { ApiProblem, describeProblem } from '../../lib/api-problem';
import { Button } from '../../ui/button';
import { ErrorNotice } from '../../ui/error-notice';
import { SkeletonRows } from '../../ui/skeleton';
import { LoadingDrawer } from './forms/loading-drawer';
import { VoidDialog } from './history/void-dialog';
import { patientQuery, testDetailQuery, testPaths } from './queries';
import { thisTest } from './tests/describe-test';
import { recordedOf } from './tests/test-detail';
import { TestDetailView } from './tests/test-detail-view';

const AmendTest = lazy(() => import('./tests/amend-test').then((m) => ({ default: m.AmendTest })));

/** One test with all it says, its history, and what may be done with it. */
export const Component = () => {
  const { patientId = '', kind: kindInPath = '', testId = '' } = useParams();
  const client = useQueryClient();
  const kind = testKinds.find((known) => known === kindInPath) ?? 'measurement';
  const options = testDetailQuery(patientId, kind, testId);
  const query = useQuery(options);
  const patient = useQuery(patientQuery(patientId)).data;
  const [open, setOpen] = useState<'amend' | 'void' | null>(null);
  const detail = query.data;
  const close = (): void => setOpen(null);
  const may = (ability: 'amend' | 'void'): boolean => detail?.abilities.includes(ability) ?? false;
  const absent = query.error instanceof ApiProblem && query.error.status === 404;

  return (
    <>
      <p className="mb-1">
        <Link to={`/patients/${patientId}/tests`} className="link inline-flex min-h-8 items-center">
          All tests
        </Link>
      </p>
      {query.isPending && <SkeletonRows label="Loading the test" rows={6} bars={[20, 40]} />}
      {query.error && (
        <ErrorNotice {...(absent ? {} : { onRetry: () => void query.refetch() })} retrying={query.isFetching}>
          {absent
            ? 'There is no such test in this record.'
            : `The test could not be loaded. ${describeProblem(query.error)}`}
        </ErrorNotice>
      )}
      {detail && patient && (
        <>
          <TestDetailView
            detail={detail}
            actions={
              <>
                {may('amend') && (
                  <Button icon="pen" onClick={() => setOpen('amend')}>
                    Amend
                  </Button>
                )}
                {may('void') && (
                  <Button kind="danger" onClick={() => setOpen('void')}>
                    Void
                  </Button>
                )}
              </>
            }
          />
          {open === 'amend' && (
            <Suspense fallback={<LoadingDrawer title="Amend" onClose={close} />}>
              <AmendTest patient={patient} detail={detail} onClose={close} />
            </Suspense>
          )}
          {open === 'void' && (
            <VoidDialog
              what={thisTest(detail)}
              patientId={patientId}
              path={`/api/${testPaths[kind]}/${testId}/void`}
              version={recordedOf(detail).version}
              onClose={close}
              onStale={() => void client.invalidateQueries({ queryKey: options.queryKey })}
            />
          )}
        </>
      )}
    </>
  );
};
