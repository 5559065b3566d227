import type { BodySize } from '@slighthill/shared/contracts/measurement';
import { useCallback } from 'react';
import { FormProvider } from 'react-hook-form';
import { useClinicZone } from '../../../lib/session';
import { lastHeight, lastWeight } from '../forms/earlier-results';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { useRecordForm } from '../forms/use-record-form';
import type { RecordDrawerProps } from '../record-drawer';
import { BodySizeBody } from './body-size-body';
import { bodySizeFields, bodySizeQuestions, checkBodySize, type BodySizeForm } from './body-size-form';

interface BodySizeFormDrawerProps extends RecordDrawerProps {
  start: BodySizeForm;
  restoredAt: string | null;
  onStartOver: () => void;
}

export const BodySizeFormDrawer = (props: BodySizeFormDrawerProps) => {
  const { patient, start, restoredAt, onStartOver, onClose, onSaved, onKept } = props;
  const timeZone = useClinicZone();
  const earlier = { heightCm: lastHeight(patient.bodySize), weightKg: lastWeight(patient.bodySize) };
  const check = useCallback((form: BodySizeForm) => checkBodySize(form, timeZone).issues, [timeZone]);
  const state = useRecordForm({ start, check, ask: (form) => bodySizeQuestions(form, earlier) });
  const drawer = useRecordDrawer<BodySizeForm, { bodySize: BodySize }>({
    patientId: patient.id,
    state,
    check,
    draftForm: 'body-size',
    restoredAt,
    request: (form) => ({
      path: `/api/patients/${patient.id}/body-sizes`,
      body: checkBodySize(form, timeZone).body,
      toFormPath: (path) => bodySizeFields.find((field) => field === path) ?? null,
    }),
    onSaved: ({ bodySize }) =>
      onSaved({ words: 'Body size is in Tests', to: `/patients/${patient.id}/tests/body-size/${bodySize.id}` }),
  });

  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title="Record body size"
        patient={patient}
        drawer={drawer}
        openQuestions={state.questions.length}
        saveLabel={drawer.mayRetry ? 'Try again' : 'Save body size'}
        keepsDraft
        onStartOver={restoredAt ? onStartOver : undefined}
        onClose={onClose}
        onKept={onKept}
      >
        <BodySizeBody state={state} earlierHeight={earlier.heightCm} />
      </RecordFrame>
    </FormProvider>
  );
};
