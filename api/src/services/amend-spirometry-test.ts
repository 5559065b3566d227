import { spirometryTestCreate, type SpirometryAmendBody } from '@slighthill/shared/contracts/spirometry-test';
import { validate } from '../errors/validate';
import { Patient } from '../models/patient';
import { SpirometryTest } from '../models/spirometry-test';
import { presentSpirometryTest } from '../presenters/spirometry-test';
import { findSpirometryTest } from '../queries/spirometry-tests';
import { checkInstant } from './check-instant';
import { bringInLine } from './bring-in-line';
import { runCommand, type CommandContext } from './command-context';
import { keepRevision, requireChanges } from './keep-revision';
import { lockEntryForChange } from './lock-for-change';
import { spirometryColumns, writeSpirometryFacts } from './write-spirometry-facts';

/** Changes a test with a reason; what it said before is kept, and everything that follows from it is brought in line. */
export async function amendSpirometryTest(
  context: CommandContext,
  id: string,
  body: SpirometryAmendBody,
): Promise<void> {
  await runCommand(context, async () => {
    const row = await lockEntryForChange(context, SpirometryTest, id, body.version);
    const patient = (await Patient.findByPk(row.patientId, { lock: true }))!;
    context.audit.showsPatients(patient.id);
    context.audit.about('spirometry-test', row.id);
    const before = presentSpirometryTest((await findSpirometryTest(context.actor, id))!);
    const { version: _version, reason, ...changes } = body;
    requireChanges(changes);
    const merged = validate(spirometryTestCreate, { ...editable(before), ...withEntry(changes) }, 'body');
    checkInstant(context, patient, new Date(merged.performedAt), 'performedAt');
    await keepRevision(context, 'spirometry-test', row, before, reason);
    await row.update({ ...spirometryColumns(merged), version: row.version + 1 });
    await writeSpirometryFacts(context, patient, row, merged.maneuvers);
    await bringInLine(context, patient);
  });
}

/** A test is kept either as maneuvers or as best values: giving one takes the place of the other. */
function withEntry(changes: Omit<SpirometryAmendBody, 'version' | 'reason'>) {
  if (changes.maneuvers) return { ...changes, best: null };
  if (changes.best) return { ...changes, maneuvers: null };
  return changes;
}

function editable(test: ReturnType<typeof presentSpirometryTest>) {
  const { fev1, fvc, pef, fef2575 } = test.best;
  return {
    performedAt: test.performedAt,
    heightCm: test.heightCm,
    heightMethod: test.heightMethod,
    weightKg: test.weightKg,
    bronchodilator: test.bronchodilator,
    drug: test.drug,
    doseMcg: test.doseMcg,
    minutesSinceDose: test.minutesSinceDose,
    ownBronchodilatorHoursAgo: test.ownBronchodilatorHoursAgo,
    best: test.entry === 'best' ? { fev1, fvc, pef, fef2575 } : null,
    maneuvers: test.entry === 'maneuvers' ? test.maneuvers : null,
    note: test.note,
  };
}
