import { addDays, daysBetween } from '@slighthill/shared/calendar';
import type { EnrollmentPatch, EnrollmentStatus } from '@slighthill/shared/contracts/patient';
import { AppError, invalidInput } from '../errors/app-error';
import { Enrollment } from '../models/enrollment';
import { Patient } from '../models/patient';
import { clinicDate } from '../time/clinic-time';
import { runCommand, type CommandContext } from './command-context';
import { before } from './given';
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
    const moves = body.status !== undefined && body.status !== row.status;
    const changes = {
      ...dateChanges(context, row, body),
      ...(moves ? statusChanges(context, row, body, body.status!) : endCorrection(context, row, body)),
    };
    if (Object.keys(changes).length === 0) return row;
    context.audit.keepsBefore(before(row, changes));
    await row.update({ ...changes, version: row.version + 1 });
    await refreshPatientList(patient);
    await refreshSummaries(context, patient);
    return row;
  });
}

function dateChanges(context: CommandContext, row: Enrollment, body: EnrollmentPatch) {
  const { startOn, consentOn } = body;
  const moved = startOn !== undefined && startOn !== row.startOn;
  if (moved && ended.includes(row.status))
    throw new AppError('wrong-state', 'This enrollment has ended and its start is not moved any more.');
  if (consentOn && consentOn > todayOf(context))
    throw invalidInput({ path: 'consentOn', message: 'This is in the future' });
  return {
    ...(moved ? { startOn, plannedEndOn: addDays(startOn, daysBetween(row.startOn, row.plannedEndOn)) } : {}),
    ...(consentOn !== undefined && consentOn !== row.consentOn ? { consentOn } : {}),
  };
}

/** Without a change of state only a wrong end date is corrected, with a reason; anything else is said to be unused. */
function endCorrection(context: CommandContext, row: Enrollment, body: EnrollmentPatch) {
  const { endedOn, reason } = body;
  if (endedOn === undefined || endedOn === row.endedOn) {
    if (reason)
      throw invalidInput({ path: 'reason', message: 'The state does not change, so there is nothing to explain' });
    return {};
  }
  if (!ended.includes(row.status)) throw invalidInput({ path: 'endedOn', message: 'Say first how the course ended' });
  if (!reason) throw invalidInput({ path: 'reason', message: 'Say why in a few words' });
  checkEnd(context, row.startOn, endedOn);
  return { endedOn, statusReason: reason };
}

const todayOf = (context: CommandContext) => clinicDate(context.clock.now(), context.actor.clinic.timeZone);

function checkEnd(context: CommandContext, startOn: string, endedOn: string): void {
  if (endedOn < startOn) throw invalidInput({ path: 'endedOn', message: 'This is before the start' });
  if (endedOn > todayOf(context)) throw invalidInput({ path: 'endedOn', message: 'This is in the future' });
}

function statusChanges(context: CommandContext, row: Enrollment, body: EnrollmentPatch, status: EnrollmentStatus) {
  if (!next[row.status].includes(status))
    throw new AppError('wrong-state', `An enrollment that is ${row.status} cannot become ${status}.`);
  const needsReason = status === 'paused' || status === 'partly-completed' || status === 'withdrawn';
  if (needsReason && !body.reason) throw invalidInput({ path: 'reason', message: 'Say why in a few words' });
  if (!ended.includes(status)) {
    if (body.endedOn) throw invalidInput({ path: 'endedOn', message: 'A course that goes on has no end date' });
    return { status, statusReason: body.reason ?? null };
  }
  const startOn = body.startOn ?? row.startOn;
  if (body.endedOn) checkEnd(context, startOn, body.endedOn);
  // a course that never began ends on its planned start at the earliest
  const today = todayOf(context);
  return { status, statusReason: body.reason ?? null, endedOn: body.endedOn ?? (today < startOn ? startOn : today) };
}
