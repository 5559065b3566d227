import { z } from 'zod';
import { checkValue, getMeasure, isMeasureId, measureIds, type Measure } from '../measures/registry';
import {
  amendReason,
  calendarDate,
  cursorQuery,
  heightCm,
  heightMethods,
  instant,
  instantOut,
  listOf,
  numberField,
  optionalText,
  person,
  revision,
  uuid,
  version,
  voided,
  weightKg,
} from './common';
import { checkConditions } from './conditions';

export const safetyAnswers = ['0', '1', '2', '3', 'not-answered'] as const;
export type SafetyAnswer = (typeof safetyAnswers)[number];

/** The ninth answer of a PHQ-9: 0 to 3, or said to be missing. Read as text so that a form and the API agree. */
const item9 = z
  .union([z.literal([0, 1, 2, 3]), z.enum(safetyAnswers)], { error: 'Enter 0, 1, 2, 3 or not answered' })
  .transform((answer) => String(answer) as SafetyAnswer);

const conditionValue = z.union([z.number(), z.boolean(), z.string().max(60)], {
  error: 'Must be a number, yes or no, or one of the choices',
});
export const conditions = z.record(z.string().max(40), conditionValue);

/** A total its one answer leaves no room for: both are read off the same sheet, so one of them is mistyped. */
function totalProblem({ safetyItem, shortLabel }: Measure, total: number, answer: SafetyAnswer): string | null {
  if (!safetyItem) return null;
  const answered = answer === 'not-answered' ? 0 : Number(answer);
  const most = safetyItem.maxOfOthers + answered;
  if (total < answered) return `The ${shortLabel} total cannot be less than its ninth answer, ${answered}`;
  if (total <= most) return null;
  const given = answer === 'not-answered' ? 'Without the ninth answer' : `With ${answered} as the ninth answer`;
  return `${given} the ${shortLabel} total is at most ${most}`;
}

const fields = {
  takenAt: instant,
  value: numberField('The value'),
  heightCm: heightCm.nullish().transform((value) => value ?? null),
  heightMethod: z.enum(heightMethods).default('measured'),
  weightKg: weightKg.nullish().transform((value) => value ?? null),
  conditions: conditions.default({}),
  item9: item9.nullish().transform((value) => value ?? null),
  note: optionalText(1000),
};

export const measurementCreate = z
  .strictObject({
    id: uuid.optional(),
    measure: z.enum(measureIds, { error: 'This is not a measure that can be recorded' }),
    ...fields,
  })
  .superRefine((body, context) => {
    const measure = getMeasure(body.measure);
    const refuse = (path: string[], message: string) => context.addIssue({ code: 'custom', path, message });
    if (measure.entry !== 'single') {
      const where = measure.entry === 'derived' ? 'is worked out from other results' : 'belongs to a spirometry test';
      return refuse(['measure'], `${measure.label} ${where} and is not entered by itself`);
    }
    const found = checkValue(body.measure, body.value);
    if (found && 'problem' in found) refuse(['value'], found.message);
    for (const error of checkConditions(body.measure, body.conditions))
      refuse(['conditions', error.key], error.message);
    if (measure.safetyItem && body.item9 === null)
      refuse(['item9'], 'The ninth answer is needed: 0, 1, 2, 3 or not answered');
    const total =
      body.item9 === null || (found && 'problem' in found) ? null : totalProblem(measure, body.value, body.item9);
    if (total !== null) refuse(['value'], total);
    if (!measure.safetyItem && body.item9 !== null) refuse(['item9'], `${measure.label} has no ninth answer`);
  });

/** What changes; the rest stays. The value is checked against the measure in the service, which knows it. */
export const measurementAmendBody = z.strictObject({
  version,
  reason: amendReason,
  takenAt: instant.optional(),
  value: fields.value.optional(),
  heightCm: heightCm.nullable().optional(),
  heightMethod: z.enum(heightMethods).optional(),
  weightKg: weightKg.nullable().optional(),
  conditions: conditions.optional(),
  item9: item9.optional(),
  note: optionalText(1000).optional(),
});

export const measurement = z.object({
  id: uuid,
  patientId: uuid,
  measure: z.enum(measureIds),
  takenAt: instantOut,
  takenOn: calendarDate,
  value: z.number(),
  heightCm: z.number().nullable(),
  heightMethod: z.enum(heightMethods).nullable(),
  heightCarried: z.boolean(),
  weightKg: z.number().nullable(),
  conditions,
  item9: z.enum(safetyAnswers).nullable(),
  note: z.string().nullable(),
  recordedBy: person,
  recordedAt: instantOut,
  version: z.int(),
  voided,
});

export const measurementDetail = z.object({
  measurement,
  history: z.array(revision),
  abilities: z.array(z.enum(['amend', 'void'])),
});

export const measurementResponse = z.object({ measurement });
export const measurementList = listOf(measurement);
export const measurementListQuery = z.strictObject({
  ...cursorQuery,
  measure: z.string().refine(isMeasureId, { message: 'This is not a measure' }).optional(),
});

export const bodySizeCreate = z
  .strictObject({
    id: uuid.optional(),
    takenAt: instant,
    heightCm: fields.heightCm,
    heightMethod: fields.heightMethod,
    weightKg: fields.weightKg,
    note: fields.note,
  })
  .refine((body) => body.heightCm !== null || body.weightKg !== null, {
    path: ['weightKg'],
    message: 'Enter a height, a weight or both',
  });

export const bodySizeAmendBody = z.strictObject({
  version,
  reason: amendReason,
  takenAt: instant.optional(),
  heightCm: heightCm.nullable().optional(),
  heightMethod: z.enum(heightMethods).optional(),
  weightKg: weightKg.nullable().optional(),
  note: optionalText(1000).optional(),
});

export const bodySize = z.object({
  id: uuid,
  patientId: uuid,
  takenAt: instantOut,
  takenOn: calendarDate,
  heightCm: z.number().nullable(),
  heightMethod: z.enum(heightMethods).nullable(),
  weightKg: z.number().nullable(),
  bmi: z.number().nullable(),
  note: z.string().nullable(),
  recordedBy: person,
  recordedAt: instantOut,
  version: z.int(),
  voided,
});

export const bodySizeResponse = z.object({ bodySize });
export const bodySizeList = listOf(bodySize);
export const bodySizeDetail = z.object({
  bodySize,
  history: z.array(revision),
  abilities: z.array(z.enum(['amend', 'void'])),
});

export const testKinds = ['spirometry-test', 'measurement', 'body-size'] as const;
export type TestKind = (typeof testKinds)[number];

/** One row of the record's Tests section. */
export const testListItem = z.object({
  kind: z.enum(testKinds),
  id: uuid,
  at: instantOut,
  on: calendarDate,
  /** For a measurement its measure, else null. */
  measure: z.enum(measureIds).nullable(),
  state: z.string().nullable(),
  /** Results in display units by measure id, e.g. {"fev1": 1.32, "fvc": 2.78}. */
  values: z.record(z.string(), z.number()),
  heightCm: z.number().nullable(),
  recordedByName: z.string(),
  amended: z.boolean(),
  voided: z.boolean(),
});

export const testList = listOf(testListItem);

export type MeasurementCreate = z.infer<typeof measurementCreate>;
export type MeasurementInput = z.input<typeof measurementCreate>;
export type MeasurementAmendBody = z.infer<typeof measurementAmendBody>;
export type Measurement = z.infer<typeof measurement>;
export type MeasurementDetail = z.infer<typeof measurementDetail>;
export type BodySizeCreate = z.infer<typeof bodySizeCreate>;
export type BodySizeAmendBody = z.infer<typeof bodySizeAmendBody>;
export type BodySize = z.infer<typeof bodySize>;
export type TestListItem = z.infer<typeof testListItem>;
