import type { DiagnosisGroup, EnrollmentStatus, PatternBrief } from '@slighthill/shared/contracts/patient';
import { decodeCursor, pageOf } from '../db/keyset';
import { selectRows } from '../db/query';
import type { Actor } from '../policies/actor';
import { visibleTo } from '../policies/policy';
import { searchBranches } from './patient-search';

export interface PatientListRow {
  id: string;
  givenName: string;
  familyName: string;
  birthDate: string;
  recordNumber: string;
  diagnosisGroup: DiagnosisGroup;
  status: EnrollmentStatus | null;
  programName: string | null;
  startOn: string | null;
  plannedSessions: number | null;
  pattern: PatternBrief;
  lastTestOn: string | null;
  openFlags: number;
}

type Keyed = PatientListRow & { branch: number; sort1: string; sort2: string };

interface Page {
  search?: string | undefined;
  list: 'current' | 'finished' | 'all';
  cursor?: string | undefined;
  limit: number;
}

/**
 * A page of patients. Each branch of the search reads at most one page from its own index, so the cost does not grow
 * with the clinic; what the rows show is joined for the page alone.
 */
export async function listPatients<Item>(actor: Actor, page: Page, present: (row: PatientListRow) => Item) {
  const after = decodeCursor(page.cursor, ['index', 'text', 'text', 'id']);
  const branches = searchBranches(page.search ?? '');
  const ids = branches.map((branch, index) => {
    const [a, b] = branch.sort;
    const earlier = branches.slice(0, index).map((other) => `and not (${other.where})`);
    const continued = after
      ? `and ($branch::int < ${index} or ($branch::int = ${index} and (${a}, ${b}, id) > ($sort1, $sort2, $id::uuid)))`
      : '';
    return `(select ${index} as branch, ${a} as sort1, ${b} as sort2, id from patients
      where clinic_id = $clinicId and ${branch.where} ${earlier.join(' ')}
        ${page.list === 'all' ? '' : 'and list = $list'} ${continued}
      order by ${a}, ${b}, id limit $limit)`;
  });
  const rows = await selectRows<Keyed>(
    `with page as (select * from (${ids.join(' union all ')}) found order by branch, sort1, sort2, id limit $limit)
     select page.branch, page.sort1, page.sort2, p.id, p.given_name as "givenName", p.family_name as "familyName",
       p.birth_date::text as "birthDate", p.record_number as "recordNumber", p.diagnosis_group as "diagnosisGroup",
       e.status, e.program_name as "programName", e.start_on::text as "startOn",
       e.planned_sessions as "plannedSessions", s.pattern, coalesce(s.last_test_on, t.last_on)::text as "lastTestOn",
       f.open as "openFlags"
     from page join patients p on p.id = page.id
     left join lateral (select en.id, en.status, en.start_on, en.planned_sessions, pr.name as program_name
       from enrollments en join programs pr on pr.id = en.program_id
       where en.patient_id = p.id order by en.start_on desc, en.id desc limit 1) e on true
     left join enrollment_summaries s on s.enrollment_id = e.id
     left join lateral (select (m.taken_at at time zone $timeZone)::date as last_on from measurements m
       where m.patient_id = p.id and m.voided_at is null and e.id is null
       order by m.taken_at desc, m.id desc limit 1) t on true
     left join lateral (select count(*)::int as open from flags fl
       where fl.patient_id = p.id and fl.status = 'open') f on true
     order by page.branch, page.sort1, page.sort2, page.id`,
    {
      ...visibleTo(actor),
      timeZone: actor.clinic.timeZone,
      limit: page.limit + 1,
      ...(page.list === 'all' ? {} : { list: page.list }),
      ...Object.assign({}, ...branches.map((branch) => branch.bind)),
      ...(after ? { branch: after[0], sort1: after[1], sort2: after[2], id: after[3] } : {}),
    },
  );
  return pageOf(rows, page.limit, (row) => [row.branch, row.sort1, row.sort2, row.id], present);
}
