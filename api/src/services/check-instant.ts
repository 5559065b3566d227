import { wholeYears } from '@slighthill/shared/calendar';
import { invalidInput } from '../errors/app-error';
import type { Patient } from '../models/patient';
import { clinicDate } from '../time/clinic-time';
import type { CommandContext } from './command-context';

const aheadMs = 5 * 60_000;

/** Refuses an instant in the future (five minutes allowed for clocks that differ) or before the patient was 18. */
export function checkInstant(context: CommandContext, patient: Patient, instant: Date, path: string): void {
  if (instant.getTime() > context.clock.now().getTime() + aheadMs)
    throw invalidInput({ path, message: 'This is in the future' });
  checkDay(patient, clinicDate(instant, context.actor.clinic.timeZone), path);
}

/** The same for a calendar date. */
export function checkDate(context: CommandContext, patient: Patient, on: string, path: string): void {
  if (on > clinicDate(context.clock.now(), context.actor.clinic.timeZone))
    throw invalidInput({ path, message: 'This is in the future' });
  if (on < patient.birthDate) throw invalidInput({ path, message: 'This is before the patient was born' });
}

function checkDay(patient: Patient, on: string, path: string): void {
  if (on < patient.birthDate) throw invalidInput({ path, message: 'This is before the patient was born' });
  if (wholeYears(patient.birthDate, on) < 18)
    throw invalidInput({ path, message: 'The patient was under 18 on that day. Only adults are recorded here' });
}
