import type { EnrollmentStatus } from '@slighthill/shared/contracts/patient';
import { selectRow, selectRows } from '../db/query';
import type { Actor } from '../policies/actor';
import { visibleTo } from '../policies/policy';

export interface EnrollmentRow {
  id: string;
  programId: string;
  programName: string;
  plannedSessions: number;
  status: EnrollmentStatus;
  startOn: string;
  plannedEndOn: string;
  endedOn: string | null;
  consentOn: string | null;
  statusReason: string | null;
  version: number;
}

const sql = (where: string) => /* sql */ `
  select e.id, e.program_id as "programId", p.name as "programName", e.planned_sessions as "plannedSessions", e.status,
    e.start_on::text as "startOn", e.planned_end_on::text as "plannedEndOn", e.ended_on::text as "endedOn",
    e.consent_on::text as "consentOn", e.status_reason as "statusReason", e.version
  from enrollments e join programs p on p.id = e.program_id
  where e.clinic_id = $clinicId and ${where}`;

export async function findEnrollment(actor: Actor, id: string): Promise<EnrollmentRow | null> {
  return await selectRow<EnrollmentRow>(sql('e.id = $id'), { ...visibleTo(actor), id });
}

/** All of a patient's enrollments, newest first; a handful in a lifetime. */
export async function listEnrollments(actor: Actor, patientId: string): Promise<EnrollmentRow[]> {
  return await selectRows<EnrollmentRow>(
    `${sql('e.patient_id = $patientId')} order by e.start_on desc, e.id desc limit 200`,
    { ...visibleTo(actor), patientId },
  );
}
