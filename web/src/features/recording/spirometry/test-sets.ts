import type { BlowRow, FormState, SetName, SpirometryForm, TestSet } from './spirometry-form';

const rowTexts = ['fev1', 'fvc', 'pef', 'fef2575', 'time', 'reason'] as const;

export const isEmptyRow = (row: BlowRow): boolean => rowTexts.every((name) => row[name].trim() === '');

export const isFilledSet = (set: TestSet): boolean =>
  set.entry === 'best'
    ? Object.values(set.best).some((text) => text.trim() !== '')
    : set.rows.some((row) => !isEmptyRow(row));

/** The sets a bronchodilator state opens, in the order of the tabs. */
export const setsOf = (state: FormState): readonly SetName[] => {
  if (state === 'given') return ['before', 'after'];
  return state === 'after' ? ['after'] : ['before'];
};

/** Numbers typed in a set that the chosen state does not open: they must not get lost unseen. */
export const hiddenFilledSet = (form: SpirometryForm): SetName | null => {
  const open = setsOf(form.state);
  return (['before', 'after'] as const).find((name) => !open.includes(name) && isFilledSet(form[name])) ?? null;
};

/** One test keeps its numbers when its state is corrected from before to after or back. */
export const withState = (form: SpirometryForm, state: FormState): SpirometryForm => {
  const from = setsOf(form.state)[0];
  const to = setsOf(state)[0];
  if (from === to) return { ...form, state };
  return { ...form, state, before: form.after, after: form.before };
};

export const maneuverCount = (set: TestSet): number => set.rows.filter((row) => !isEmptyRow(row)).length;

export const setWords = (set: TestSet): string => {
  if (set.entry === 'best') return isFilledSet(set) ? 'best values' : '';
  const count = maneuverCount(set);
  if (count === 0) return '';
  return count === 1 ? '1 maneuver' : `${count} maneuvers`;
};
