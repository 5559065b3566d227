import { wholeYears } from '@slighthill/shared/calendar';
import type { Flag, Patient, PatientAbility, PatientListItem } from '@slighthill/shared/contracts/patient';
import type { Ability } from '@slighthill/shared/permissions';
import { flagRule } from '../flags/flag-rules';
import type { Actor } from '../policies/actor';
import { can } from '../policies/policy';
import type { PatientListRow } from '../queries/list-patients';
import type { FlagRow, PatientDetailRow } from '../queries/patient-detail';

export function presentPatientListItem(row: PatientListRow, today: string): PatientListItem {
  return {
    id: row.id,
    givenName: row.givenName,
    familyName: row.familyName,
    birthDate: row.birthDate,
    ageYears: wholeYears(row.birthDate, today),
    recordNumber: row.recordNumber,
    diagnosisGroup: row.diagnosisGroup,
    enrollment: row.status && {
      status: row.status,
      programName: row.programName!,
      startOn: row.startOn!,
      plannedSessions: row.plannedSessions!,
    },
    pattern: presentPattern(row.pattern),
    lastTestOn: row.lastTestOn,
    openFlags: row.openFlags,
  };
}

const presentPattern = (pattern: PatientListRow['pattern']): PatientListItem['pattern'] =>
  pattern && {
    id: pattern.id,
    heading: pattern.heading,
    provisional: pattern.provisional,
    takenOn: pattern.takenOn,
  };

const abilityOf: Record<PatientAbility, Ability> = {
  edit: 'patients:write',
  enroll: 'enrollments:write',
  record: 'tests:write',
  amend: 'tests:write',
  'write-file': 'file:write',
  'order-oxygen': 'oxygen:order',
  'release-hold': 'holds:release',
  'resolve-flag': 'flags:resolve',
};

export function presentPatient(row: PatientDetailRow, actor: Actor, today: string): Patient {
  return {
    id: row.id,
    givenName: row.givenName,
    familyName: row.familyName,
    birthDate: row.birthDate,
    ageYears: wholeYears(row.birthDate, today),
    sexForPrediction: row.sexForPrediction,
    diagnosisGroup: row.diagnosisGroup,
    diagnosisConfirmed: row.diagnosisConfirmed,
    recordNumber: row.recordNumber,
    email: row.email,
    phone: row.phone,
    version: row.version,
    createdAt: row.createdAt.toISOString(),
    createdBy: row.createdById === null ? null : { id: row.createdById, displayName: row.createdByName ?? '' },
    enrollment: row.enrollment,
    oxygen: presentOxygen(row.oxygen),
    bodySize: presentBody(row),
    pattern: presentPattern(row.pattern),
    openFlags: row.flags.map(presentFlag),
    openHolds: row.openHolds,
    counts: { tests: row.testCount, file: row.fileCount },
    abilities: (Object.keys(abilityOf) as PatientAbility[]).filter((name) => can(actor, abilityOf[name], row)),
  };
}

export function presentFlag(row: FlagRow): Flag {
  const rule = flagRule(row.rule);
  return {
    id: row.id,
    rule: row.rule,
    label: rule?.label ?? row.rule,
    severity: rule?.severity ?? 'attention',
    detail: row.detail,
    raisedAt: new Date(row.raisedAt).toISOString(),
    version: row.version,
    sourceKind: row.sourceKind,
    sourceId: row.sourceId,
  };
}

function presentOxygen(oxygen: PatientDetailRow['oxygen']): Patient['oxygen'] {
  if (!oxygen) return null;
  const { restLpm, walkingLpm, asleepLpm, device } = oxygen.details as Record<string, never>;
  return {
    restLpm: restLpm ?? null,
    walkingLpm: walkingLpm ?? null,
    asleepLpm: asleepLpm ?? null,
    device: device ?? 'other',
    on: oxygen.on,
  };
}

function presentBody({ height, weight }: PatientDetailRow): Patient['bodySize'] {
  if (!height && !weight) return null;
  return {
    heightCm: height?.heightCm ?? null,
    heightMethod: height?.heightMethod ?? null,
    heightOn: height?.on ?? null,
    weightKg: weight?.weightKg ?? null,
    weightOn: weight?.on ?? null,
  };
}
