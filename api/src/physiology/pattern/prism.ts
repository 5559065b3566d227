import { snap } from '@slighthill/shared/format';

/**
 * Preserved ratio, impaired spirometry (rule GR-6; GOLD): after bronchodilator, FEV1/FVC not under 0.70 and FEV1 under
 * 80 percent of predicted, both unrounded. False without a percent predicted.
 * @example isPrism({ ratioLow: false, fev1PercentPredicted: 79.99 }) // true
 */
export const isPrism = (test: { ratioLow: boolean; fev1PercentPredicted: number | null }): boolean =>
  !test.ratioLow && test.fev1PercentPredicted !== null && snap(test.fev1PercentPredicted) < 80;
