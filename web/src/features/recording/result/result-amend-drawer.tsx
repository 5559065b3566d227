import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { Measurement } from '@slighthill/shared/contracts/measurement';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { getMeasure } from '@slighthill/shared/measures';
import { useCallback, useState } from 'react';
import { FormProvider } from 'react-hook-form';
import { toLocalInput } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { AmendHead, amendIssues, useAmendVersion } from '../forms/amend';
import { lastResult } from '../forms/earlier-results';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { useRecordForm } from '../forms/use-record-form';
import { recentTestsQuery, testDetailQuery } from '../queries';
import { measurementFacts } from '../tests/test-facts';
import { ResultFields } from './result-fields';
import { emptyResultForm, writtenConditions, type ResultForm } from './result-form';
import { resultQuestions } from './result-questions';
import { checkResult, resultFields } from './result-request';

interface ResultAmendDrawerProps {
  patient: Patient;
  measurement: Measurement;
  onClose: () => void;
}

const write = (value: number | null): string => (value === null ? '' : String(value));

/** A carried height is left empty, so that amending does not turn it into a measured one. */
export const formOfMeasurement = (measurement: Measurement, timeZone: string): ResultForm => ({
  ...emptyResultForm(toLocalInput(measurement.takenAt, timeZone), measurement.id),
  measure: measurement.measure,
  value: write(measurement.value),
  heightCm: measurement.heightCarried ? '' : write(measurement.heightCm),
  heightMethod: measurement.heightMethod ?? 'measured',
  weightKg: write(measurement.weightKg),
  conditions: writtenConditions(measurement.measure, measurement.conditions),
  item9: measurement.item9 ?? '',
  note: measurement.note ?? '',
});

const serverPath = (path: string): string | null => {
  if (path === 'reason') return 'amendReason';
  return path.startsWith('conditions.') || resultFields.some((field) => field === path) ? path : null;
};

export const ResultAmendDrawer = ({ patient, measurement, onClose }: ResultAmendDrawerProps) => {
  const timeZone = useClinicZone();
  const client = useQueryClient();
  const [start] = useState(() => formOfMeasurement(measurement, timeZone));
  const contentOf = (found: Measurement) => ({ version: found.version, facts: measurementFacts(found, timeZone) });
  const amendment = useAmendVersion(contentOf(measurement), async () => {
    const found = await client.fetchQuery(testDetailQuery(patient.id, 'measurement', measurement.id));
    return found.kind === 'measurement' ? contentOf(found.measurement) : null;
  });
  const tests = useQuery(recentTestsQuery(patient.id)).data ?? [];
  const last = lastResult(tests, measurement.measure, measurement.id);
  const check = useCallback(
    (form: ResultForm) => [...amendIssues(form), ...checkResult(form, timeZone).issues],
    [timeZone],
  );
  const state = useRecordForm({
    start,
    check,
    ask: (form) => resultQuestions(form, { heightCm: null, weightKg: null, value: last }),
  });
  const drawer = useRecordDrawer<ResultForm, unknown>({
    patientId: patient.id,
    state,
    check,
    draftForm: null,
    restoredAt: null,
    request: (form) => {
      const { id: _id, measure: _measure, item9, ...rest } = checkResult(form, timeZone).body!;
      return {
        path: `/api/measurements/${measurement.id}/amend`,
        body: {
          version: amendment.version,
          reason: form.amendReason.trim(),
          ...rest,
          ...(item9 === null ? {} : { item9 }),
        },
        toFormPath: serverPath,
      };
    },
    onSaved: onClose,
    onStale: amendment.takeNewest,
  });

  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title={`Amend ${getMeasure(measurement.measure).shortLabel}`}
        patient={patient}
        drawer={drawer}
        openQuestions={state.questions.length}
        saveLabel="Save amendment"
        keepsDraft={false}
        onClose={onClose}
      >
        <AmendHead amendment={amendment} />
        <ResultFields state={state} earlierHeight={null} amending />
      </RecordFrame>
    </FormProvider>
  );
};
