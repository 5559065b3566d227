import { z } from 'zod';
import { heightLimitsCm, questionHeight } from '../measures/registry';
import { plainWords } from './plain-words';

z.config({ customError: plainWords });

export const uuid = z.uuid({ error: 'Not a valid id' });
export const instant = z.iso.datetime({ offset: true, error: 'Enter a date and time with a time zone' });
/** Instants as the API writes them: ISO 8601 in UTC. */
export const instantOut = z.string();
export const calendarDate = z.iso.date({ error: 'Enter a date as YYYY-MM-DD' });
export const version = z.int({ error: 'The version is missing' }).min(1);

export const text = (max: number, label: string) =>
  z
    .string({ error: `${label} is missing` })
    .trim()
    .min(1, `${label} is missing`)
    .max(max, `${label} is longer than ${max} characters`);

export const optionalText = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `Longer than ${max} characters`)
    .nullish()
    .transform((value) => value || null);

export const numberField = (label: string) => z.number({ error: `${label} must be a number` });

/** A number between two limits, both allowed; `unit` only where the label does not say it already. */
export const between = (label: string, min: number, max: number, unit = '') => {
  const withUnit = (limit: number) => (unit ? `${limit} ${unit}` : `${limit}`);
  return numberField(label)
    .min(min, `${label} must be ${withUnit(min)} or more`)
    .max(max, `${label} must be ${withUnit(max)} or less`);
};

export const cursorQuery = {
  cursor: z.string().max(500).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(50),
};

export const listOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });

export const idParams = z.strictObject({ id: uuid });

export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});

export const heightMethods = ['measured', 'stated', 'arm-span'] as const;
export const voidReasons = ['wrong-patient', 'wrong-test', 'duplicate', 'other'] as const;

/** Standing height limits of rule 0.6; a value that looks like inches or metres is named, never converted. */
export const heightCm = numberField('Height').superRefine((value, context) => {
  const { min, max } = heightLimitsCm;
  if (value >= min && value <= max) return;
  const unit = questionHeight(value);
  const hint = unit ? ` ${value} looks like ${unit.looksLike}: that is ${unit.suggestionCm} cm.` : '';
  context.addIssue({ code: 'custom', message: `Height must be between ${min} and ${max} cm.${hint}` });
});

export const weightKg = between('Weight', 20, 350, 'kg');

export const person = z.object({ id: uuid, displayName: z.string() });

export const voidBody = z
  .strictObject({
    version,
    reason: z.enum(voidReasons, { error: 'Choose a reason' }),
    text: optionalText(500),
  })
  .refine((body) => body.reason !== 'other' || body.text !== null, {
    path: ['text'],
    message: 'Say why in a few words',
  });

export const amendReason = text(500, 'The reason');

/** One entry of a record's history: the content before a change, who changed it, when and why. */
export const revision = z.object({
  version: z.int(),
  changedAt: instantOut,
  changedBy: person,
  reason: z.string(),
  before: z.record(z.string(), z.unknown()),
});

export const voided = z
  .object({ at: instantOut, by: person, reason: z.enum(voidReasons), text: z.string().nullable() })
  .nullable();

export type Revision = z.infer<typeof revision>;
export type Voided = z.infer<typeof voided>;
export type VoidBody = z.infer<typeof voidBody>;
export type HeightMethod = (typeof heightMethods)[number];
