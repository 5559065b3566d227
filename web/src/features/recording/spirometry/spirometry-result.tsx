import type { Patient } from '@slighthill/shared/contracts/patient';
import { clinicDateOf, fromLocalInput } from '../../../lib/clinic-time';
import { useSessionUser } from '../../../lib/session';
import type { MarkKind } from '../../../charts/mark-kind';
import type { FormQuestion } from '../forms/form-question';
import { usableHeightCm, type Earlier } from '../forms/number-questions';
import { bestPreview } from './best-preview';
import { basisWords, responseWords } from './derived-notes';
import { DerivedPanel } from './derived-panel';
import type { DerivedSet } from './derived-rows';
import { ageYearsAt, previewRequest } from './preview-request';
import type { FormState, SetName, SpirometryForm } from './spirometry-form';
import { setsOf } from './test-sets';
import { usePreview } from './use-preview';

interface SpirometryResultProps {
  patient: Patient;
  values: SpirometryForm;
  earlierHeight: Earlier | null;
  questions: readonly FormQuestion[];
}

const titles: Record<SetName, string> = { before: 'Before', after: 'After' };
const stateTitles: Record<Exclude<FormState, 'given'>, string> = {
  before: 'Before',
  after: 'After',
  none: 'Test',
  unknown: 'Test',
};

const markOf = (state: Exclude<FormState, 'given'>): MarkKind => {
  if (state === 'after') return 'filled';
  return state === 'before' ? 'open' : 'diamond';
};

/** The height a preview uses: the typed one unless it is asked about, else the last measured. */
export const heightInUse = (text: string, asked: boolean, earlier: Earlier | null) => {
  const typedCm = asked ? null : usableHeightCm(text);
  return typedCm === null
    ? { heightCm: earlier?.value ?? null, carried: earlier }
    : { heightCm: typedCm, carried: null };
};

/** The live result of what is typed, as the server works it out. */
export const SpirometryResult = ({ patient, values, earlierHeight, questions }: SpirometryResultProps) => {
  const { clinic } = useSessionUser();
  const at = fromLocalInput(values.performedAt, clinic.timeZone);
  const on = clinicDateOf(at ?? new Date(), clinic.timeZone);
  const heightAsked = questions.some(({ field }) => field === 'heightCm');
  const { heightCm, carried } = heightInUse(values.heightCm, heightAsked, earlierHeight);
  const person = { patient, clinic, on, heightCm };

  const request = (set: SetName) => {
    const open = setsOf(values.state).includes(set);
    const state = values.state === 'given' ? set : values.state;
    return open ? previewRequest(person, bestPreview(values[set]), state) : null;
  };
  const previews = { before: usePreview(request('before')), after: usePreview(request('after')) };

  const sets = setsOf(values.state).map((set): DerivedSet => {
    const state = values.state === 'given' ? set : values.state;
    return {
      title: values.state === 'given' ? titles[set] : stateTitles[state],
      kind: markOf(state),
      best: bestPreview(values[set]),
      prediction: previews[set].data,
    };
  });
  const response = responseWords(sets);
  const failed = previews.before.failed || previews.after.failed;

  return (
    <DerivedPanel
      sets={sets}
      severityRule={clinic.fev1SeverityRule}
      updating={previews.before.updating || previews.after.updating}
    >
      <p>{basisWords(ageYearsAt(patient.birthDate, on), heightCm, carried)}</p>
      {response && <p>{response}</p>}
      {failed && <p>Percent predicted could not be worked out just now. Saving works without it.</p>}
    </DerivedPanel>
  );
};
