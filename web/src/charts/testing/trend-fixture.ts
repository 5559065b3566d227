import type { TrendBand, TrendPoint, TrendResponse, TrendSeries } from '@slighthill/shared/contracts/trend';

/** An invented man of 67 with COPD: seven FEV1 results in three bronchodilator states, a walk test and two scores. */
const testId = (index: number): string => `00000000-0000-4000-8000-${String(index).padStart(12, '0')}`;

export const aPoint = (takenOn: string, value: number, more: Partial<TrendPoint> = {}): TrendPoint => ({
  takenAt: `${takenOn}T16:00:00.000Z`,
  takenOn,
  value,
  predicted: null,
  percentPredicted: null,
  z: null,
  lln: null,
  band: null,
  graded: false,
  state: null,
  quality: null,
  compared: true,
  heightCm: null,
  ageYears: 67.5,
  sourceId: testId(Number(takenOn.replaceAll('-', ''))),
  ...more,
});

export const aSeries = (measure: string, points: TrendPoint[], more: Partial<TrendSeries> = {}): TrendSeries => ({
  measure,
  unit: '',
  referenceSet: null,
  gradingRule: null,
  state: null,
  bands: [],
  points,
  baseline: points.find((point) => point.role === 'baseline') ?? null,
  latest: points.find((point) => point.role === 'latest') ?? null,
  change: null,
  zone: null,
  ratePerYear: null,
  percentPredictedRatePerYear: null,
  notes: [],
  ...more,
});

const fev1 = (takenOn: string, value: number, percent: number, z: number, more: Partial<TrendPoint>): TrendPoint =>
  aPoint(takenOn, value, {
    predicted: (100 * value) / percent,
    percentPredicted: percent,
    z,
    lln: 2.2,
    band: 'severe',
    graded: true,
    state: 'after',
    quality: 'A',
    heightCm: 174.5,
    sourceKind: 'spirometry-test',
    sourceId: testId(Math.round(Number(takenOn.replaceAll('-', '')) * 1000 + percent * 10)),
    ...more,
  });

/** Rule GR-3, ATS/ERS 2005 (Pellegrino 2005, ERJ 26:948). */
export const atsErsBands: TrendBand[] = [
  { id: 'mild', label: 'mild', quantity: 'percent-predicted', from: 70, to: null, colorStep: 1 },
  { id: 'moderate', label: 'moderate', quantity: 'percent-predicted', from: 60, to: 70, colorStep: 2 },
  {
    id: 'moderately-severe',
    label: 'moderately severe',
    quantity: 'percent-predicted',
    from: 50,
    to: 60,
    colorStep: 3,
  },
  { id: 'severe', label: 'severe', quantity: 'percent-predicted', from: 35, to: 50, colorStep: 4 },
  { id: 'very-severe', label: 'very severe', quantity: 'percent-predicted', from: null, to: 35, colorStep: 5 },
];

const leftOut = (reason: string): Partial<TrendPoint> => ({ compared: false, reason });

export const fev1Series = aSeries(
  'fev1',
  [
    fev1('2026-02-24', 1.24, 41, -3.5, { state: 'before', ...leftOut('taken before bronchodilator') }),
    fev1('2026-05-19', 1.27, 42.2, -3.42, { state: 'unknown', ...leftOut('bronchodilator not stated') }),
    fev1('2026-08-31', 1.21, 40.3, -3.55, { state: 'before', ...leftOut('taken before bronchodilator') }),
    fev1('2026-08-31', 1.32, 44, -3.3, { role: 'baseline' }),
    fev1('2026-09-28', 1.35, 45, -3.22, {}),
    fev1('2026-10-12', 1.29, 43, -3.36, { state: 'before', ...leftOut('taken before bronchodilator') }),
    fev1('2026-10-12', 1.38, 46, -3.15, { role: 'latest' }),
  ],
  {
    unit: 'L',
    referenceSet: 'gli-global-2022',
    gradingRule: 'ats-ers-2005',
    state: 'after',
    bands: atsErsBands,
    change: {
      absolute: 0.06,
      relativePercent: 4.5,
      verdict: 'within-variation',
      yardsticks: [
        { id: 'important-difference', label: 'Important difference', threshold: 0.1, unit: 'L', reached: false },
        {
          id: 'test-variability',
          label: 'Test variability, week to week, COPD',
          threshold: 20,
          unit: '%',
          reached: false,
        },
      ],
    },
    zone: 0.264,
    notes: [
      '3 points not compared: taken before bronchodilator.',
      '1 point not compared: bronchodilator not stated.',
      'No rate per year: 3 comparable days over 42 days, 90 needed.',
    ],
  },
);

const ratioPoint = (takenOn: string, value: number, more: Partial<TrendPoint> = {}): TrendPoint =>
  aPoint(takenOn, value, {
    predicted: 0.77,
    z: -3.4,
    lln: 0.64,
    state: 'after',
    sourceKind: 'spirometry-test',
    ...more,
  });

export const ratioSeries = aSeries(
  'fev1fvc',
  [
    ratioPoint('2026-08-31', 0.4748, { role: 'baseline' }),
    ratioPoint('2026-09-28', 0.477),
    ratioPoint('2026-10-12', 0.479, { role: 'latest' }),
  ],
  {
    referenceSet: 'gli-global-2022',
    state: 'after',
    change: { absolute: 0.0042, relativePercent: 0.9, verdict: 'not-judged', yardsticks: [] },
  },
);

const improved = (absolute: number): Partial<TrendSeries> => ({
  change: { absolute, relativePercent: null, verdict: 'better', yardsticks: [] },
});

export const walkSeries = aSeries(
  'sixMinuteWalkDistance',
  [
    aPoint('2026-08-31', 310, {
      role: 'baseline',
      predicted: 529,
      percentPredicted: 58.6,
      lln: 376,
      conditions: { courseM: 30, walks: 1, oxygenLpm: 2 },
    }),
    aPoint('2026-10-12', 352, {
      role: 'latest',
      predicted: 528,
      percentPredicted: 66.7,
      lln: 375,
      conditions: { courseM: 30, walks: 1, oxygenLpm: 2 },
    }),
  ],
  { unit: 'm', referenceSet: 'enright-sherrill-1998', zone: 30, ...improved(42) },
);

export const catSeries = aSeries(
  'cat',
  [
    aPoint('2026-08-31', 22, { role: 'baseline', band: 'high', graded: true }),
    aPoint('2026-09-14', 21, { band: 'high', graded: true }),
    aPoint('2026-09-28', 19, { band: 'medium', graded: true }),
    aPoint('2026-10-12', 17, { role: 'latest', band: 'medium', graded: true }),
  ],
  {
    gradingRule: 'default',
    bands: [
      { id: 'low', label: 'low impact', quantity: 'value', from: null, to: 10, colorStep: 1 },
      { id: 'medium', label: 'medium impact', quantity: 'value', from: 10, to: 21, colorStep: 2 },
      { id: 'high', label: 'high impact', quantity: 'value', from: 21, to: 31, colorStep: 4 },
      { id: 'very-high', label: 'very high impact', quantity: 'value', from: 31, to: null, colorStep: 5 },
    ],
    zone: 2,
    ...improved(-5),
  },
);

export const mmrcSeries = aSeries(
  'mmrc',
  [aPoint('2026-08-31', 3, { role: 'baseline' }), aPoint('2026-10-12', 2, { role: 'latest' })],
  { unit: 'grade', zone: 1, ...improved(-1) },
);

export const aTrendResponse = (more: Partial<TrendResponse> = {}): TrendResponse => ({
  pattern: {
    id: 'obstruction',
    label: 'Obstructive',
    heading: 'Obstructive pattern, severe',
    provisional: false,
    ratioRule: 'fixed-ratio',
    lowByFixedRatio: true,
    lowByLln: true,
    spirometryTestId: testId(1),
    tlcMeasurementId: testId(2),
    severity: { rule: 'ats-ers-2005', measure: 'fev1', bandId: 'severe', label: 'severe' },
    notes: [],
    values: {
      takenOn: '2026-10-12',
      state: 'after',
      referenceSet: 'gli-global-2022',
      ratio: 0.479,
      ratioLln: 0.64,
      fev1PercentPredicted: 46,
      tlcPercentPredicted: 112,
    },
  },
  enrollment: { id: testId(3), startOn: '2026-09-14', endOn: '2026-12-09' },
  series: [fev1Series, ratioSeries, walkSeries, mmrcSeries, catSeries],
  ...more,
});
