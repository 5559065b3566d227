import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bandOf } from './band-of';
import { findGradingRule, gradingRuleFor, gradingRules } from './index';
import { atsErs2005, dlco2005, ersAts2021Fev1, gold, tlcPercent } from './lung-rules';
import { catBands, gad7Bands, hadsBands, phq9Bands } from './score-rules';

const clinic = { fev1SeverityRule: 'ats-ers-2005', tlcSeverityRule: 'tlc-percent' } as const;

// Rule GR-8, last table: ATS/ERS 2005 (Pellegrino 2005), GOLD grades and the handbook bands of TLC. The TLC column is
// the band table of common practice: 80 and over not restricted, 70 to under 80 mild, 50 to under 70 moderate.
it.each([
  [80, 'mild', 'gold-1', 'normal'],
  [79.96, 'mild', 'gold-2', 'mild'],
  [79.6, 'mild', 'gold-2', 'mild'],
  [79.4, 'mild', 'gold-2', 'mild'],
  [70, 'mild', 'gold-2', 'mild'],
  [69.99, 'moderate', 'gold-2', 'moderate'],
  [69.5, 'moderate', 'gold-2', 'moderate'],
  [60, 'moderate', 'gold-2', 'moderate'],
  [59.5, 'moderately-severe', 'gold-2', 'moderate'],
  [50, 'moderately-severe', 'gold-2', 'moderate'],
  [49.99, 'severe', 'gold-3', 'severe'],
  [35, 'severe', 'gold-3', 'severe'],
  [34.9, 'very-severe', 'gold-3', 'severe'],
  [30, 'very-severe', 'gold-3', 'severe'],
  [29.99, 'very-severe', 'gold-4', 'severe'],
])('%d percent', (percent, ats, goldGrade, tlc) => {
  expect(bandOf(atsErs2005, percent).id).toBe(ats);
  expect(bandOf(gold, percent).id).toBe(goldGrade);
  expect(bandOf(tlcPercent, percent).id).toBe(tlc);
});

// Rule GR-4 (Stanojevic 2022).
it.each([
  [-1.6, 'normal'],
  [-1.645, 'normal'],
  [-1.6451, 'mild'],
  [-2.499, 'mild'],
  [-2.5, 'mild'],
  [-2.5001, 'moderate'],
  [-4, 'moderate'],
  [-4.0001, 'severe'],
  [-4.05, 'severe'],
])('z %d is %s', (z, band) => {
  expect(bandOf(ersAts2021Fev1, z).id).toBe(band);
});

// Rule GR-14 (Pellegrino 2005): 60 and 40 percent belong to the moderate band.
it.each([
  [60.1, 'mild'],
  [60, 'moderate'],
  [40, 'moderate'],
  [39.99, 'severe'],
])('DLCO %d percent is %s', (percent, band) => {
  expect(bandOf(dlco2005, percent).id).toBe(band);
});

// Rules OM-0 and OM-1.
it.each([
  [catBands, 9, 'low'],
  [catBands, 10, 'medium'],
  [catBands, 20, 'medium'],
  [catBands, 21, 'high'],
  [catBands, 30, 'high'],
  [catBands, 31, 'very-high'],
  [phq9Bands, 4, 'minimal'],
  [phq9Bands, 9, 'mild'],
  [phq9Bands, 10, 'moderate'],
  [phq9Bands, 15, 'moderately-severe'],
  [phq9Bands, 20, 'severe'],
  [gad7Bands, 4, 'minimal'],
  [gad7Bands, 14, 'moderate'],
  [gad7Bands, 15, 'severe'],
  [hadsBands, 7, 'normal'],
  [hadsBands, 8, 'possible'],
  [hadsBands, 11, 'probable'],
] as const)('%# %d', (rule, value, band) => {
  expect(bandOf(rule, value).id).toBe(band);
});

it('snaps before it compares (rule 0.2)', () => {
  expect(bandOf(tlcPercent, 80 - 1e-12).id).toBe('normal');
  expect(() => bandOf(tlcPercent, Number.NaN)).toThrow(RangeError);
});

describe.each(gradingRules.map((rule) => [`${rule.id} ${rule.measures.join(' ')}`, rule] as const))('%s', (_, rule) => {
  const seed = 2005;
  it('covers the whole line without gap or overlap', () => {
    const edges = rule.bands.flatMap((band) => [band.from, band.to]).filter((edge) => edge !== null);
    const contains = (value: number) =>
      rule.bands.filter(({ from, to, toInclusive }) => {
        const sharesEdge = rule.bands.some((other) => other.toInclusive && other.to === from);
        const aboveFrom = from === null || (sharesEdge ? value > from : value >= from);
        return aboveFrom && (to === null || (toInclusive ? value <= to : value < to));
      });
    const check = (value: number) => {
      const holding = contains(value);
      expect(holding).toHaveLength(1);
      expect(bandOf(rule, value)).toBe(holding[0]);
    };
    for (const edge of edges) for (const value of [edge, edge - 1e-6, edge + 1e-6]) check(value);
    fc.assert(
      fc.property(fc.integer({ min: -20_000_000, max: 20_000_000 }), (n) => check(n / 100_000)),
      { seed, verbose: true },
    );
    expect(new Set(rule.bands.map((band) => band.id)).size).toBe(rule.bands.length);
  });
});

describe('choosing a rule (rule GR-0)', () => {
  it('takes the chosen one where it covers the measure, else the clinic and registry defaults', () => {
    expect(gradingRuleFor('fev1', null, clinic)?.id).toBe('ats-ers-2005');
    expect(gradingRuleFor('fev1', 'gold', clinic)?.id).toBe('gold');
    expect(gradingRuleFor('tlc', 'gold', clinic)?.id).toBe('tlc-percent');
    expect(gradingRuleFor('tlc', 'ers-ats-2021', clinic)?.id).toBe('ers-ats-2021');
    expect(gradingRuleFor('dlco', 'gold', clinic)?.id).toBe('dlco-2005');
    expect(gradingRuleFor('cat', 'gold', clinic)?.measures).toEqual(['cat']);
    expect(gradingRuleFor('fvc', null, clinic)).toBeNull();
    expect(gradingRuleFor('fev1', null, { ...clinic, fev1SeverityRule: 'ers-ats-2021' })?.quantity).toBe('z');
    expect(findGradingRule('fev1', 'tlc-percent')).toBeNull();
  });

  it('gives GOLD and z bands the color steps of rule GR-0', () => {
    expect(gold.bands.map((band) => band.colorStep)).toEqual([1, 2, 4, 5]);
    expect(ersAts2021Fev1.bands.map((band) => band.colorStep)).toEqual([null, 2, 4, 5]);
  });
});
