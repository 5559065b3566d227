import { z } from 'zod';
import { fev1SeverityRules, ratioRules, tlcSeverityRules } from '../vocabulary';
import { staffRoles } from '../permissions';
import { between, cursorQuery, instantOut, listOf, optionalText, text, uuid, version } from './common';

export { fev1SeverityRules, ratioRules, tlcSeverityRules };

export const clinicRules = {
  ratioRule: z.enum(ratioRules),
  fev1SeverityRule: z.enum(fev1SeverityRules),
  tlcSeverityRule: z.enum(tlcSeverityRules),
  tlcWindowDays: z.int(),
};

export const clinic = z.object({
  id: uuid,
  name: z.string(),
  timeZone: z.string(),
  phone: z.string().nullable(),
  ...clinicRules,
  version: z.int(),
});

const timeZone = text(60, 'The time zone').refine(
  (zone) => {
    try {
      new Intl.DateTimeFormat('en', { timeZone: zone });
      return true;
    } catch {
      return false;
    }
  },
  { message: 'Use a time zone such as America/Denver' },
);

export const clinicPatch = z.strictObject({
  version,
  name: text(120, 'The name').optional(),
  timeZone: timeZone.optional(),
  phone: optionalText(40).optional(),
  ratioRule: z.enum(ratioRules).optional(),
  fev1SeverityRule: z.enum(fev1SeverityRules).optional(),
  tlcSeverityRule: z.enum(tlcSeverityRules).optional(),
  tlcWindowDays: z.int('Use whole days').min(1).max(730).optional(),
});

const email = z.email({ error: 'Enter an e-mail address such as name@example.org' }).max(254);
const rolesField = z
  .array(z.enum(staffRoles), { error: 'Choose at least one role' })
  .min(1, 'Choose at least one role')
  .transform((list) => [...new Set(list)]);

export const staffUser = z.object({
  id: uuid,
  displayName: z.string(),
  credential: z.string().nullable(),
  email: z.string(),
  roles: z.array(z.enum(staffRoles)),
  state: z.enum(['invited', 'active', 'disabled']),
  version: z.int(),
});

export const userCreate = z.strictObject({
  id: uuid.optional(),
  displayName: text(120, 'The name'),
  credential: optionalText(40),
  email,
  roles: rolesField,
});

export const userPatch = z.strictObject({
  version,
  displayName: text(120, 'The name').optional(),
  credential: optionalText(40).optional(),
  roles: rolesField.optional(),
  disabled: z.boolean().optional(),
});

/** The link is shown once: only a hash of its token is stored. */
export const invitationIssued = z.object({ path: z.string(), expiresAt: instantOut });
export const staffUserCreated = z.object({ user: staffUser, invitation: invitationIssued.nullable() });

export const sessionKinds = ['exercise', 'education', 'assessment'] as const;

export const program = z.object({
  id: uuid,
  name: z.string(),
  plannedSessions: z.int(),
  weeks: z.int(),
  sessionsPerDay: z.int(),
  sessionsPerWeek: z.int(),
  sessionKinds: z.array(z.enum(sessionKinds)),
  retired: z.boolean(),
  version: z.int(),
});

const programFields = {
  name: text(120, 'The name'),
  plannedSessions: between('Sessions', 1, 200).int('Use a whole number of sessions'),
  weeks: between('Weeks', 1, 104).int('Use whole weeks'),
  sessionsPerDay: between('Sessions a day', 1, 4).int('Use a whole number'),
  sessionsPerWeek: between('Sessions a week', 1, 14).int('Use a whole number'),
  sessionKinds: z.array(z.enum(sessionKinds)).min(1, 'Choose at least one kind'),
};

export const programCreate = z.strictObject({ id: uuid.optional(), ...programFields });

export const programPatch = z.strictObject({
  version,
  retired: z.boolean().optional(),
  name: programFields.name.optional(),
  plannedSessions: programFields.plannedSessions.optional(),
  weeks: programFields.weeks.optional(),
  sessionsPerDay: programFields.sessionsPerDay.optional(),
  sessionsPerWeek: programFields.sessionsPerWeek.optional(),
  sessionKinds: programFields.sessionKinds.optional(),
});

export const auditEvent = z.object({
  id: z.string(),
  at: instantOut,
  actorName: z.string(),
  action: z.string(),
  outcome: z.enum(['done', 'refused']),
  patients: z.array(z.object({ id: uuid, name: z.string(), recordNumber: z.string() })),
  /** How many patients the request showed; `patients` names at most the first ten. */
  patientCount: z.int(),
  address: z.string().nullable(),
});

export const auditQuery = z.strictObject({
  ...cursorQuery,
  patient: uuid.optional(),
  actor: uuid.optional(),
  from: z.iso.date().optional(),
  to: z.iso.date().optional(),
});

export const clinicResponse = z.object({ clinic });
export const userList = listOf(staffUser);
export const programList = listOf(program);
export const auditList = listOf(auditEvent);

export type Clinic = z.infer<typeof clinic>;
export type ClinicPatch = z.infer<typeof clinicPatch>;
export type StaffUser = z.infer<typeof staffUser>;
export type UserCreate = z.infer<typeof userCreate>;
export type UserPatch = z.infer<typeof userPatch>;
export type Program = z.infer<typeof program>;
export type ProgramCreate = z.infer<typeof programCreate>;
export type ProgramPatch = z.infer<typeof programPatch>;
export type AuditEventRow = z.infer<typeof auditEvent>;
export type SessionKind = (typeof sessionKinds)[number];
