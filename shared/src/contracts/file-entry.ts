import { z } from 'zod';
import {
  amendReason,
  between,
  calendarDate,
  cursorQuery,
  instant,
  instantOut,
  listOf,
  optionalText,
  person,
  revision,
  text,
  uuid,
  version,
  voided,
} from './common';
import { diagnosisGroups } from './patient';
import { safetyItemIds } from '../safety-checklist';

export const fileEntryKinds = [
  'diagnosis',
  'exacerbation',
  'oxygen-order',
  'medicine',
  'heart-rhythm',
  'smoking',
  'safety-hold',
] as const;
export type FileEntryKind = (typeof fileEntryKinds)[number];

export const fileEntryKindLabels: Record<FileEntryKind, string> = {
  diagnosis: 'Diagnosis',
  exacerbation: 'Exacerbation or admission',
  'oxygen-order': 'Oxygen order',
  medicine: 'Medicine that matters here',
  'heart-rhythm': 'Heart rhythm',
  smoking: 'Smoking',
  'safety-hold': 'Safety hold',
};

export const medicineClasses = [
  'short-acting-beta-agonist',
  'short-acting-antimuscarinic',
  'long-acting-beta-agonist',
  'long-acting-antimuscarinic',
  'beta-blocker',
  'other',
] as const;
export const oxygenDevices = ['concentrator', 'portable-concentrator', 'cylinder', 'liquid', 'other'] as const;
export const smokingStatuses = ['never', 'former', 'current'] as const;

const nullable = <T extends z.ZodType>(schema: T) => schema.nullish().transform((value) => value ?? null);
const flow = nullable(between('Oxygen flow', 0, 60, 'L/min'));

/** What each kind of entry holds; `on` is the calendar date it speaks of. */
export const fileDetails = {
  diagnosis: z.strictObject({
    diagnosisGroup: z.enum(diagnosisGroups, { error: 'Choose a diagnosis group' }),
    description: optionalText(300),
    confirmedBy: optionalText(120),
    /** Set on the entry that came with the patient's registration; any other entry goes before it. */
    atRegistration: z.literal(true).optional(),
  }),
  exacerbation: z.strictObject({
    steroid: z.boolean().default(false),
    antibiotic: z.boolean().default(false),
    admitted: z.boolean().default(false),
  }),
  'oxygen-order': z.strictObject({
    restLpm: flow,
    walkingLpm: flow,
    asleepLpm: flow,
    device: z.enum(oxygenDevices, { error: 'Choose a device' }),
    prescriber: text(120, 'The prescriber'),
    /** True when the order was written elsewhere and is only recorded here. */
    outside: z.boolean().default(false),
  }),
  medicine: z.strictObject({
    name: text(120, 'The name'),
    medicineClass: z.enum(medicineClasses, { error: 'Choose a kind of medicine' }),
    lastDoseAt: nullable(instant),
    stoppedOn: nullable(calendarDate),
  }),
  'heart-rhythm': z.strictObject({ atrialFibrillation: z.boolean({ error: 'Say yes or no' }) }),
  smoking: z.strictObject({
    status: z.enum(smokingStatuses, { error: 'Choose one' }),
    packYears: nullable(between('Pack-years', 0, 300, 'pack-years')),
    quitOn: nullable(calendarDate),
  }),
  'safety-hold': z.strictObject({ item: z.enum(safetyItemIds, { error: 'Choose what was found' }) }),
} as const;

const common = { on: calendarDate, note: optionalText(1000) };
const createOf = <K extends FileEntryKind>(kind: K) =>
  z.strictObject({ id: uuid.optional(), kind: z.literal(kind), ...common, details: fileDetails[kind] });

export const fileEntryCreate = z.discriminatedUnion(
  'kind',
  [
    createOf('diagnosis'),
    createOf('exacerbation'),
    createOf('oxygen-order'),
    createOf('medicine'),
    createOf('heart-rhythm'),
    createOf('smoking'),
    createOf('safety-hold'),
  ],
  { error: 'Choose what to enter' },
);

/** `details`, when given, replaces the whole of the entry's details and is checked against its kind. */
export const fileEntryAmendBody = z.strictObject({
  version,
  reason: amendReason,
  on: calendarDate.optional(),
  note: optionalText(1000).optional(),
  details: z.record(z.string(), z.unknown()).optional(),
});

export const holdReleaseBody = z.strictObject({ version, reason: text(500, 'The reason') });

export const fileEntry = z.object({
  id: uuid,
  patientId: uuid,
  kind: z.enum(fileEntryKinds),
  on: calendarDate,
  details: z.record(z.string(), z.unknown()),
  note: z.string().nullable(),
  recordedBy: person,
  recordedAt: instantOut,
  version: z.int(),
  voided,
  /** Safety holds only: who released it, when and why. */
  released: z.object({ at: instantOut, by: person, reason: z.string() }).nullable(),
});

export const fileEntryDetail = z.object({
  entry: fileEntry,
  history: z.array(revision),
  abilities: z.array(z.enum(['amend', 'void', 'release'])),
});

export const fileEntryResponse = z.object({ entry: fileEntry });
export const fileEntryList = listOf(fileEntry);
export const fileEntryListQuery = z.strictObject({ ...cursorQuery, kind: z.enum(fileEntryKinds).optional() });

export type FileEntryCreate = z.infer<typeof fileEntryCreate>;
export type FileEntryInput = z.input<typeof fileEntryCreate>;
export type FileEntryAmendBody = z.infer<typeof fileEntryAmendBody>;
export type FileEntry = z.infer<typeof fileEntry>;
export type FileEntryDetail = z.infer<typeof fileEntryDetail>;
export type OxygenOrderDetails = z.infer<(typeof fileDetails)['oxygen-order']>;
export type DiagnosisDetails = z.infer<(typeof fileDetails)['diagnosis']>;
