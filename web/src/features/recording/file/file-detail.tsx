import { useQuery } from '@tanstack/react-query';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { lazy, Suspense, useState } from 'react';
import { describeProblem } from '../../../lib/api-problem';
import { formatInstant } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { Button } from '../../../ui/button';
import { ErrorNotice } from '../../../ui/error-notice';
import { SkeletonRows } from '../../../ui/skeleton';
import { LoadingDrawer } from '../forms/loading-drawer';
import { HistoryList } from '../history/history-list';
import { VoidDialog } from '../history/void-dialog';
import { VoidedNotice } from '../history/voided-notice';
import { fileEntryQuery } from '../queries';
import { fileFacts } from './file-facts';

const FileAmendDrawer = lazy(() => import('./file-amend-drawer').then((m) => ({ default: m.FileAmendDrawer })));

interface FileDetailProps {
  patient: Patient;
  entryId: string;
}

export const FileDetail = ({ patient, entryId }: FileDetailProps) => {
  const timeZone = useClinicZone();
  const query = useQuery(fileEntryQuery(patient.id, entryId));
  const [open, setOpen] = useState<'amend' | 'void' | null>(null);
  const close = (): void => setOpen(null);
  if (query.isPending) return <SkeletonRows label="Loading the history" rows={2} bars={[30, 40]} />;
  if (!query.data)
    return (
      <ErrorNotice className="my-2" onRetry={() => void query.refetch()} retrying={query.isFetching}>
        {`The history could not be loaded. ${describeProblem(query.error)}`}
      </ErrorNotice>
    );
  const { entry, history, abilities } = query.data;
  return (
    <div className="mt-2 flex flex-col gap-3 rounded-sheet bg-mist px-4 py-3">
      {entry.voided && <VoidedNotice voided={entry.voided} />}
      <p className="text-note text-ink-soft">
        {`Entered by ${entry.recordedBy.displayName}, ${formatInstant(entry.recordedAt, timeZone)}`}
      </p>
      <HistoryList
        history={history}
        factsOf={(content) => fileFacts(content, timeZone)}
        now={fileFacts(entry, timeZone)}
      />
      {abilities.some((ability) => ability !== 'release') && (
        <div className="flex flex-wrap gap-2">
          {abilities.includes('amend') && (
            <Button size="row" icon="pen" onClick={() => setOpen('amend')}>
              Amend
            </Button>
          )}
          {abilities.includes('void') && (
            <Button kind="danger" size="row" onClick={() => setOpen('void')}>
              Void
            </Button>
          )}
        </div>
      )}
      {open === 'amend' && (
        <Suspense fallback={<LoadingDrawer title="Amend" onClose={close} />}>
          <FileAmendDrawer patient={patient} entry={entry} onClose={close} />
        </Suspense>
      )}
      {open === 'void' && (
        <VoidDialog
          what="this entry"
          patientId={patient.id}
          path={`/api/file-entries/${entry.id}/void`}
          version={entry.version}
          onClose={close}
          onStale={() => void query.refetch()}
        />
      )}
    </div>
  );
};
