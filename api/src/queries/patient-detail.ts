import type { DiagnosisGroup, PatternBrief, SexForPrediction } from '@slighthill/shared/contracts/patient';
import type { HeightMethod } from '@slighthill/shared/contracts/common';
import { selectRow } from '../db/query';
import type { Actor } from '../policies/actor';
import { visibleTo } from '../policies/policy';
import type { EnrollmentRow } from './enrollments';

export interface FlagRow {
  id: string;
  rule: string;
  raisedAt: string;
  version: number;
  detail: string;
  sourceKind: string;
  sourceId: string;
}

export interface PatientDetailRow {
  id: string;
  clinicId: string;
  givenName: string;
  familyName: string;
  birthDate: string;
  sexForPrediction: SexForPrediction;
  diagnosisGroup: DiagnosisGroup;
  diagnosisConfirmed: boolean;
  recordNumber: string;
  email: string | null;
  phone: string | null;
  version: number;
  createdAt: Date;
  createdById: string | null;
  createdByName: string | null;
  enrollment: EnrollmentRow | null;
  oxygen: { on: string; details: Record<string, unknown> } | null;
  height: { heightCm: number; heightMethod: HeightMethod; on: string } | null;
  weight: { weightKg: number; on: string } | null;
  pattern: PatternBrief;
  flags: FlagRow[];
  openHolds: number;
  testCount: number;
  fileCount: number;
}

/** Everything the standing header of a record shows, in one statement. */
const sql = /* sql */ `
  select p.id, p.clinic_id as "clinicId", p.given_name as "givenName", p.family_name as "familyName",
    p.birth_date::text as "birthDate", p.sex_for_prediction as "sexForPrediction",
    p.diagnosis_group as "diagnosisGroup", p.record_number as "recordNumber", p.email, p.phone, p.version,
    p.created_at as "createdAt", p.created_by as "createdById", c.display_name as "createdByName",
    exists (select 1 from file_entries f
      where f.patient_id = p.id and f.kind = 'diagnosis' and f.voided_at is null
        and f.details ->> 'diagnosisGroup' = p.diagnosis_group and f.details ->> 'confirmedBy' is not null)
      as "diagnosisConfirmed",
    e.row as enrollment, s.pattern,
    (select json_build_object('on', f.on_date, 'details', f.details) from file_entries f
      where f.patient_id = p.id and f.kind = 'oxygen-order' and f.voided_at is null
      order by f.on_date desc, f.created_at desc, f.id desc limit 1) as oxygen,
    (select json_build_object('heightCm', b.height_cm, 'heightMethod', b.height_method,
        'on', (b.taken_at at time zone $timeZone)::date) from body_sizes b
      where b.patient_id = p.id and b.voided_at is null and b.height_cm is not null
      order by b.taken_at desc, b.id desc limit 1) as height,
    (select json_build_object('weightKg', b.weight_kg, 'on', (b.taken_at at time zone $timeZone)::date)
      from body_sizes b where b.patient_id = p.id and b.voided_at is null and b.weight_kg is not null
      order by b.taken_at desc, b.id desc limit 1) as weight,
    coalesce((select json_agg(json_build_object('id', fl.id, 'rule', fl.rule, 'raisedAt', fl.raised_at,
        'version', fl.version, 'detail', o.detail, 'sourceKind', o.source_kind, 'sourceId', o.source_id)
        order by fl.raised_at, fl.id)
      from flags fl join lateral (select * from flag_occurrences oc
        where oc.flag_id = fl.id and oc.withdrawn_at is null order by oc.occurred_at desc, oc.id limit 1) o on true
      where fl.patient_id = p.id and fl.status = 'open'), '[]') as flags,
    (select count(*)::int from file_entries f where f.patient_id = p.id and f.kind = 'safety-hold'
      and f.voided_at is null and f.released_at is null) as "openHolds",
    (select count(*)::int from spirometry_tests t where t.patient_id = p.id and t.voided_at is null)
      + (select count(*)::int from measurements m where m.patient_id = p.id and m.source_kind = 'measurement'
        and m.source_id = m.id and m.voided_at is null)
      + (select count(*)::int from body_sizes b where b.patient_id = p.id and b.source_kind = 'body-size'
        and b.voided_at is null) as "testCount",
    (select count(*)::int from file_entries f where f.patient_id = p.id and f.voided_at is null) as "fileCount"
  from patients p
  left join users c on c.id = p.created_by
  left join lateral (select en.id, json_build_object('id', en.id, 'programId', en.program_id, 'programName', pr.name,
      'plannedSessions', en.planned_sessions, 'status', en.status, 'startOn', en.start_on,
      'plannedEndOn', en.planned_end_on, 'endedOn', en.ended_on, 'consentOn', en.consent_on,
      'statusReason', en.status_reason, 'version', en.version) as row
    from enrollments en join programs pr on pr.id = en.program_id
    where en.patient_id = p.id order by en.start_on desc, en.id desc limit 1) e on true
  left join enrollment_summaries s on s.enrollment_id = e.id
  where p.id = $id and p.clinic_id = $clinicId`;

export async function findPatientDetail(actor: Actor, id: string): Promise<PatientDetailRow | null> {
  return await selectRow<PatientDetailRow>(sql, { id, ...visibleTo(actor), timeZone: actor.clinic.timeZone });
}
