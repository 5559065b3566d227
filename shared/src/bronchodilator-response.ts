import { snap } from './format';

const isVolume = (value: number | null): value is number => value !== null && value > 0;

export interface BronchodilatorResponse {
  /** Change in percent of the predicted value. */
  percent: number;
  isResponse: boolean;
}

/**
 * Bronchodilator response by the 2021 rule (GR-10; Stanojevic 2022, ERJ 60:2101499), the default: the change of FEV1 or
 * FVC as percent of the predicted value, a response when it is more than 10; 10 itself is none. All three in the same
 * unit. Null without a pair of volumes above 0 and a predicted value.
 * @example bronchodilatorResponse(2, 2.3, 3) // { percent: 10, isResponse: false }
 */
export function bronchodilatorResponse(
  before: number | null,
  after: number | null,
  predicted: number | null,
): BronchodilatorResponse | null {
  if (!isVolume(before) || !isVolume(after) || !isVolume(predicted)) return null;
  const percent = snap((100 * (after - before)) / predicted);
  return { percent, isResponse: percent > 10 };
}

/**
 * Bronchodilator response by the 2005 rule (GR-9; Pellegrino 2005, ERJ 26:948): a rise of FEV1 or FVC, in whole mL, of
 * 12 percent of the earlier value and of 200 mL. Sources print "at least" and "more than"; at least is used here. Null
 * without a pair of volumes above 0.
 * @example isResponseBy2005(1500, 1700) // true
 */
export function isResponseBy2005(beforeMl: number | null, afterMl: number | null): boolean | null {
  if (!isVolume(beforeMl) || !isVolume(afterMl)) return null;
  const changeMl = afterMl - beforeMl;
  return 100 * changeMl >= 12 * beforeMl && changeMl >= 200;
}
