import type { Ability } from '@slighthill/shared/permissions';
import { Patient } from '../models/patient';
import { visibleTo } from '../policies/policy';
import type { RequestContext } from './request-context';

/** Loads the patient a route is about, authorizes it and names it in the audit event. */
export async function loadPatient(context: RequestContext, id: string, ability: Ability): Promise<Patient> {
  const row = await Patient.findOne({ where: { id, ...visibleTo(context.actor) } });
  const patient = context.authorizeRow(ability, row, 'This patient');
  context.audit.showsPatients(patient.id);
  return patient;
}

/** Authorizes a loaded entry of a patient's record and names the patient in the audit event. */
export function showEntry<Row extends { id: string; clinicId: string; patientId: string }>(
  context: RequestContext,
  ability: Ability,
  kind: string,
  row: Row | null,
): Row {
  const entry = context.authorizeRow(ability, row, 'This entry');
  context.audit.showsPatients(entry.patientId);
  context.audit.about(kind, entry.id);
  return entry;
}
