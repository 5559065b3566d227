import { useCallback, useState } from 'react';
import { useClinicZone } from '../../../lib/session';
import type { FormIssue } from '../forms/form-issues';
import { useRecordForm, type RecordFormState } from '../forms/use-record-form';
import type { SetName, SpirometryForm } from './spirometry-form';
import { setOfField, spirometryQuestions, type SpirometryEarlier } from './spirometry-questions';
import { checkSpirometry } from './spirometry-request';
import { setsOf } from './test-sets';

export interface SpirometryFormState extends RecordFormState<SpirometryForm> {
  tab: SetName;
  setTab: (set: SetName) => void;
  check: (form: SpirometryForm) => readonly FormIssue[];
}

/** The form and which of its two sets is in front; `further` adds what an amended test needs. */
export const useSpirometryForm = (
  start: SpirometryForm,
  earlier: SpirometryEarlier,
  further: (form: SpirometryForm) => readonly FormIssue[] = noFurther,
): SpirometryFormState => {
  const timeZone = useClinicZone();
  const [chosen, setTab] = useState<SetName>('before');
  const check = useCallback(
    (form: SpirometryForm) => [...further(form), ...checkSpirometry(form, timeZone).issues],
    [timeZone, further],
  );
  const reveal = useCallback((field: string) => {
    const set = setOfField(field);
    if (set) setTab(set);
  }, []);
  const state = useRecordForm({ start, check, ask: (form) => spirometryQuestions(form, earlier), reveal });
  const shown = setsOf(state.values.state);
  return { ...state, tab: shown.includes(chosen) ? chosen : shown[0]!, setTab, check };
};

const noFurther = (): readonly FormIssue[] => [];
