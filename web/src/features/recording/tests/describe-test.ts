import type { TestListItem } from '@slighthill/shared/contracts/measurement';
import { formatNumber } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import { formatResult, formatValue } from '../../../charts/format-measure';
import { stateWords } from '../../../charts/rule-words';
import type { TestDetail } from './test-detail';

type Listed = Pick<TestListItem, 'kind' | 'measure' | 'state' | 'values' | 'heightCm'>;

/** "1.43 L"; a score with its highest possible value, "18 of 40"; a grade as "grade 2". */
const words = (id: string, value: number): string => {
  if (!isMeasureId(id)) return String(value);
  const { unit, absolute } = getMeasure(id);
  if (unit.symbol === 'grade') return `grade ${formatValue(id, value)}`;
  const isScore = unit.ucum === '{score}' && absolute !== null;
  return isScore ? `${formatValue(id, value)} of ${absolute.max}` : formatResult(id, value, unit.symbol);
};

const isState = (state: string | null): state is keyof typeof stateWords => state !== null && state in stateWords;

/** What kind of test a row is. */
export const testName = ({ kind, measure }: Pick<Listed, 'kind' | 'measure'>): string => {
  if (kind === 'spirometry-test') return 'Spirometry';
  if (kind === 'body-size') return 'Body size';
  return measure ? getMeasure(measure).label : 'Result';
};

/** Its result in a line: "FEV1 1.43 L, FVC 2.36 L, after bronchodilator". */
export const testResultWords = ({ kind, measure, state, values, heightCm }: Listed): string => {
  if (kind === 'spirometry-test') {
    const best = (['fev1', 'fvc'] as const).flatMap((id) =>
      values[id] === undefined ? [] : [`${getMeasure(id).shortLabel} ${words(id, values[id])}`],
    );
    return [...best, ...(isState(state) ? [stateWords[state]] : [])].join(', ');
  }
  if (kind === 'body-size') {
    const height = heightCm === null ? [] : [`${formatNumber(heightCm, 1)} cm`];
    return [...height, ...(values.weight === undefined ? [] : [words('weight', values.weight)])].join(', ');
  }
  return measure && values[measure] !== undefined ? words(measure, values[measure]) : '';
};

/** How a sentence speaks of a test: "this spirometry test". */
export const thisTest = (detail: TestDetail): string => {
  if (detail.kind === 'spirometry-test') return 'this spirometry test';
  return detail.kind === 'body-size'
    ? 'this body size'
    : `this ${getMeasure(detail.measurement.measure).shortLabel} result`;
};
