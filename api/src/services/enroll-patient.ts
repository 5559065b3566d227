import { addDays } from '@slighthill/shared/calendar';
import type { EnrollmentCreate } from '@slighthill/shared/contracts/patient';
import { openEnrollmentStatuses } from '@slighthill/shared/contracts/patient';
import { AppError, invalidInput } from '../errors/app-error';
import { Enrollment } from '../models/enrollment';
import { Patient } from '../models/patient';
import { Program } from '../models/program';
import { visibleTo } from '../policies/policy';
import { clinicDate } from '../time/clinic-time';
import { runCommand, type CommandContext } from './command-context';
import { createOnce, type Created } from './create-once';
import { refreshPatientList } from './refresh-patient-list';
import { refreshSummaries } from './refresh-summaries';

/** Enrolls a patient in a program. A patient has one open enrollment at a time; the database holds to it as well. */
export async function enrollPatient(
  context: CommandContext,
  patient: Patient,
  body: EnrollmentCreate,
): Promise<Created<Enrollment>> {
  context.audit.showsPatients(patient.id);
  return await runCommand(context, async () => {
    const locked = (await Patient.findByPk(patient.id, { lock: true }))!;
    const created = await createOnce<Enrollment>(context, {
      kind: 'enrollment',
      id: body.id,
      request: { patientId: patient.id, body },
      find: (id) => Enrollment.findByPk(id),
      create: async (id) => {
        const program = await Program.findOne({ where: { id: body.programId, ...visibleTo(context.actor) } });
        if (!program || program.retiredAt !== null)
          throw invalidInput({ path: 'programId', message: 'Choose one of the clinic\u2019s programs' });
        if (body.consentOn && body.consentOn > clinicDate(context.clock.now(), context.actor.clinic.timeZone))
          throw invalidInput({ path: 'consentOn', message: 'This is in the future' });
        if (body.startOn < patient.birthDate)
          throw invalidInput({ path: 'startOn', message: 'This is before the patient was born' });
        const open = await Enrollment.findOne({
          where: { patientId: patient.id, status: [...openEnrollmentStatuses] },
          attributes: ['id'],
        });
        if (open)
          throw new AppError(
            'wrong-state',
            'This patient has an open enrollment already. End it before starting another.',
          );
        const row = await Enrollment.create({
          id,
          clinicId: patient.clinicId,
          patientId: patient.id,
          programId: program.id,
          status: 'planned',
          startOn: body.startOn,
          plannedEndOn: addDays(body.startOn, program.weeks * 7),
          plannedSessions: program.plannedSessions,
          consentOn: body.consentOn,
        });
        await refreshPatientList(locked);
        await refreshSummaries(context, locked);
        return row;
      },
    });
    context.audit.about('enrollment', created.row.id);
    return created;
  });
}
