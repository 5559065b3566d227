import type { Sequelize } from 'sequelize';
import { inTransaction } from '../db/in-transaction';
import { selectRow, selectRows } from '../db/query';
import { Clinic } from '../models/clinic';
import { systemClock } from '../time/system-clock';
import { refreshSummaries } from './refresh-summaries';

interface Stored {
  summaries: string | null;
}

const storedSql = `
  select json_agg(json_build_array(enrollment_id, pattern, measures, last_test_on) order by enrollment_id)::text
    as summaries from enrollment_summaries where patient_id = $patientId`;

/** Computes every summary again from its sources and counts the patients whose stored summary had differed. */
export async function rebuildEnrollmentSummaries(
  _sequelize: Sequelize,
): Promise<{ rebuilt: number; differed: number }> {
  let rebuilt = 0;
  let differed = 0;
  for (const clinic of await Clinic.findAll({ order: ['id'] })) {
    const actor = { clinicId: clinic.id, clinic };
    const patients = await selectRows<{ id: string }>(
      'select distinct patient_id as id from enrollments where clinic_id = $clinicId order by 1',
      { clinicId: clinic.id },
    );
    for (const { id } of patients) {
      const before = await selectRow<Stored>(storedSql, { patientId: id });
      await inTransaction(() => refreshSummaries({ actor, clock: systemClock }, { id }));
      const after = await selectRow<Stored>(storedSql, { patientId: id });
      rebuilt += 1;
      if (before?.summaries !== after?.summaries) differed += 1;
    }
  }
  return { rebuilt, differed };
}
