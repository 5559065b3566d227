import { useQueryClient } from '@tanstack/react-query';
import type { FileEntry } from '@slighthill/shared/contracts/file-entry';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { useCallback, useState } from 'react';
import { FormProvider } from 'react-hook-form';
import { useClinicZone } from '../../../lib/session';
import { AmendHead, amendIssues, useAmendVersion } from '../forms/amend';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { useRecordForm } from '../forms/use-record-form';
import { fileEntryQuery } from '../queries';
import { FileEntryBody } from './file-entry-body';
import { fileServerPath } from './file-entry-form-drawer';
import { fileFacts } from './file-facts';
import { checkFileEntry, type FileForm } from './file-form';
import { kindLabel } from './file-words';
import { formOfEntry } from './form-of-entry';

interface FileAmendDrawerProps {
  patient: Patient;
  entry: FileEntry;
  onClose: () => void;
}

const noQuestions = () => [];

export const FileAmendDrawer = ({ patient, entry, onClose }: FileAmendDrawerProps) => {
  const timeZone = useClinicZone();
  const client = useQueryClient();
  const [start] = useState(() => formOfEntry(entry, timeZone));
  const contentOf = (found: FileEntry) => ({ version: found.version, facts: fileFacts(found, timeZone) });
  const amendment = useAmendVersion(contentOf(entry), async () =>
    contentOf((await client.fetchQuery(fileEntryQuery(patient.id, entry.id))).entry),
  );
  const check = useCallback(
    (form: FileForm) => [...amendIssues(form), ...checkFileEntry(form, timeZone).issues],
    [timeZone],
  );
  const state = useRecordForm({ start, check, ask: noQuestions });
  const drawer = useRecordDrawer<FileForm, unknown>({
    patientId: patient.id,
    state,
    check,
    draftForm: null,
    restoredAt: null,
    kept: 'words',
    request: (form) => {
      const { on, note, details } = checkFileEntry(form, timeZone).body!;
      return {
        path: `/api/file-entries/${entry.id}/amend`,
        body: { version: amendment.version, reason: form.amendReason.trim(), on, note, details },
        toFormPath: (path) => (path === 'reason' ? 'amendReason' : fileServerPath(path)),
      };
    },
    onSaved: onClose,
    onStale: amendment.takeNewest,
  });
  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title={`Amend: ${kindLabel(entry.kind)}`}
        patient={patient}
        drawer={drawer}
        openQuestions={0}
        saveLabel="Save amendment"
        keepsDraft={false}
        onClose={onClose}
      >
        <AmendHead amendment={amendment} />
        <FileEntryBody patient={patient} values={state.values} amending />
      </RecordFrame>
    </FormProvider>
  );
};
