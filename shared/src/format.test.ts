import { describe, expect, it } from 'vitest';
import { edgesOf, formatChange, formatNumber, formatPercentPredicted, formatZ, roundHalfAway, snap } from './format';

describe('rounding for display (rule 0.4)', () => {
  it.each([
    [2.3456, 2, '2.35'],
    [0.4748, 2, '0.47'],
    [26.3656, 1, '26.4'],
    [529.46, 0, '529'],
    [34.755, 0, '35'],
    [-2.7532, 2, '\u22122.75'],
    [1.005, 2, '1.01'],
    [-1.005, 2, '\u22121.01'],
    [2.5, 0, '3'],
    [-0.001, 2, '0.00'],
    [0.1 + 0.2, 1, '0.3'],
  ])('%d to %d decimals is %s', (value, decimals, expected) => {
    expect(formatNumber(value, decimals)).toBe(expected);
  });

  it('shows the sign of a change', () => {
    expect(formatChange(0.1, 2)).toBe('+0.10');
    expect(formatChange(-0.1, 2)).toBe('\u22120.10');
    expect(formatChange(0, 2)).toBe('0.00');
  });
});

describe('percent predicted with the fewest decimals that keep its band (rule 0.4)', () => {
  const edges = [80, 70, 60, 50, 35, 30].map((at) => ({ at }));
  it.each([
    [57.13, '57%'],
    [79.6, '79.6%'],
    [79.96, '79.96%'],
    [59.99, '59.99%'],
    [80.01, '80%'],
    [69.5, '69.5%'],
    [59.998, '<60%'],
    [49.99, '49.99%'],
    [70, '70%'],
  ])('%d is shown as %s', (value, expected) => {
    expect(formatPercentPredicted(value, edges)).toBe(expected);
  });

  it('knows an edge that belongs to the lower band (DLCO 2005: 40 to 60)', () => {
    const dlco = edgesOf([
      { from: null, to: 40 },
      { from: 40, to: 60, toInclusive: true },
      { from: 60, to: null },
    ]);
    expect(formatPercentPredicted(60, dlco)).toBe('60%');
    expect(formatPercentPredicted(60.1, dlco)).toBe('60.1%');
    expect(formatPercentPredicted(60.004, dlco)).toBe('>60%');
  });

  it('rounds freely where there are no bands', () => {
    expect(formatPercentPredicted(79.6)).toBe('80%');
  });
});

// Rule 0.4, last paragraph, and the edges of rule GR-4.
it.each([
  [-2.7532, '\u22122.75'],
  [-1.6451, '\u22121.6451'],
  [-1.645, '\u22121.645'],
  [-1.6, '\u22121.60'],
  [-2.5, '\u22122.50'],
  [-2.5001, '\u22122.5001'],
  [-4.0001, '\u22124.0001'],
  [0, '0.00'],
])('a z of %d is shown as %s', (z, expected) => {
  expect(formatZ(z)).toBe(expected);
});

// Rule 0.3: the true ratio of each pair is exactly 0.70.
it.each([
  [0.567, 0.81],
  [1.134, 1.62],
  [2.268, 3.24],
  [2.877, 4.11],
  [2.905, 4.15],
  [2.933, 4.19],
  [2.961, 4.23],
  [4.536, 6.48],
])('%d over %d is below 0.70 in doubles and not once snapped', (fev1, fvc) => {
  expect(fev1 / fvc).toBeLessThan(0.7);
  expect(snap(fev1 / fvc)).toBe(0.7);
});

it('rounds numbers too small to have digits', () => {
  expect(roundHalfAway(1e-12, 2)).toBe(0);
  expect(Object.is(roundHalfAway(-1e-12, 2), -0)).toBe(false);
});
