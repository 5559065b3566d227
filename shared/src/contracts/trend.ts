import { z } from 'zod';
import { isMeasureId, type MeasureId } from '../measures/registry';
import { ratioRules } from './clinic';
import { calendarDate, instantOut, uuid } from './common';
import { band, gradingRuleIds, pattern, referenceSetIds } from './prediction';
import { bronchodilatorStates } from './spirometry-test';

export const trendQuery = z.strictObject({
  measures: z
    .string()
    .max(600)
    .optional()
    .transform((list) => (list ? [...new Set(list.split(',').map((id) => id.trim()))] : null))
    .superRefine((ids, context) => {
      for (const id of ids ?? [])
        if (!isMeasureId(id)) context.addIssue({ code: 'custom', message: `${id} is not a measure` });
    })
    .transform((ids) => ids as MeasureId[] | null),
  referenceSet: z.enum(referenceSetIds, { error: 'There is no such reference set' }).optional(),
  gradingRule: z.enum(gradingRuleIds, { error: 'There is no such grading rule' }).optional(),
  ratioRule: z.enum(ratioRules, { error: 'Use fixed-ratio or lln' }).optional(),
  group: z.string().max(40).optional(),
  state: z.enum(bronchodilatorStates, { error: 'Use before, after, none or unknown' }).optional(),
  enrollment: uuid.optional(),
  includeLowQuality: z
    .enum(['true', 'false'], { error: 'Use true or false' })
    .optional()
    .transform((value) => value === 'true'),
});

const number = z.number().nullable();

export { band as trendBand };

export const trendPoint = z.object({
  takenAt: instantOut,
  takenOn: calendarDate,
  value: z.number(),
  predicted: number,
  percentPredicted: number,
  z: number,
  zApproximate: number.optional(),
  lln: number,
  band: z.string().nullable(),
  /** Present when it differs from the label of the band. */
  bandLabel: z.string().optional(),
  graded: z.boolean(),
  state: z.enum(bronchodilatorStates).nullable(),
  quality: z.string().nullable(),
  compared: z.boolean(),
  role: z.enum(['baseline', 'latest']).optional(),
  reason: z.string().optional(),
  heightCm: number,
  /** Present when the height was not measured. */
  heightMethod: z.string().optional(),
  /** Present when the height is that of an earlier visit. */
  heightCarried: z.literal(true).optional(),
  ageYears: z.number(),
  /** Present when any were recorded. */
  conditions: z.record(z.string(), z.unknown()).optional(),
  /** Absent for a measurement entered by itself. */
  sourceKind: z.string().optional(),
  sourceId: uuid,
});

export const verdicts = ['better', 'worse', 'within-variation', 'not-judged'] as const;

export const yardstick = z.object({
  id: z.string(),
  label: z.string(),
  threshold: z.number(),
  unit: z.string(),
  reached: z.boolean(),
});

export const trendChange = z.object({
  absolute: z.number(),
  relativePercent: number,
  verdict: z.enum(verdicts),
  yardsticks: z.array(yardstick),
});

const rate = z.object({ value: z.number(), low: z.number(), high: z.number() });

export const trendSeries = z.object({
  measure: z.string(),
  unit: z.string(),
  referenceSet: z.string().nullable(),
  gradingRule: z.string().nullable(),
  state: z.enum(bronchodilatorStates).nullable(),
  bands: z.array(band),
  points: z.array(trendPoint),
  baseline: trendPoint.nullable(),
  latest: trendPoint.nullable(),
  change: trendChange.nullable(),
  /** Half-width, in the raw unit, of the change drawn as too small to count. */
  zone: number,
  ratePerYear: rate.nullable(),
  /** The same for percent predicted, in percentage points; null without predictions. */
  percentPredictedRatePerYear: rate.nullable(),
  notes: z.array(z.string()),
});

/** The pattern with the numbers it rests on, so that a page can print them without working anything out. */
export const trendPattern = pattern
  .extend({
    values: z.object({
      takenOn: calendarDate,
      state: z.enum(bronchodilatorStates),
      referenceSet: z.string(),
      ratio: number,
      ratioLln: number,
      fev1PercentPredicted: number,
      tlcPercentPredicted: number,
    }),
  })
  .nullable();

export const trendResponse = z.object({
  pattern: trendPattern,
  enrollment: z.object({ id: uuid, startOn: calendarDate, endOn: calendarDate.nullable() }).nullable(),
  series: z.array(trendSeries),
});

export type TrendQuery = z.infer<typeof trendQuery>;
export type TrendResponse = z.infer<typeof trendResponse>;
export type TrendSeries = z.infer<typeof trendSeries>;
export type TrendPoint = z.infer<typeof trendPoint>;
export type TrendBand = z.infer<typeof band>;
export type TrendPattern = z.infer<typeof trendPattern>;
export type Verdict = (typeof verdicts)[number];
