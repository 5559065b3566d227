import { formatNumber } from '@slighthill/shared/format';
import { isDefined, type FormQuestion } from '../forms/form-question';
import {
  changeQuestion,
  heightQuestion,
  plausibleQuestion,
  typed,
  weightQuestion,
  type Earlier,
} from '../forms/number-questions';
import { bestPreview } from './best-preview';
import type { BestRow, SetName, SpirometryForm, TestSet } from './spirometry-form';
import { setsOf } from './test-sets';

/** The patient's last results, for what is asked when a new one is far from them. */
export interface SpirometryEarlier {
  heightCm: Earlier | null;
  weightKg: Earlier | null;
  fev1: Earlier | null;
  fvc: Earlier | null;
}

const asked = [
  { id: 'fev1', name: 'FEV1' },
  { id: 'fvc', name: 'FVC' },
  { id: 'pef', name: 'PEF' },
  { id: 'fef2575', name: 'FEF25-75' },
] as const;

/** FEV1 equal to FVC is possible but seldom right: asked about, while FEV1 above FVC is refused. */
const equalQuestion = (row: BestRow, path: string, where: string): FormQuestion | null => {
  const [fev1, fvc] = [typed(row.fev1), typed(row.fvc)];
  if (fev1 === null || fev1 !== fvc) return null;
  return {
    key: `${path}:equal:${fev1}`,
    field: `${path}.fvc`,
    text: `${where}: FEV1 equals FVC (${formatNumber(fev1, 2)} L). Is that right?`,
    mayStand: true,
  };
};

const rowQuestions = (row: BestRow, path: string, where: string): (FormQuestion | null)[] => [
  equalQuestion(row, path, where),
  ...asked.map(({ id, name }) => plausibleQuestion(id, row[id], `${path}.${id}`, `${where}, ${name}`)),
];

const setQuestions = (
  name: SetName,
  set: TestSet,
  earlier: SpirometryEarlier,
  words: string,
): (FormQuestion | null)[] => {
  const best = bestPreview(set);
  const rows =
    set.entry === 'best'
      ? rowQuestions(set.best, `${name}.best`, `${words}best values`)
      : set.rows.flatMap((row, index) => rowQuestions(row, `${name}.rows.${index}`, `${words}maneuver ${index + 1}`));
  const at = (row: number | null): string => (row === null ? `${name}.best` : `${name}.rows.${row}`);
  return [
    ...rows,
    changeQuestion('fev1', best.fev1, earlier.fev1, `${at(best.fev1Row)}.fev1`, 'FEV1'),
    changeQuestion('fvc', best.fvc, earlier.fvc, `${at(best.fvcRow)}.fvc`, 'FVC'),
  ];
};

const setWords: Record<SetName, string> = { before: 'Before, ', after: 'After, ' };
const upperFirst = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** Everything the form asks, in the order of its fields. */
export const spirometryQuestions = (form: SpirometryForm, earlier: SpirometryEarlier): FormQuestion[] => {
  const open = setsOf(form.state);
  return [
    heightQuestion(form.heightCm, earlier.heightCm),
    weightQuestion(form.weightKg, earlier.weightKg),
    ...open.flatMap((name) => setQuestions(name, form[name], earlier, open.length > 1 ? setWords[name] : '')),
  ]
    .filter(isDefined)
    .map((question) => ({ ...question, text: upperFirst(question.text) }));
};

/** The tab a field of the form stands on; null for the fields above the tabs. */
export const setOfField = (field: string): SetName | null =>
  field.startsWith('before.') ? 'before' : field.startsWith('after.') ? 'after' : null;
