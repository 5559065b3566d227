import { bronchodilatorResponse } from '@slighthill/shared/bronchodilator-response';
import { formatNumber } from '@slighthill/shared/format';
import { referenceSetLabel } from '../../../charts/rule-words';
import { formatDayMonth } from '../../../lib/clinic-time';
import type { Earlier } from '../forms/number-questions';
import type { DerivedSet } from './derived-rows';

/** What the predictions rest on: "GLI Global 2022, age 65.4, 165.0 cm from Aug 24." */
export const basisWords = (ageYears: number, heightCm: number | null, carried: Earlier | null): string => {
  if (heightCm === null) return 'No percent predicted until there is a height.';
  if (!(ageYears >= 18 && ageYears <= 100)) return 'No percent predicted: the age is outside 18 to 100 years.';
  const height = `${formatNumber(heightCm, 1)} cm${carried ? ` from ${formatDayMonth(carried.on)}` : ''}`;
  return `${referenceSetLabel('gli-global-2022')}, age ${formatNumber(ageYears, 1)}, ${height}.`;
};

/** Rule GR-10 for FEV1 and FVC in one sentence; null without a pair and its predictions. */
export const responseWords = (sets: readonly DerivedSet[]): string | null => {
  const [first, second] = sets;
  if (!first || !second) return null;
  const found = (['fev1', 'fvc'] as const).flatMap((id) => {
    const predicted = second.prediction?.measures[id]?.predicted ?? null;
    const response = bronchodilatorResponse(first.best[id], second.best[id], predicted);
    return response ? [{ name: id.toUpperCase(), ...response }] : [];
  });
  if (found.length === 0) return null;
  const changes = found.map(({ name, percent }) => `${name} ${formatNumber(percent, 1)}%`).join(', ');
  const reached = found.some(({ isResponse }) => isResponse) ? 'reached' : 'not reached';
  return `Bronchodilator change in percent of predicted: ${changes}. A response is more than 10% in either (ERS/ATS 2021): ${reached}.`;
};
