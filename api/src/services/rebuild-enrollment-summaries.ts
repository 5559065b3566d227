import type { Sequelize } from 'sequelize';
import { inTransaction } from '../db/in-transaction';
import { selectRow, selectRows } from '../db/query';
import { Clinic } from '../models/clinic';
import { Patient } from '../models/patient';
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
  const total = { rebuilt: 0, differed: 0 };
  for (const clinic of await Clinic.findAll({ order: ['id'] })) {
    const { rebuilt, differed } = await rebuildClinicSummaries(clinic);
    total.rebuilt += rebuilt;
    total.differed += differed;
  }
  return total;
}

/** The same for one clinic, a patient at a time: also run after its default rules or time zone changed. */
export async function rebuildClinicSummaries(clinic: Clinic): Promise<{ rebuilt: number; differed: number }> {
  const actor = { clinicId: clinic.id, clinic };
  const patients = await selectRows<{ id: string }>(
    'select distinct patient_id as id from enrollments where clinic_id = $clinicId order by 1',
    { clinicId: clinic.id },
  );
  let differed = 0;
  for (const { id } of patients) {
    const before = await selectRow<Stored>(storedSql, { patientId: id });
    await inTransaction(async () => {
      await Patient.findByPk(id, { lock: true, attributes: ['id'] });
      await refreshSummaries({ actor, clock: systemClock }, { id });
    });
    const after = await selectRow<Stored>(storedSql, { patientId: id });
    if (before?.summaries !== after?.summaries) differed += 1;
  }
  return { rebuilt: patients.length, differed };
}
