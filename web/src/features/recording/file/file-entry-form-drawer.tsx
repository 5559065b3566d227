import type { FileEntry } from '@slighthill/shared/contracts/file-entry';
import { useCallback } from 'react';
import { FormProvider } from 'react-hook-form';
import { useClinicZone } from '../../../lib/session';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { useRecordForm } from '../forms/use-record-form';
import type { RecordDrawerProps } from '../record-drawer';
import { FileEntryBody } from './file-entry-body';
import { checkFileEntry, fileForm, fileFormPath, type FileForm } from './file-form';
import { kindLabel } from './file-words';

interface FileEntryFormDrawerProps extends RecordDrawerProps {
  start: FileForm;
  restoredAt: string | null;
  onStartOver: () => void;
}

const noQuestions = () => [];

/** Where the server's message belongs; null for what no field shows. */
export const fileServerPath = (path: string): string | null => {
  const field = fileFormPath(path.split('.'));
  return field in fileForm.shape ? field : null;
};

export const FileEntryFormDrawer = (props: FileEntryFormDrawerProps) => {
  const { patient, start, restoredAt, onStartOver, onClose, onSaved, onKept } = props;
  const timeZone = useClinicZone();
  const check = useCallback((form: FileForm) => checkFileEntry(form, timeZone).issues, [timeZone]);
  const state = useRecordForm({ start, check, ask: noQuestions });
  const drawer = useRecordDrawer<FileForm, { entry: FileEntry }>({
    patientId: patient.id,
    state,
    check,
    draftForm: 'file-entry',
    restoredAt,
    kept: 'words',
    request: (form) => ({
      path: `/api/patients/${patient.id}/file-entries`,
      body: checkFileEntry(form, timeZone).body,
      toFormPath: fileServerPath,
    }),
    onSaved: ({ entry }) =>
      onSaved({ words: `${kindLabel(entry.kind)} is in File`, to: `/patients/${patient.id}/file` }),
  });
  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title="Enter in the file"
        patient={patient}
        drawer={drawer}
        openQuestions={0}
        saveLabel={drawer.mayRetry ? 'Try again' : 'Save entry'}
        keepsDraft
        onStartOver={restoredAt ? onStartOver : undefined}
        onClose={onClose}
        onKept={onKept}
      >
        <FileEntryBody patient={patient} values={state.values} amending={false} />
      </RecordFrame>
    </FormProvider>
  );
};
