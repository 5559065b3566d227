import { judgePattern, type JudgedPattern, type PatternRules } from '../pattern/judge-pattern';
import { isBelowFixedRatio, isRatioBelowFixed } from '../spirometry/fixed-ratio';
import type { JudgedMeasures, PredictionRequest } from './types';

type OneJudged = NonNullable<JudgedMeasures['fev1']>;

const known = (measure: OneJudged | undefined) =>
  measure?.value != null && measure.belowLln !== null
    ? { ...measure, value: measure.value, belowLln: measure.belowLln }
    : null;

/**
 * Pattern of the values of a prediction (rule GR-5), or null where FEV1, FVC or the ratio is missing or has no
 * prediction. The ratio that was given is judged as given; one that was derived is judged on whole milliliters.
 */
export function predictionPattern(
  request: Pick<PredictionRequest, 'values' | 'bronchodilator'>,
  judged: JudgedMeasures,
  rules: PatternRules,
): JudgedPattern | null {
  const [fev1, fvc, ratio] = [known(judged.fev1), known(judged.fvc), known(judged.fev1fvc)];
  if (!fev1 || !fvc || !ratio) return null;
  const ratioLowByFixed =
    request.values.fev1fvc === undefined
      ? isBelowFixedRatio(fev1.value * 1000, fvc.value * 1000)
      : isRatioBelowFixed(ratio.value);
  return judgePattern(
    {
      ratioLowByFixed,
      ratioLowByLln: ratio.belowLln,
      fev1,
      fvc,
      tlc: known(judged.tlc),
      tlcUnjudged: judged.tlc?.value != null ? 'TLC has no predicted value' : null,
      state: request.bronchodilator ?? 'unknown',
    },
    rules,
  );
}
