import { useQuery } from '@tanstack/react-query';
import { FormProvider } from 'react-hook-form';
import { useClinicZone } from '../../../lib/session';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { recentTestsQuery } from '../queries';
import type { RecordDrawerProps } from '../record-drawer';
import { savedSpirometry, serverPath, spirometryBody, type SpirometryAnswer } from './save-spirometry';
import { SpirometryBody } from './spirometry-body';
import { spirometryEarlier } from './spirometry-earlier';
import type { SpirometryForm } from './spirometry-form';
import { checkSpirometry } from './spirometry-request';
import { useSpirometryForm } from './use-spirometry-form';

interface SpirometryFormDrawerProps extends RecordDrawerProps {
  start: SpirometryForm;
  restoredAt: string | null;
  onStartOver: () => void;
}

/** A new test, or one before and one after bronchodilator. */
export const SpirometryFormDrawer = (props: SpirometryFormDrawerProps) => {
  const { patient, start, restoredAt, onStartOver, onClose, onSaved, onKept } = props;
  const timeZone = useClinicZone();
  const earlier = spirometryEarlier(patient, useQuery(recentTestsQuery(patient.id)).data ?? []);
  const state = useSpirometryForm(start, earlier);
  const drawer = useRecordDrawer<SpirometryForm, SpirometryAnswer>({
    patientId: patient.id,
    state,
    check: state.check,
    draftForm: 'spirometry',
    restoredAt,
    request: (form) => {
      const checked = checkSpirometry(form, timeZone);
      return {
        path: `/api/patients/${patient.id}/spirometry-tests`,
        body: spirometryBody(checked),
        toFormPath: (path) => serverPath(path, checked),
      };
    },
    onSaved: (answer) => onSaved(savedSpirometry(answer, patient.id)),
  });

  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title="Record spirometry"
        patient={patient}
        drawer={drawer}
        openQuestions={state.questions.length}
        saveLabel={drawer.mayRetry ? 'Try again' : 'Save test'}
        keepsDraft
        onStartOver={restoredAt ? onStartOver : undefined}
        onClose={onClose}
        onKept={onKept}
      >
        <SpirometryBody state={state} patient={patient} earlierHeight={earlier.heightCm} amending={false} />
      </RecordFrame>
    </FormProvider>
  );
};
