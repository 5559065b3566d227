import { hashPassword } from '@slighthill/api/auth/passwords';
import { Clinic } from '@slighthill/api/models/clinic';
import { clinicDate } from '@slighthill/api/time/clinic-time';
import { addDays } from '@slighthill/shared/calendar';
import type { Sequelize } from 'sequelize';
import { clinicInstant } from './clinic-instant';
import { alderFalls, demoPassword, stonebridge, stonebridgePatients, type DemoClinic } from './demo-clinics';
import { withDemoTime } from './demo-time';
import { mainScript, secondScript } from './demo-script';
import { openClinic, type OpenClinic } from './open-clinic';
import { OrderedAudit } from './ordered-audit';
import { playScript } from './play-script';
import { withLazyCommits } from './with-lazy-commits';

export interface SeedOptions {
  /** In the first clinic; the second always has three. */
  patients?: number;
  onProgress?: (done: number, total: number) => void;
  now?: Date;
}

const defaultPatients = 60;
/** The clinics open before the first of fourteen months of patients. */
const openedDaysAgo = 440;
const demoIds = [alderFalls.id, stonebridge.id];

/**
 * True when there is no clinic, and when a demo load that was cut off left the only ones: its clinics are marked as demo
 * clinics last, so until then nobody can have worked with them.
 */
export async function isDatabaseEmpty(sequelize: Sequelize): Promise<boolean> {
  return (await Clinic.count()) === 0 || (await isCutOff(sequelize));
}

async function isCutOff(_sequelize: Sequelize): Promise<boolean> {
  const clinics = await Clinic.findAll({ attributes: ['id', 'demo'] });
  return clinics.length > 0 && clinics.every(({ id, demo }) => demoIds.includes(id) && !demo);
}

/**
 * Loads the demo clinics through the services, each step at the moment it tells of. The same day gives the same data.
 * An earlier load that was cut off is cleared away first.
 */
export async function seedDemo(sequelize: Sequelize, options: SeedOptions = {}): Promise<{ patients: number }> {
  const { patients = defaultPatients, onProgress, now = new Date() } = options;
  if (await isCutOff(sequelize)) await sequelize.query('truncate clinics cascade');
  const passwordHash = await hashPassword(demoPassword);
  const load = async () => {
    const audit = new OrderedAudit();
    const main = await open(alderFalls, now, { passwordHash, audit });
    const second = await open(stonebridge, now, { passwordHash, audit });
    const script = [...mainScript(main, patients, now), ...secondScript(second, now)];
    script.sort((a, b) => a.step.at.getTime() - b.step.at.getTime());
    await playScript(script, (done) => onProgress?.(done, script.length));
    await audit.write();
  };
  await withLazyCommits(sequelize, () => withDemoTime(sequelize, load));
  await Clinic.update({ demo: true }, { where: { id: demoIds } });
  return { patients: patients + stonebridgePatients };
}

async function open(demo: DemoClinic, now: Date, means: Pick<OpenClinic, 'passwordHash' | 'audit'>) {
  const on = addDays(clinicDate(now, demo.timeZone), -openedDaysAgo);
  return await openClinic(demo, clinicInstant(on, 8 * 60, demo.timeZone), means);
}
