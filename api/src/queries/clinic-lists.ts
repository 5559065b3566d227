import type { StaffRole } from '@slighthill/shared/permissions';
import { decodeCursor, pageOf } from '../db/keyset';
import { selectRow, selectRows } from '../db/query';
import type { SessionKind } from '@slighthill/shared/contracts/clinic';
import type { Actor } from '../policies/actor';
import { visibleTo } from '../policies/policy';

interface Page {
  cursor?: string | undefined;
  limit: number;
}

export interface StaffUserRow {
  id: string;
  clinicId: string;
  displayName: string;
  credential: string | null;
  email: string;
  roles: StaffRole[];
  hasPassword: boolean;
  disabled: boolean;
  version: number;
}

const userSql = (where: string) => /* sql */ `
  select id, clinic_id as "clinicId", display_name as "displayName", credential, email, roles,
    password_hash is not null as "hasPassword", disabled_at is not null as disabled, version
  from users where clinic_id = $clinicId and patient_id is null and ${where}`;

export async function findStaffUser(actor: Actor, id: string): Promise<StaffUserRow | null> {
  return await selectRow<StaffUserRow>(userSql('id = $id'), { ...visibleTo(actor), id });
}

export async function listStaffUsers<Item>(actor: Actor, page: Page, present: (row: StaffUserRow) => Item) {
  const [name, id] = decodeCursor(page.cursor, ['text', 'id']) ?? [null, null];
  const rows = await selectRows<StaffUserRow>(
    `${userSql('($name::text is null or (display_name, id) > ($name, $id::uuid))')}
     order by display_name, id limit $limit`,
    { ...visibleTo(actor), name, id, limit: page.limit + 1 },
  );
  return pageOf(rows, page.limit, (row) => [row.displayName, row.id], present);
}

export interface ProgramRow {
  id: string;
  clinicId: string;
  name: string;
  plannedSessions: number;
  weeks: number;
  sessionsPerDay: number;
  sessionsPerWeek: number;
  sessionKinds: SessionKind[];
  retired: boolean;
  version: number;
}

const programSql = (where: string) => /* sql */ `
  select id, clinic_id as "clinicId", name, planned_sessions as "plannedSessions", weeks,
    sessions_per_day as "sessionsPerDay", sessions_per_week as "sessionsPerWeek", session_kinds as "sessionKinds",
    retired_at is not null as retired, version
  from programs where clinic_id = $clinicId and ${where}`;

export async function findProgram(actor: Actor, id: string): Promise<ProgramRow | null> {
  return await selectRow<ProgramRow>(programSql('id = $id'), { ...visibleTo(actor), id });
}

export async function listPrograms<Item>(actor: Actor, page: Page, present: (row: ProgramRow) => Item) {
  const [name, id] = decodeCursor(page.cursor, ['text', 'id']) ?? [null, null];
  const rows = await selectRows<ProgramRow>(
    `${programSql('($name::text is null or (name, id) > ($name, $id::uuid))')} order by name, id limit $limit`,
    { ...visibleTo(actor), name, id, limit: page.limit + 1 },
  );
  return pageOf(rows, page.limit, (row) => [row.name, row.id], present);
}

export interface AuditRow {
  id: string;
  at: Date;
  actorName: string;
  action: string;
  outcome: 'done' | 'refused';
  patientCount: number;
  patients: { id: string; name: string; recordNumber: string }[];
  address: string | null;
}

interface AuditFilter extends Page {
  patient?: string | undefined;
  actor?: string | undefined;
  from?: string | undefined;
  to?: string | undefined;
}

/** The trail, newest first. Names and record numbers are looked up for the page alone, at most ten an event. */
export async function listAuditEvents<Item>(actor: Actor, filter: AuditFilter, present: (row: AuditRow) => Item) {
  const [before] = decodeCursor(filter.cursor, ['serial']) ?? [null];
  const rows = await selectRows<AuditRow>(
    `with page as (
       select * from audit_events
       where clinic_id = $clinicId and ($before::bigint is null or id < $before::bigint)
         and ($patient::uuid is null or patient_ids @> array[$patient::uuid])
         and ($person::uuid is null or actor_id = $person)
         and ($from::date is null or at >= $from::date::timestamp at time zone $timeZone)
         and ($to::date is null or at < ($to::date + 1)::timestamp at time zone $timeZone)
       order by id desc limit $limit)
     select page.id::text, page.at, page.actor_name as "actorName", page.action, page.outcome, page.address,
       cardinality(page.patient_ids) as "patientCount",
       coalesce((select json_agg(json_build_object('id', p.id, 'name', p.given_name || ' ' || p.family_name,
         'recordNumber', p.record_number) order by p.family_key, p.given_key, p.id)
         from patients p where p.id = any (page.patient_ids[1:10])), '[]') as patients
     from page order by page.id desc`,
    {
      ...visibleTo(actor),
      before,
      patient: filter.patient,
      person: filter.actor,
      from: filter.from,
      to: filter.to,
      timeZone: actor.clinic.timeZone,
      limit: filter.limit + 1,
    },
  );
  return pageOf(rows, filter.limit, (row) => [row.id], present);
}
