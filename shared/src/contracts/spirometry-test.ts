import { z } from 'zod';
import { bronchodilatorStates } from '../vocabulary';
import { checkValue, type MeasureId } from '../measures/registry';
import {
  amendReason,
  between,
  calendarDate,
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

export { bronchodilatorStates };
export type { BronchodilatorState } from '../vocabulary';

/** A number held to the registry's absolute range and step, with the registry's own words. */
export const measureValue = (measure: MeasureId, label: string) =>
  numberField(label).superRefine((value, context) => {
    const found = checkValue(measure, value);
    if (found && 'problem' in found) context.addIssue({ code: 'custom', message: found.message });
  });

/** Volumes are kept as whole milliliters, so a fourth decimal of a liter cannot be stored. */
const wholeMl = (schema: ReturnType<typeof measureValue>) =>
  schema.refine((value) => Math.abs(value * 1000 - Math.round(value * 1000)) < 1e-6, {
    message: 'Use at most three decimals',
  });

const fev1 = wholeMl(measureValue('fev1', 'FEV1'));
const fvc = wholeMl(measureValue('fvc', 'FVC'));
const pef = measureValue('pef', 'PEF');
const fef2575 = measureValue('fef2575', 'FEF25-75');

const orNull = <T extends z.ZodType>(schema: T) => schema.nullish().transform((value) => value ?? null);

const notAboveFvc = {
  check: (blow: { fev1: number; fvc: number }) => blow.fev1 <= blow.fvc,
  error: {
    path: ['fev1'],
    error: (issue: { input?: unknown }) => {
      const input = issue.input as { fvc?: number } | undefined;
      const shown = input?.fvc === undefined ? '' : ` (${input.fvc.toFixed(2)} L)`;
      return `FEV1 cannot be more than FVC${shown}`;
    },
  },
};

export const bestValues = z
  .strictObject({ fev1, fvc, pef: orNull(pef), fef2575: orNull(fef2575) })
  .refine(notAboveFvc.check, notAboveFvc.error);

export const maneuver = z
  .strictObject({
    fev1,
    fvc,
    pef: orNull(pef),
    fef2575: orNull(fef2575),
    forcedTimeS: orNull(between('Time', 0.1, 60, 's')),
    fev1Accepted: z.boolean().default(true),
    fvcAccepted: z.boolean().default(true),
    reason: optionalText(200),
  })
  .refine(notAboveFvc.check, notAboveFvc.error);

const testFields = {
  performedAt: instant,
  heightCm,
  heightMethod: z.enum(heightMethods).default('measured'),
  weightKg: orNull(weightKg),
  bronchodilator: z.enum(bronchodilatorStates, { error: 'Say whether a bronchodilator was given' }),
  drug: optionalText(80),
  doseMcg: orNull(between('Dose', 1, 20000, 'micrograms')),
  minutesSinceDose: orNull(between('Minutes since the dose', 0, 1440).int('Use whole minutes')),
  ownBronchodilatorHoursAgo: orNull(between('Hours since own bronchodilator', 0, 720)),
  best: bestValues.nullish().transform((value) => value ?? null),
  maneuvers: z
    .array(maneuver)
    .min(1, 'Enter at least one maneuver')
    .max(8, 'Enter at most eight maneuvers')
    .nullish()
    .transform((value) => value ?? null),
  note: optionalText(1000),
};

const exactlyOne = (test: { best: unknown; maneuvers: unknown }) => (test.best === null) !== (test.maneuvers === null);
const exactlyOneError = { path: ['maneuvers'], message: 'Enter either the maneuvers or the best values' };

const ofTheDose = {
  drug: 'No bronchodilator was given, so there is no drug',
  doseMcg: 'No bronchodilator was given, so there is no dose',
  minutesSinceDose: 'No bronchodilator was given, so there is no time since it',
} as const;

export const spirometryTestCreate = z
  .strictObject({ id: uuid.optional(), visitId: uuid.optional(), ...testFields })
  .refine(exactlyOne, exactlyOneError)
  .superRefine((test, context) => {
    if (test.bronchodilator !== 'none') return;
    for (const [field, message] of Object.entries(ofTheDose))
      if (test[field as keyof typeof ofTheDose] !== null) context.addIssue({ code: 'custom', path: [field], message });
  });

export const spirometryPairCreate = z
  .strictObject({ tests: z.tuple([spirometryTestCreate, spirometryTestCreate]) })
  .refine((pair) => pair.tests[0].bronchodilator === 'before' && pair.tests[1].bronchodilator === 'after', {
    path: ['tests'],
    message: 'A pair is one test before and one after bronchodilator, in this order',
  })
  .refine((pair) => (pair.tests[0].visitId ?? null) === (pair.tests[1].visitId ?? null), {
    path: ['tests'],
    message: 'Both tests of a pair belong to the same visit',
  })
  .refine((pair) => Date.parse(pair.tests[0].performedAt) <= Date.parse(pair.tests[1].performedAt), {
    path: ['tests'],
    message: 'The test after bronchodilator cannot be earlier than the one before',
  });

export const spirometryCreateBody = z.union([spirometryPairCreate, spirometryTestCreate]);

export const spirometryAmendBody = z
  .strictObject({
    version,
    reason: amendReason,
    performedAt: testFields.performedAt.optional(),
    heightCm: testFields.heightCm.optional(),
    heightMethod: z.enum(heightMethods).optional(),
    weightKg: weightKg.nullable().optional(),
    bronchodilator: testFields.bronchodilator.optional(),
    drug: testFields.drug.optional(),
    doseMcg: testFields.doseMcg.optional(),
    minutesSinceDose: testFields.minutesSinceDose.optional(),
    ownBronchodilatorHoursAgo: testFields.ownBronchodilatorHoursAgo.optional(),
    best: bestValues.optional(),
    maneuvers: z.array(maneuver).min(1).max(8).optional(),
    note: testFields.note.optional(),
  })
  .refine((body) => !(body.best && body.maneuvers), exactlyOneError);

const number = z.number().nullable();

export const maneuverOut = z.object({
  fev1: z.number(),
  fvc: z.number(),
  pef: number,
  fef2575: number,
  forcedTimeS: number,
  fev1Accepted: z.boolean(),
  fvcAccepted: z.boolean(),
  reason: z.string().nullable(),
});

export const spirometryTest = z.object({
  id: uuid,
  patientId: uuid,
  visitId: uuid,
  performedAt: instantOut,
  performedOn: calendarDate,
  heightCm: z.number(),
  heightMethod: z.enum(heightMethods),
  weightKg: number,
  bronchodilator: z.enum(bronchodilatorStates),
  drug: z.string().nullable(),
  doseMcg: number,
  minutesSinceDose: number,
  ownBronchodilatorHoursAgo: number,
  entry: z.enum(['best', 'maneuvers']),
  /** What was derived or entered as the test's result; an index without an accepted maneuver is null. */
  best: z.object({ fev1: number, fvc: number, fev1fvc: number, pef: number, fef2575: number }),
  maneuvers: z.array(maneuverOut),
  quality: z.string().nullable(),
  note: z.string().nullable(),
  recordedBy: person,
  recordedAt: instantOut,
  version: z.int(),
  voided,
});

export const spirometryTestDetail = z.object({
  test: spirometryTest,
  history: z.array(revision),
  abilities: z.array(z.enum(['amend', 'void'])),
});

export const spirometryCreated = z.union([
  z.object({ test: spirometryTest }),
  z.object({ tests: z.tuple([spirometryTest, spirometryTest]) }),
]);

export const spirometryTestList = listOf(spirometryTest);

export type SpirometryTestCreate = z.infer<typeof spirometryTestCreate>;
export type SpirometryTestInput = z.input<typeof spirometryTestCreate>;
export type SpirometryPairCreate = z.infer<typeof spirometryPairCreate>;
export type SpirometryAmendBody = z.infer<typeof spirometryAmendBody>;
export type SpirometryTest = z.infer<typeof spirometryTest>;
export type SpirometryTestDetail = z.infer<typeof spirometryTestDetail>;
export type Maneuver = z.infer<typeof maneuver>;
export type BestValues = z.infer<typeof bestValues>;
