import type { ClinicPatch, ProgramCreate, ProgramPatch } from '@slighthill/shared/contracts/clinic';
import { Op } from 'sequelize';
import { AppError, notFound, staleVersion } from '../errors/app-error';
import { Clinic } from '../models/clinic';
import { Program } from '../models/program';
import { runCommand, type CommandContext } from './command-context';
import { createOnce, type Created } from './create-once';
import { given } from './given';
import { lockForChange } from './lock-for-change';

/** What summaries depend on besides the results themselves. */
const ruleFields = ['timeZone', 'ratioRule', 'fev1SeverityRule', 'tlcSeverityRule', 'tlcWindowDays'] as const;

/** Changes the clinic's name, zone or default rules; says whether summaries have to follow. */
export async function updateClinic(
  context: CommandContext,
  body: ClinicPatch,
): Promise<{ clinic: Clinic; rulesChanged: boolean }> {
  return await runCommand(context, async () => {
    const clinic = await Clinic.findByPk(context.actor.clinicId, { lock: true });
    if (!clinic) throw notFound();
    if (clinic.version !== body.version) throw staleVersion();
    const { version: _version, ...changes } = body;
    const kept = given(changes);
    if (Object.keys(kept).length === 0) return { clinic, rulesChanged: false };
    const rulesChanged = ruleFields.some((field) => kept[field] !== undefined && kept[field] !== clinic[field]);
    context.audit.about('clinic', clinic.id);
    return { clinic: await clinic.update({ ...kept, version: clinic.version + 1 }), rulesChanged };
  });
}

export async function addProgram(context: CommandContext, body: ProgramCreate): Promise<Created<Program>> {
  return await runCommand(context, async () => {
    const created = await createOnce<Program>(context, {
      kind: 'program',
      id: body.id,
      request: body,
      find: (id) => Program.findByPk(id),
      create: async (id) => {
        await refuseTakenName(context, body.name, id);
        return await Program.create({ ...body, id, clinicId: context.actor.clinicId });
      },
    });
    context.audit.about('program', created.row.id);
    return created;
  });
}

/** Changes a program; enrollments that began keep the numbers they began with. */
export async function updateProgram(context: CommandContext, id: string, body: ProgramPatch): Promise<Program> {
  return await runCommand(context, async () => {
    const program = await lockForChange(context, Program, id, body.version);
    context.audit.about('program', program.id);
    const { version: _version, retired, ...changes } = body;
    const retiredAt = retired === undefined ? program.retiredAt : retired ? context.clock.now() : null;
    const kept = {
      ...given(changes),
      ...((retiredAt === null) === (program.retiredAt === null) ? {} : { retiredAt }),
    };
    if (Object.keys(kept).length === 0) return program;
    if (retiredAt === null) await refuseTakenName(context, body.name ?? program.name, program.id);
    return await program.update({ ...kept, version: program.version + 1 });
  });
}

async function refuseTakenName(context: CommandContext, name: string, exceptId: string): Promise<void> {
  const taken = await Program.findOne({
    where: { clinicId: context.actor.clinicId, name: { [Op.iLike]: name.replace(/[\\%_]/g, '\\$&') }, retiredAt: null },
    attributes: ['id'],
  });
  if (!taken || taken.id === exceptId) return;
  throw new AppError('already-exists', 'There is a program of this name already. Nothing was stored.', [
    { path: 'name', message: 'There is a program of this name already' },
  ]);
}
