import { expect, it } from 'vitest';
import { computeTrends } from './compute-trends';
import { result, spirometry, trendInput } from './testing/trend-input';

it('gives the rate of percent predicted beside the raw one, and none for a ratio or a score (rules TR-5, 0.4)', () => {
  // A constant FEV1 gains percent predicted, because the predicted value falls with age (rule TR-3).
  const measurements = ['2024-01-01', '2025-01-01', '2026-01-01'].flatMap((on) => [
    ...spirometry(on, 1.5, 3),
    result('cat', on, 20),
  ]);
  const [fev1, ratio, cat] = computeTrends(
    trendInput(measurements, { measures: ['fev1', 'fev1fvc', 'cat'] }, {}),
  ).series;
  expect(fev1?.ratePerYear?.value).toBeCloseTo(0, 9);
  expect(fev1?.percentPredictedRatePerYear?.value).toBeGreaterThan(0);
  const percents = fev1?.points.map((point) => point.percentPredicted ?? 0) ?? [];
  // Evenly spaced days but for the leap day of 2024: the slope of least squares is (last - first) / (2 years).
  const slope = ((percents[2] ?? 0) - (percents[0] ?? 0)) / (731 / 365.25);
  expect(fev1?.percentPredictedRatePerYear?.value).toBeCloseTo(slope, 2);
  expect(ratio?.percentPredictedRatePerYear).toBeNull();
  expect(cat?.percentPredictedRatePerYear).toBeNull();
});
