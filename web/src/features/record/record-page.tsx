import { useQuery } from '@tanstack/react-query';
import { useMemo, type ReactNode } from 'react';
import { Outlet, useParams } from 'react-router-dom';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { ApiProblem, describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { ButtonLink } from '../../ui/button';
import { EmptyState } from '../../ui/empty-state';
import { ErrorNotice } from '../../ui/error-notice';
import { MarginNav } from '../../ui/margin-nav';
import { MarginSection } from '../../ui/margin-section';
import { SkeletonBar, SkeletonRows } from '../../ui/skeleton';
import { patientQuery } from './queries';
import './record.css';
import { RecordContext } from './record-context';
import { StandingHeader } from './standing-header';

interface RecordPageProps {
  recordMenu: (patient: Patient) => ReactNode;
}

const LoadingRecord = () => (
  <>
    <div className="border-b border-line bg-surface">
      <div className="page-frame flex h-20 items-center gap-10">
        <SkeletonBar widthPercent={18} heightPx={26} />
        <SkeletonBar widthPercent={10} heightPx={26} />
        <SkeletonBar widthPercent={20} heightPx={26} />
      </div>
    </div>
    <div className="page-frame py-6">
      <MarginSection>
        <SkeletonRows label="Loading the record" rows={8} bars={[30, 24, 18]} />
      </MarginSection>
    </div>
  </>
);

interface UnreadableProps {
  error: Error;
  onRetry: () => void;
  retrying: boolean;
}

const UnreadableRecord = ({ error, onRetry, retrying }: UnreadableProps) => {
  const absent = error instanceof ApiProblem && (error.status === 404 || error.status === 422);
  return (
    <div className="page-frame py-10">
      <h1 className="text-title">{absent ? 'There is no such record' : 'This record could not be loaded'}</h1>
      {absent ? (
        <EmptyState action={<ButtonLink to="/patients">Go to Patients</ButtonLink>}>
          Your clinic has no patient at this address.
        </EmptyState>
      ) : (
        <ErrorNotice className="mt-6 max-w-160" onRetry={onRetry} retrying={retrying}>
          {describeProblem(error)}
        </ErrorNotice>
      )}
    </div>
  );
};

const sectionsOf = ({ id, counts }: Patient) => [
  { to: `/patients/${id}/summary`, label: 'Summary' },
  { to: `/patients/${id}/tests`, label: 'Tests', count: counts.tests },
  { to: `/patients/${id}/file`, label: 'File', count: counts.file },
  { to: `/patients/${id}/details`, label: 'Details' },
];

export const RecordPage = ({ recordMenu }: RecordPageProps) => {
  const { patientId = '' } = useParams();
  const query = useQuery(patientQuery(patientId));
  const patient = query.data;
  usePageTitle(patient ? `${patient.givenName} ${patient.familyName}` : 'Patient record');
  const record = patient?.abilities.includes('record') ? recordMenu(patient) : null;
  const context = useMemo(() => (patient ? { patient, record } : null), [patient, record]);

  if (!patient || !context) {
    if (!query.error) return <LoadingRecord />;
    return <UnreadableRecord error={query.error} onRetry={() => void query.refetch()} retrying={query.isFetching} />;
  }
  return (
    <div className="record-page">
      <StandingHeader patient={patient} record={record} />
      <div className="record-sections page-frame pt-5 pb-16">
        <MarginSection margin={<MarginNav label="Sections of the record" items={sectionsOf(patient)} />}>
          {query.error && (
            <ErrorNotice className="mb-5" onRetry={() => void query.refetch()} retrying={query.isFetching}>
              The record could not be brought up to date. {describeProblem(query.error)} What was loaded stays here.
            </ErrorNotice>
          )}
          <RecordContext value={context}>
            <Outlet />
          </RecordContext>
        </MarginSection>
      </div>
    </div>
  );
};
