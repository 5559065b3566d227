import type { TrendBand } from '@slighthill/shared/contracts/trend';
import { edgesOf, formatNumber, formatPercentPredicted, formatZ, zEdges } from '@slighthill/shared/format';
import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import type { TrendView } from './trend-view';

const decimalsOf = (measure: string): number => (isMeasureId(measure) ? getMeasure(measure).decimals : 2);

/** A result without its unit, with the decimals its registry entry declares. */
export const formatValue = (measure: string, value: number): string => formatNumber(value, decimalsOf(measure));

const withUnit = (text: string, unit: string): string => {
  if (unit === '') return text;
  return unit === '%' ? `${text}%` : `${text} ${unit}`;
};

/** A unit that the measure's name already says: "mMRC breathlessness grade". */
export const unitInName = (measure: string, unit: string): boolean =>
  unit.length > 2 && isMeasureId(measure) && getMeasure(measure).label.toLowerCase().split(' ').includes(unit);

/** "1.32 L", "352 m", "91%", "17". */
export const formatResult = (measure: string, value: number, unit: string): string =>
  withUnit(formatValue(measure, value), unitInName(measure, unit) ? '' : unit);

/** A change of this size in words; one grade is not "1 grades". */
export const formatAmount = (measure: string, amount: number, unit: string): string => {
  const text = formatValue(measure, Math.abs(amount));
  return withUnit(text, unit === 'grade' && text !== '1' ? 'grades' : unit);
};

/** A point's number in a view, with the decimals that keep it in its band (rule 0.4). */
export const formatInView = (
  measure: string,
  value: number,
  view: TrendView,
  unit: string,
  bands: readonly TrendBand[],
): string => {
  if (view === 'value') return formatResult(measure, value, unit);
  const own = edgesOf(bands.filter((band) => band.quantity === view));
  return view === 'z' ? formatZ(value, [...zEdges, ...own]) : formatPercentPredicted(value, own);
};
