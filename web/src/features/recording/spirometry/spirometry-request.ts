import { spirometryTestCreate, type SpirometryTestCreate } from '@slighthill/shared/contracts/spirometry-test';
import { fromLocalInput } from '../../../lib/clinic-time';
import { parseDecimal } from '../../../lib/parse-decimal';
import { issuesOf, type FormIssue } from '../forms/form-issues';
import type { BestRow, BlowRow, FormState, SetName, SpirometryForm } from './spirometry-form';
import { hiddenFilledSet, isEmptyRow, isFilledSet, setsOf } from './test-sets';

/** One test as it would be sent, and the form rows its maneuvers came from. */
interface PlannedTest {
  set: SetName;
  rows: readonly number[];
  body: Record<string, unknown>;
}

export interface CheckedSpirometry {
  issues: FormIssue[];
  tests: {
    set: SetName;
    rows: readonly number[];
    body: SpirometryTestCreate;
  }[];
}

const setTitles: Record<SetName, string> = { before: 'Before', after: 'After' };

const numbersOf = (row: BestRow) => ({
  fev1: parseDecimal(row.fev1),
  fvc: parseDecimal(row.fvc),
  pef: parseDecimal(row.pef),
  fef2575: parseDecimal(row.fef2575),
});

const maneuverOf = (row: BlowRow) => ({
  ...numbersOf(row),
  forcedTimeS: parseDecimal(row.time),
  fev1Accepted: row.fev1Used,
  fvcAccepted: row.fvcUsed,
  reason: row.reason,
});

const stateOf = (state: FormState, set: SetName): Exclude<FormState, 'given'> => (state === 'given' ? set : state);

/** Before a dose is at least this much earlier than after it, so that the two of a pair have an order. */
const minutesBetween = { least: 1, most: 1440 } as const;

/** The date and time entered are those of the test after the dose; the one before it is earlier by the time waited. */
const performedAtOf = (form: SpirometryForm, set: SetName, timeZone: string, paired: boolean): string => {
  const at = fromLocalInput(form.performedAt, timeZone);
  if (at === null) return '';
  if (!paired || set === 'after') return at;
  const waited = parseDecimal(form.minutesSinceDose);
  // What is no number of minutes is refused at its own field.
  const known = waited !== null && waited >= minutesBetween.least && waited <= minutesBetween.most;
  const minutes = known ? waited : minutesBetween.least;
  return new Date(Date.parse(at) - Math.round(minutes) * 60_000).toISOString();
};

const plan = (form: SpirometryForm, set: SetName, timeZone: string, paired: boolean): PlannedTest => {
  const { entry, rows: allRows, best } = form[set];
  const rows = allRows.flatMap((row, index) => (isEmptyRow(row) ? [] : [index]));
  const state = stateOf(form.state, set);
  const after = state === 'after';
  return {
    set,
    rows,
    body: {
      id: form.ids[set],
      ...(paired ? { visitId: form.ids.visit } : {}),
      performedAt: performedAtOf(form, set, timeZone, paired),
      heightCm: parseDecimal(form.heightCm),
      heightMethod: form.heightMethod,
      weightKg: parseDecimal(form.weightKg),
      bronchodilator: state,
      // What was given belongs to the test after it; what the person took at home to every test.
      drug: after ? form.drug : null,
      doseMcg: after ? parseDecimal(form.doseMcg) : null,
      minutesSinceDose: after ? parseDecimal(form.minutesSinceDose) : null,
      ownBronchodilatorHoursAgo: parseDecimal(form.ownHoursAgo),
      best: entry === 'best' ? numbersOf(best) : null,
      maneuvers: entry === 'maneuvers' ? rows.map((index) => maneuverOf(allRows[index]!)) : null,
      note: form.note,
    },
  };
};

const topNames: Record<string, string> = {
  bronchodilator: 'state',
  ownBronchodilatorHoursAgo: 'ownHoursAgo',
};

/** Where a message about a test's request belongs in the form. */
export const spirometryFormPath = (
  path: readonly PropertyKey[],
  test: { set: SetName; rows: readonly number[] },
): string => {
  const [first, second, third] = path.map(String);
  if (first === 'maneuvers') {
    const row = test.rows[Number(second)] ?? 0;
    return `${test.set}.rows.${row}.${third === 'forcedTimeS' ? 'time' : (third ?? 'fev1')}`;
  }
  if (first === 'best') return `${test.set}.best.${second ?? 'fev1'}`;
  return topNames[first ?? ''] ?? first ?? 'state';
};

export const textAt = (form: object, path: string): unknown =>
  path.split('.').reduce<unknown>((at, key) => (at as Record<string, unknown> | undefined)?.[key], form);

const nothingTyped = (form: SpirometryForm): FormIssue => {
  const set = setsOf(form.state)[0]!;
  return form[set].entry === 'best'
    ? { path: `${set}.best.fev1`, message: 'Enter the best values' }
    : { path: `${set}.rows.0.fev1`, message: 'Enter at least one maneuver' };
};

/** Holds the form to the API's contract: what would be sent, or what stands against it at the form's own fields. */
export const checkSpirometry = (form: SpirometryForm, timeZone: string): CheckedSpirometry => {
  const hidden = hiddenFilledSet(form);
  if (hidden) {
    const message = `There are numbers under ${setTitles[hidden]} bronchodilator. Choose "Given in this test" or clear them`;
    return { issues: [{ path: 'state', message }], tests: [] };
  }
  const filled = setsOf(form.state).filter((set) => isFilledSet(form[set]));
  if (filled.length === 0) return { issues: [nothingTyped(form)], tests: [] };
  const isEmpty = (path: string): boolean => textAt(form, path) === '';
  const checked: CheckedSpirometry = { issues: [], tests: [] };
  for (const set of filled) {
    const { rows, body } = plan(form, set, timeZone, filled.length > 1);
    const result = spirometryTestCreate.safeParse(body);
    checked.issues.push(...issuesOf(result, (path) => spirometryFormPath(path, { set, rows }), isEmpty));
    if (result.success) checked.tests.push({ set, rows, body: result.data });
  }
  return checked;
};
