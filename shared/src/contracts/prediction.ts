import { z } from 'zod';
import { gradingRuleIds, referenceGroups, referenceSetIds } from '../vocabulary';
import { isMeasureId, type MeasureId } from '../measures/registry';
import { ratioRules } from './clinic';
import { between, heightCm, weightKg } from './common';
import { diagnosisGroups, sexesForPrediction } from './patient';
import { bronchodilatorStates } from './spirometry-test';

export { gradingRuleIds, referenceGroups, referenceSetIds };
export type { ReferenceSetId } from '../vocabulary';

const positive = z.number({ error: 'Must be a number' }).positive('Must be more than 0');

export const predictionBody = z.strictObject({
  referenceSet: z.enum(referenceSetIds, { error: 'Choose a reference set' }),
  sex: z.enum(sexesForPrediction, { error: 'Choose male or female' }),
  ageYears: between('Age', 18, 100, 'years'),
  heightCm,
  weightKg: weightKg.optional(),
  group: z.string().max(40).optional(),
  /** Optional context so that a preview grades as the stored test will. */
  bronchodilator: z.enum(bronchodilatorStates).optional(),
  diagnosisGroup: z.enum(diagnosisGroups).optional(),
  diagnosisConfirmed: z.boolean().optional(),
  ratioRule: z.enum(ratioRules).optional(),
  gradingRule: z.enum(gradingRuleIds).optional(),
  values: z
    .record(z.string(), positive)
    .superRefine((values, context) => {
      for (const id of Object.keys(values))
        if (!isMeasureId(id)) context.addIssue({ code: 'custom', path: [id], message: `${id} is not a measure` });
    })
    .transform((values) => values as Partial<Record<MeasureId, number>>),
});

const number = z.number().nullable();

export const predictedMeasure = z.object({
  referenceSet: z.string().nullable(),
  predicted: number,
  lln: number,
  uln: number,
  value: number,
  percentPredicted: number,
  z: number,
  zApproximate: number.optional(),
  reason: z.string().optional(),
});

export const patternSeverity = z
  .object({ rule: z.string(), measure: z.string(), bandId: z.string(), label: z.string() })
  .nullable();

export const pattern = z.object({
  id: z.string(),
  label: z.string(),
  heading: z.string(),
  provisional: z.boolean(),
  ratioRule: z.enum(ratioRules),
  lowByFixedRatio: z.boolean().nullable(),
  lowByLln: z.boolean().nullable(),
  spirometryTestId: z.string().nullable(),
  tlcMeasurementId: z.string().nullable(),
  severity: patternSeverity,
  notes: z.array(z.string()),
});

export const grade = z.object({ rule: z.string(), measure: z.string(), bandId: z.string(), label: z.string() });

/** Half-open, from included and to excluded, unless `toInclusive`; null is without limit. */
export const band = z.object({
  id: z.string(),
  label: z.string(),
  quantity: z.enum(['percent-predicted', 'z', 'value']),
  from: number,
  to: number,
  toInclusive: z.boolean().optional(),
  colorStep: z.int().nullable().optional(),
});

export const predictionResponse = z.object({
  referenceSet: z.string(),
  measures: z.record(z.string(), predictedMeasure),
  pattern: pattern.nullable().optional(),
  grades: z.array(grade).optional(),
  /** Bands of the rule that grades each value given. */
  bands: z.record(z.string(), z.array(band)).optional(),
  notes: z.array(z.string()),
});

export type PredictionBody = z.infer<typeof predictionBody>;
export type PredictionResponse = z.infer<typeof predictionResponse>;
export type PredictedMeasure = z.infer<typeof predictedMeasure>;
export type Pattern = z.infer<typeof pattern>;
