import type { AuditEventRow, Clinic as ClinicOut, Program, StaffUser } from '@slighthill/shared/contracts/clinic';
import type { Clinic } from '../models/clinic';
import type { AuditRow, ProgramRow, StaffUserRow } from '../queries/clinic-lists';

export function presentClinic(row: Clinic): ClinicOut {
  return {
    id: row.id,
    name: row.name,
    timeZone: row.timeZone,
    phone: row.phone,
    ratioRule: row.ratioRule,
    fev1SeverityRule: row.fev1SeverityRule,
    tlcSeverityRule: row.tlcSeverityRule,
    tlcWindowDays: row.tlcWindowDays,
    version: row.version,
  };
}

export function presentStaffUser(row: StaffUserRow): StaffUser {
  return {
    id: row.id,
    displayName: row.displayName,
    credential: row.credential,
    email: row.email,
    roles: row.roles,
    state: row.disabled ? 'disabled' : row.hasPassword ? 'active' : 'invited',
    version: row.version,
  };
}

export function presentProgram(row: ProgramRow): Program {
  return {
    id: row.id,
    name: row.name,
    plannedSessions: row.plannedSessions,
    weeks: row.weeks,
    sessionsPerDay: row.sessionsPerDay,
    sessionsPerWeek: row.sessionsPerWeek,
    sessionKinds: row.sessionKinds,
    retired: row.retired,
    version: row.version,
  };
}

export function presentAuditEvent(row: AuditRow): AuditEventRow {
  return {
    id: row.id,
    at: row.at.toISOString(),
    actorName: row.actorName,
    action: row.action,
    outcome: row.outcome,
    patients: row.patients.map(({ id, name, recordNumber }) => ({ id, name, recordNumber })),
    patientCount: row.patientCount,
    address: row.address,
  };
}
