import { openEnrollmentStatuses } from '@slighthill/shared/contracts/patient';
import { requireTransaction } from '../db/in-transaction';
import { Enrollment } from '../models/enrollment';
import type { Patient } from '../models/patient';

/** Keeps which list a patient stands in: current with an open enrollment, finished with only ended ones. */
export async function refreshPatientList(patient: Patient): Promise<void> {
  requireTransaction();
  const enrollments = await Enrollment.findAll({ where: { patientId: patient.id }, attributes: ['status'] });
  const isOpen = enrollments.some(({ status }) => (openEnrollmentStatuses as readonly string[]).includes(status));
  const list = isOpen ? 'current' : enrollments.length > 0 ? 'finished' : 'none';
  if (list !== patient.list) await patient.update({ list });
}
