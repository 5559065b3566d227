import { addDays, daysBetween } from '@slighthill/shared/calendar';
import type { EnrollmentPatch, EnrollmentStatus } from '@slighthill/shared/contracts/patient';
import { AppError, invalidInput } from '../errors/app-error';
import { Enrollment } from '../models/enrollment';
import { Patient } from '../models/patient';
import { clinicDate } from '../time/clinic-time';
import { runCommand, type CommandContext } from './command-context';
import { lockForChange } from './lock-for-change';
import { refreshPatientList } from './refresh-patient-list';
import { refreshSummaries } from './refresh-summaries';

const ended: readonly EnrollmentStatus[] = ['completed', 'partly-completed', 'withdrawn'];

/** What may follow what. An ended enrollment stays ended; a new course is a new enrollment. */
const next: Record<EnrollmentStatus, readonly EnrollmentStatus[]> = {
  planned: ['active', 'withdrawn'],
  active: ['paused', 'completed', 'partly-completed', 'withdrawn'],
  paused: ['active', 'completed', 'partly-completed', 'withdrawn'],
  completed: [],
  'partly-completed': [],
  withdrawn: [],
};

/** Moves an enrollment's dates or state; pausing or ending it early takes a reason. */
export async function updateEnrollment(
  context: CommandContext,
  id: string,
  body: EnrollmentPatch,
): Promise<Enrollment> {
  return await runCommand(context, async () => {
    const row = await lockForChange(context, Enrollment, id, body.version);
    const patient = (await Patient.findByPk(row.patientId, { lock: true }))!;
    context.audit.showsPatients(patient.id);
    context.audit.about('enrollment', row.id);
    const changes = {
      ...dateChanges(row, body),
      ...(body.status && body.status !== row.status ? statusChanges(context, row, body, body.status) : {}),
    };
    if (Object.keys(changes).length === 0) return row;
    await row.update({ ...changes, version: row.version + 1 });
    await refreshPatientList(patient);
    await refreshSummaries(context, patient);
    return row;
  });
}

function dateChanges(row: Enrollment, body: EnrollmentPatch) {
  const { startOn, consentOn } = body;
  const moved = startOn !== undefined && startOn !== row.startOn;
  if (moved && ended.includes(row.status))
    throw new AppError('wrong-state', 'This enrollment has ended and its start is not moved any more.');
  return {
    ...(moved ? { startOn, plannedEndOn: addDays(startOn, daysBetween(row.startOn, row.plannedEndOn)) } : {}),
    ...(consentOn !== undefined && consentOn !== row.consentOn ? { consentOn } : {}),
  };
}

function statusChanges(context: CommandContext, row: Enrollment, body: EnrollmentPatch, status: EnrollmentStatus) {
  if (!next[row.status].includes(status))
    throw new AppError('wrong-state', `An enrollment that is ${row.status} cannot become ${status}.`);
  const needsReason = status === 'paused' || status === 'partly-completed' || status === 'withdrawn';
  if (needsReason && !body.reason) throw invalidInput({ path: 'reason', message: 'Say why in a few words' });
  if (!ended.includes(status)) return { status, statusReason: body.reason ?? null };
  const today = clinicDate(context.clock.now(), context.actor.clinic.timeZone);
  const startOn = body.startOn ?? row.startOn;
  // a course that never began ends on its planned start at the earliest
  const endedOn = body.endedOn ?? (today < startOn ? startOn : today);
  if (endedOn < startOn) throw invalidInput({ path: 'endedOn', message: 'This is before the start' });
  if (body.endedOn && endedOn > today) throw invalidInput({ path: 'endedOn', message: 'This is in the future' });
  return { status, statusReason: body.reason ?? null, endedOn };
}
