import { z } from 'zod';
import { diagnosisGroups, enrollmentStatuses, sexesForPrediction } from '../vocabulary';
import {
  calendarDate,
  cursorQuery,
  heightMethods,
  instantOut,
  listOf,
  optionalText,
  person,
  text,
  uuid,
  version,
} from './common';

export {
  diagnosisGroupLabels,
  diagnosisGroups,
  enrollmentStatuses,
  openEnrollmentStatuses,
  sexesForPrediction,
  type DiagnosisGroup,
  type EnrollmentStatus,
  type SexForPrediction,
} from '../vocabulary';

const emailExample = 'Enter an e-mail address such as name@example.org';
const email = z
  .union([z.literal(''), z.email({ error: emailExample }).max(254)], { error: emailExample })
  .nullish()
  .transform((value) => value || null);

const patientFields = {
  givenName: text(80, 'The given name'),
  familyName: text(80, 'The family name'),
  birthDate: calendarDate,
  sexForPrediction: z.enum(sexesForPrediction, { error: 'Choose the sex used in prediction equations' }),
  diagnosisGroup: z.enum(diagnosisGroups, { error: 'Choose a diagnosis group' }),
  email,
  phone: optionalText(40),
};

export const patientCreate = z.strictObject({
  id: uuid.optional(),
  ...patientFields,
  recordNumber: optionalText(30),
});

export const patientPatch = z.strictObject({
  version,
  givenName: patientFields.givenName.optional(),
  familyName: patientFields.familyName.optional(),
  birthDate: patientFields.birthDate.optional(),
  sexForPrediction: patientFields.sexForPrediction.optional(),
  diagnosisGroup: patientFields.diagnosisGroup.optional(),
  recordNumber: text(30, 'The record number').optional(),
  email: email.optional(),
  phone: optionalText(40).optional(),
});

export const duplicateCheckBody = z.strictObject({
  givenName: z.string().trim().min(1).max(80),
  familyName: z.string().trim().min(1).max(80),
  birthDate: calendarDate,
});

export const duplicateList = z.object({
  items: z.array(
    z.object({
      id: uuid,
      givenName: z.string(),
      familyName: z.string(),
      birthDate: calendarDate,
      recordNumber: z.string(),
    }),
  ),
});

export const patientLists = ['current', 'finished', 'all'] as const;

export const patientListQuery = z.strictObject({
  ...cursorQuery,
  search: z.string().trim().max(120).optional(),
  list: z.enum(patientLists).default('all'),
});

export const enrollment = z.object({
  id: uuid,
  programId: uuid,
  programName: z.string(),
  plannedSessions: z.int(),
  status: z.enum(enrollmentStatuses),
  startOn: calendarDate,
  plannedEndOn: calendarDate,
  endedOn: calendarDate.nullable(),
  consentOn: calendarDate.nullable(),
  statusReason: z.string().nullable(),
  version: z.int(),
});

export const enrollmentCreate = z.strictObject({
  id: uuid.optional(),
  programId: uuid,
  startOn: calendarDate,
  consentOn: calendarDate.nullish().transform((value) => value ?? null),
});

export const enrollmentPatch = z.strictObject({
  version,
  startOn: calendarDate.optional(),
  consentOn: calendarDate.nullable().optional(),
  status: z.enum(enrollmentStatuses).optional(),
  endedOn: calendarDate.optional(),
  reason: optionalText(500).optional(),
});

export const enrollmentList = listOf(enrollment);

/** Latest pattern as shown in lists and headers; the trend answer carries the whole of it. */
export const patternBrief = z
  .object({
    id: z.string(),
    heading: z.string(),
    provisional: z.boolean(),
    takenOn: calendarDate,
  })
  .nullable();

export const patientListItem = z.object({
  id: uuid,
  givenName: z.string(),
  familyName: z.string(),
  birthDate: calendarDate,
  ageYears: z.int(),
  recordNumber: z.string(),
  diagnosisGroup: z.enum(diagnosisGroups),
  enrollment: z
    .object({
      status: z.enum(enrollmentStatuses),
      programName: z.string(),
      startOn: calendarDate,
      plannedSessions: z.int(),
    })
    .nullable(),
  pattern: patternBrief,
  lastTestOn: calendarDate.nullable(),
  openFlags: z.int(),
});

export const patientList = listOf(patientListItem);

export const flag = z.object({
  id: uuid,
  rule: z.string(),
  label: z.string(),
  detail: z.string(),
  severity: z.enum(['safety', 'attention']),
  raisedAt: instantOut,
  version: z.int(),
  sourceKind: z.string(),
  sourceId: uuid,
});

export const flagResolveBody = z.strictObject({ version, note: text(500, 'The note') });

export const bodySizeBrief = z
  .object({
    heightCm: z.number().nullable(),
    heightMethod: z.enum(heightMethods).nullable(),
    heightOn: calendarDate.nullable(),
    weightKg: z.number().nullable(),
    weightOn: calendarDate.nullable(),
  })
  .nullable();

export const patientAbilities = [
  'edit',
  'enroll',
  'record',
  'amend',
  'write-file',
  'order-oxygen',
  'release-hold',
  'resolve-flag',
] as const;

export const patient = z.object({
  id: uuid,
  givenName: z.string(),
  familyName: z.string(),
  birthDate: calendarDate,
  ageYears: z.int(),
  sexForPrediction: z.enum(sexesForPrediction),
  diagnosisGroup: z.enum(diagnosisGroups),
  diagnosisConfirmed: z.boolean(),
  recordNumber: z.string(),
  email: z.string().nullable(),
  phone: z.string().nullable(),
  version: z.int(),
  createdAt: instantOut,
  enrollment: enrollment.nullable(),
  oxygen: z
    .object({
      restLpm: z.number().nullable(),
      walkingLpm: z.number().nullable(),
      asleepLpm: z.number().nullable(),
      device: z.string(),
      on: calendarDate,
    })
    .nullable(),
  bodySize: bodySizeBrief,
  pattern: patternBrief,
  openFlags: z.array(flag),
  openHolds: z.int(),
  counts: z.object({ tests: z.int(), file: z.int() }),
  abilities: z.array(z.enum(patientAbilities)),
  createdBy: person.nullable(),
});

export const patientResponse = z.object({ patient });
export const enrollmentResponse = z.object({ enrollment });
export const flagResponse = z.object({ flag: flag.extend({ status: z.enum(['open', 'resolved']) }) });

export type Patient = z.infer<typeof patient>;
export type PatientListItem = z.infer<typeof patientListItem>;
export type PatientCreate = z.infer<typeof patientCreate>;
export type PatientPatch = z.infer<typeof patientPatch>;
export type Enrollment = z.infer<typeof enrollment>;
export type EnrollmentCreate = z.infer<typeof enrollmentCreate>;
export type EnrollmentPatch = z.infer<typeof enrollmentPatch>;
export type Flag = z.infer<typeof flag>;
export type PatternBrief = z.infer<typeof patternBrief>;
export type PatientAbility = (typeof patientAbilities)[number];
