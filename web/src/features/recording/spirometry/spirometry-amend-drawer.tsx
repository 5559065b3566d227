import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { Patient } from '@slighthill/shared/contracts/patient';
import type { SpirometryTest } from '@slighthill/shared/contracts/spirometry-test';
import { useState } from 'react';
import { FormProvider } from 'react-hook-form';
import { useClinicZone } from '../../../lib/session';
import { AmendHead, amendIssues, useAmendVersion } from '../forms/amend';
import { RecordFrame } from '../forms/record-frame';
import { useRecordDrawer } from '../forms/use-record-drawer';
import { recentTestsQuery, testDetailQuery } from '../queries';
import { spirometryHistoryFacts } from '../tests/test-facts';
import { formOfTest } from './form-of-test';
import { serverPath } from './save-spirometry';
import { SpirometryBody } from './spirometry-body';
import { spirometryEarlier } from './spirometry-earlier';
import type { SpirometryForm } from './spirometry-form';
import { checkSpirometry } from './spirometry-request';
import { useSpirometryForm } from './use-spirometry-form';

interface SpirometryAmendDrawerProps {
  patient: Patient;
  test: SpirometryTest;
  onClose: () => void;
}

/** The same form, prefilled, with the reason; the earlier values stay in the history. */
export const SpirometryAmendDrawer = ({ patient, test, onClose }: SpirometryAmendDrawerProps) => {
  const timeZone = useClinicZone();
  const client = useQueryClient();
  const [start] = useState(() => formOfTest(test, timeZone));
  const contentOf = (found: SpirometryTest) => ({
    version: found.version,
    facts: spirometryHistoryFacts(found, timeZone),
  });
  const amendment = useAmendVersion(contentOf(test), async () => {
    const found = await client.fetchQuery(testDetailQuery(patient.id, 'spirometry-test', test.id));
    return found.kind === 'spirometry-test' ? contentOf(found.test) : null;
  });
  const earlier = spirometryEarlier(patient, useQuery(recentTestsQuery(patient.id)).data ?? [], test.id);
  // Its own height was asked about when it was entered; the patient's newest may be younger than this test.
  const state = useSpirometryForm(start, { ...earlier, heightCm: null, weightKg: null }, amendIssues);
  const drawer = useRecordDrawer<SpirometryForm, unknown>({
    patientId: patient.id,
    state,
    check: state.check,
    draftForm: null,
    restoredAt: null,
    request: (form) => {
      const checked = checkSpirometry(form, timeZone);
      const { id: _id, visitId: _visitId, best, maneuvers, ...rest } = checked.tests[0]!.body;
      const entry = best ? { best } : { maneuvers };
      return {
        path: `/api/spirometry-tests/${test.id}/amend`,
        body: { version: amendment.version, reason: form.amendReason.trim(), ...rest, ...entry },
        toFormPath: (path) => (path === 'reason' ? 'amendReason' : serverPath(path, checked)),
      };
    },
    onSaved: onClose,
    onStale: amendment.takeNewest,
  });

  return (
    <FormProvider {...state.form}>
      <RecordFrame
        title="Amend spirometry"
        patient={patient}
        drawer={drawer}
        openQuestions={state.questions.length}
        saveLabel="Save amendment"
        keepsDraft={false}
        onClose={onClose}
      >
        <AmendHead amendment={amendment} />
        <SpirometryBody state={state} patient={patient} earlierHeight={null} amending />
      </RecordFrame>
    </FormProvider>
  );
};
