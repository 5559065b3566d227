import { useQuery } from '@tanstack/react-query';
import type { Measurement } from '@slighthill/shared/contracts/measurement';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { useCallback, useState } from 'react';
import { FormProvider } from 'react-hook-form';
import { formatResult } from '../../../charts/format-measure';
import { useClinicZone } from '../../../lib/session';
import { Button } from '../../../ui/button';
import { Icon } from '../../../ui/icon';
import { lastHeight, lastResult, lastWeight } from '../forms/earlier-results';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { useRecordForm } from '../forms/use-record-form';
import { recentTestsQuery } from '../queries';
import type { RecordDrawerProps } from '../record-drawer';
import { ResultFields } from './result-fields';
import { nextResultForm, type ResultForm } from './result-form';
import { resultQuestions } from './result-questions';
import { checkResult, resultFields } from './result-request';

interface ResultFormDrawerProps extends RecordDrawerProps {
  start: ResultForm;
  restoredAt: string | null;
  onStartOver: () => void;
}

const known = (path: string): boolean => path.startsWith('conditions.') || resultFields.some((field) => path === field);

const resultWords = ({ measure, value }: Measurement): string => {
  const { shortLabel, unit } = getMeasure(measure);
  return `${shortLabel} ${formatResult(measure, value, unit.symbol)}`;
};

/** One result after another, in one sitting. */
export const ResultFormDrawer = (props: ResultFormDrawerProps) => {
  const { patient, start, restoredAt, onStartOver, onClose, onSaved, onKept } = props;
  const timeZone = useClinicZone();
  const [sitting, setSitting] = useState<readonly string[]>([]);
  const tests = useQuery(recentTestsQuery(patient.id)).data ?? [];
  const body = { heightCm: lastHeight(patient.bodySize), weightKg: lastWeight(patient.bodySize) };
  const check = useCallback((form: ResultForm) => checkResult(form, timeZone).issues, [timeZone]);
  const state = useRecordForm({
    start,
    check,
    ask: (form) =>
      resultQuestions(form, { ...body, value: isMeasureId(form.measure) ? lastResult(tests, form.measure) : null }),
  });
  const drawer = useRecordDrawer<ResultForm, { measurement: Measurement }>({
    patientId: patient.id,
    state,
    check,
    draftForm: 'measurement',
    restoredAt,
    request: (form) => ({
      path: `/api/patients/${patient.id}/measurements`,
      body: checkResult(form, timeZone).body,
      toFormPath: (path) => (known(path) ? path : null),
    }),
    onSaved: ({ measurement }) =>
      onSaved({
        words: `${resultWords(measurement)} is in Tests`,
        to: `/patients/${patient.id}/tests/measurement/${measurement.id}`,
      }),
    another: {
      next: (saved) => nextResultForm(saved, crypto.randomUUID()),
      onSaved: ({ measurement }) => setSitting((list) => [...list, resultWords(measurement)]),
      firstField: 'measure',
    },
  });

  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title="Record a result"
        patient={patient}
        drawer={drawer}
        openQuestions={state.questions.length}
        saveLabel={drawer.mayRetry ? 'Try again' : 'Save result'}
        keepsDraft
        onStartOver={restoredAt ? onStartOver : undefined}
        onClose={onClose}
        onKept={onKept}
        extra={<Button onClick={drawer.submitAndGoOn}>Save and add another</Button>}
      >
        <p role="status" className="flex items-center gap-2 text-note text-fern empty:-mb-4">
          {sitting.length > 0 && (
            <>
              <Icon name="check" size={18} />
              {`In the record: ${sitting.join(', ')}`}
            </>
          )}
        </p>
        <ResultFields state={state} earlierHeight={body.heightCm} amending={false} />
      </RecordFrame>
    </FormProvider>
  );
};
