import type { MeHome } from '@slighthill/shared/contracts/me';
import { selectRow } from '../db/query';
import type { Actor } from '../policies/actor';
import { visibleTo } from '../policies/policy';

/** The signed-in patient's own first page. */
export async function findMeHome(actor: Actor, patientId: string): Promise<(MeHome & { patientId: string }) | null> {
  return await selectRow<MeHome & { patientId: string }>(
    `select p.id as "patientId", p.given_name as "givenName",
       json_build_object('name', c.name, 'phone', c.phone) as clinic,
       (select json_build_object('name', pr.name, 'startOn', e.start_on, 'plannedSessions', e.planned_sessions,
          'weeks', (e.planned_end_on - e.start_on) / 7)
        from enrollments e join programs pr on pr.id = e.program_id
        where e.patient_id = p.id and e.status in ('planned', 'active', 'paused')) as program
     from patients p join clinics c on c.id = p.clinic_id
     where p.id = $patientId and p.clinic_id = $clinicId`,
    { patientId, ...visibleTo(actor) },
  );
}
