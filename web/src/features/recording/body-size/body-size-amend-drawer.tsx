import { useQueryClient } from '@tanstack/react-query';
import type { BodySize } from '@slighthill/shared/contracts/measurement';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { useCallback, useState } from 'react';
import { FormProvider } from 'react-hook-form';
import { toLocalInput } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { AmendHead, amendIssues, useAmendVersion } from '../forms/amend';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { useRecordForm } from '../forms/use-record-form';
import { testDetailQuery } from '../queries';
import { bodySizeFacts } from '../tests/test-facts';
import { BodySizeBody } from './body-size-body';
import {
  bodySizeFields,
  bodySizeQuestions,
  checkBodySize,
  emptyBodySizeForm,
  type BodySizeForm,
} from './body-size-form';

interface BodySizeAmendDrawerProps {
  patient: Patient;
  bodySize: BodySize;
  onClose: () => void;
}

const write = (value: number | null): string => (value === null ? '' : String(value));

export const formOfBodySize = (size: BodySize, timeZone: string): BodySizeForm => ({
  ...emptyBodySizeForm(toLocalInput(size.takenAt, timeZone), size.id),
  heightCm: write(size.heightCm),
  heightMethod: size.heightMethod ?? 'measured',
  weightKg: write(size.weightKg),
  note: size.note ?? '',
});

const noEarlier = { heightCm: null, weightKg: null };

const serverPath = (path: string): string | null =>
  path === 'reason' ? 'amendReason' : (bodySizeFields.find((field) => field === path) ?? null);

export const BodySizeAmendDrawer = ({ patient, bodySize, onClose }: BodySizeAmendDrawerProps) => {
  const timeZone = useClinicZone();
  const client = useQueryClient();
  const [start] = useState(() => formOfBodySize(bodySize, timeZone));
  const contentOf = (found: BodySize) => ({ version: found.version, facts: bodySizeFacts(found, timeZone) });
  const amendment = useAmendVersion(contentOf(bodySize), async () => {
    const found = await client.fetchQuery(testDetailQuery(patient.id, 'body-size', bodySize.id));
    return found.kind === 'body-size' ? contentOf(found.bodySize) : null;
  });
  const check = useCallback(
    (form: BodySizeForm) => [...amendIssues(form), ...checkBodySize(form, timeZone).issues],
    [timeZone],
  );
  const state = useRecordForm({ start, check, ask: (form) => bodySizeQuestions(form, noEarlier) });
  const drawer = useRecordDrawer<BodySizeForm, unknown>({
    patientId: patient.id,
    state,
    check,
    draftForm: null,
    restoredAt: null,
    request: (form) => {
      const { id: _id, ...rest } = checkBodySize(form, timeZone).body!;
      return {
        path: `/api/body-sizes/${bodySize.id}/amend`,
        body: { version: amendment.version, reason: form.amendReason.trim(), ...rest },
        toFormPath: serverPath,
      };
    },
    onSaved: onClose,
    onStale: amendment.takeNewest,
  });
  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title="Amend body size"
        patient={patient}
        drawer={drawer}
        openQuestions={state.questions.length}
        saveLabel="Save amendment"
        keepsDraft={false}
        onClose={onClose}
      >
        <AmendHead amendment={amendment} />
        <BodySizeBody state={state} earlierHeight={null} />
      </RecordFrame>
    </FormProvider>
  );
};
