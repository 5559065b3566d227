import { getMeasure, type MeasureId } from '@slighthill/shared/measures';
import type { JudgedPattern } from '../pattern/judge-pattern';
import { getReferenceSet } from '../reference-sets/index';
import type { NotPredictable } from '../reference-sets/predict';
import type { JudgedMeasures, PredictionRequest } from './types';

const reasonWords: Partial<Record<NotPredictable, (set: string) => string>> = {
  'age-outside-set': (set) => `age is outside ${set}`,
  'no-weight': () => 'a weight is needed',
  'size-outside-set': () => 'height and weight are outside what the equation covers',
  'no-equation': () => 'no equation is used for it',
};

/** What a reader of a prediction should know: gaps, derived values and flags beside the pattern. */
export function predictionNotes(
  request: PredictionRequest,
  judged: JudgedMeasures,
  pattern: JudgedPattern | null,
): string[] {
  return [
    ...gaps(judged),
    ...(request.values.fev1fvc === undefined && judged.fev1fvc?.value != null
      ? ['FEV1/FVC was worked out from FEV1 and FVC.']
      : []),
    ...(judged.fev1?.zApproximate === undefined
      ? []
      : ['This set publishes no z-score; the one given is approximate and for display only.']),
    ...addOns(judged),
    ...(pattern?.notes ?? []),
  ];
}

/** One note per reason, naming the measures it holds for. */
function gaps(judged: JudgedMeasures): string[] {
  const byReason = new Map<string, string[]>();
  for (const [id, measure] of Object.entries(judged)) {
    const words = measure.reason ? reasonWords[measure.reason] : undefined;
    if (!words) continue;
    const title = measure.referenceSet ? getReferenceSet(measure.referenceSet).title : '';
    const reason = words(title);
    byReason.set(reason, [...(byReason.get(reason) ?? []), getMeasure(id as MeasureId).shortLabel]);
  }
  return [...byReason].map(([reason, names]) => `No predicted value for ${names.join(', ')}: ${reason}.`);
}

/** Hyperinflation and gas trapping (rule GR-5): above the upper limit of normal. */
function addOns(judged: JudgedMeasures): string[] {
  const above = (id: MeasureId) => judged[id]?.aboveUln === true;
  return [
    ...(above('frc') || above('tlc') ? ['Hyperinflation: FRC or TLC is above its upper limit of normal.'] : []),
    ...(above('rv') || above('rvtlc') ? ['Gas trapping: RV or RV/TLC is above its upper limit of normal.'] : []),
  ];
}
