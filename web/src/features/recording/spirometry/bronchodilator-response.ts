import { snap } from '@slighthill/shared/format';

/** Above this share of the predicted value a change is a response (rule GR-10; Stanojevic 2022, ERJ 60:2101499). */
const responsePercent = 10;

export interface BronchodilatorResponse {
  /** Change in percent of the predicted value. */
  percent: number;
  isResponse: boolean;
}

/** Rule GR-10: change after bronchodilator in percent of predicted; more than 10 is a response, 10 itself is not. */
export const bronchodilatorResponse = (
  before: number | null,
  after: number | null,
  predicted: number | null,
): BronchodilatorResponse | null => {
  if (before === null || after === null || predicted === null || predicted <= 0) return null;
  const percent = snap((100 * (after - before)) / predicted);
  return { percent, isResponse: percent > responsePercent };
};
