import { Enrollment } from '@slighthill/api/models/enrollment';
import { FileEntry } from '@slighthill/api/models/file-entry';
import { Flag } from '@slighthill/api/models/flag';
import { Measurement } from '@slighthill/api/models/measurement';
import type { Patient } from '@slighthill/api/models/patient';
import { SpirometryTest } from '@slighthill/api/models/spirometry-test';
import { User } from '@slighthill/api/models/user';
import { amendMeasurement } from '@slighthill/api/services/amend-measurement';
import { amendSpirometryTest } from '@slighthill/api/services/amend-spirometry-test';
import type { CommandContext } from '@slighthill/api/services/command-context';
import { createPatient } from '@slighthill/api/services/create-patient';
import { enrollPatient } from '@slighthill/api/services/enroll-patient';
import { recordFileEntry } from '@slighthill/api/services/record-file-entry';
import { recordMeasurement } from '@slighthill/api/services/record-measurement';
import { recordSpirometryTest } from '@slighthill/api/services/record-spirometry-test';
import { releaseHold } from '@slighthill/api/services/release-hold';
import { resolveFlag } from '@slighthill/api/services/resolve-flag';
import { updateEnrollment } from '@slighthill/api/services/update-enrollment';
import { voidEntry } from '@slighthill/api/services/void-entry';
import { fileEntryCreate } from '@slighthill/shared/contracts/file-entry';
import { measurementAmendBody, measurementCreate } from '@slighthill/shared/contracts/measurement';
import { enrollmentCreate, enrollmentPatch, patientCreate } from '@slighthill/shared/contracts/patient';
import { spirometryAmendBody, spirometryCreateBody } from '@slighthill/shared/contracts/spirometry-test';
import { atMoment } from './demo-time';
import { contextOf, type OpenClinic } from './open-clinic';
import type { DemoStep } from './steps';

/** What the audit trail calls each step; the same names as the routes use. */
const actions: Record<DemoStep['kind'], string> = {
  patient: 'patient.create',
  account: 'user.create',
  enrollment: 'enrollment.create',
  'enrollment-change': 'enrollment.change',
  'file-entry': 'file-entry.create',
  'hold-release': 'file-entry.release',
  spirometry: 'spirometry-test.create',
  'spirometry-amend': 'spirometry-test.amend',
  'spirometry-void': 'spirometry-test.void',
  measurement: 'measurement.create',
  'measurement-amend': 'measurement.amend',
  'measurement-void': 'measurement.void',
  'flag-resolve': 'flag.resolve',
};

/** Does what a step tells of, through the service the person's screen would have called, at its own moment. */
export async function playStep(clinic: OpenClinic, step: DemoStep): Promise<void> {
  const context = contextOf(clinic.audit, clinic.actorFor(step.by), actions[step.kind], step.at);
  await atMoment(step.at, () => play(clinic, context, step));
}

async function play(clinic: OpenClinic, context: CommandContext, step: DemoStep): Promise<void> {
  switch (step.kind) {
    case 'patient':
      clinic.patients.set(step.patientId, (await createPatient(context, patientCreate.parse(step.body))).row);
      return;
    case 'account':
      return await openAccount(clinic, context, step);
    case 'enrollment':
      return void (await enrollPatient(context, patientOf(clinic, step), enrollmentCreate.parse(step.body)));
    case 'file-entry':
      return void (await recordFileEntry(context, patientOf(clinic, step), fileEntryCreate.parse(step.body)));
    case 'spirometry':
      return void (await recordSpirometryTest(context, patientOf(clinic, step), spirometryCreateBody.parse(step.body)));
    case 'measurement':
      return void (await recordMeasurement(context, patientOf(clinic, step), measurementCreate.parse(step.body)));
    default:
      return await change(context, step);
  }
}

type Change = Exclude<
  DemoStep,
  { kind: 'patient' | 'account' | 'enrollment' | 'file-entry' | 'spirometry' | 'measurement' }
>;

async function change(context: CommandContext, step: Change): Promise<void> {
  switch (step.kind) {
    case 'enrollment-change': {
      const { version } = required(await Enrollment.findByPk(step.id));
      return void (await updateEnrollment(context, step.id, enrollmentPatch.parse({ ...step.changes, version })));
    }
    case 'hold-release': {
      const { version } = required(await FileEntry.findByPk(step.id));
      return await releaseHold(context, step.id, version, step.reason);
    }
    case 'spirometry-amend': {
      const { version } = required(await SpirometryTest.findByPk(step.id));
      const body = spirometryAmendBody.parse({ ...step.changes, version, reason: step.reason });
      return await amendSpirometryTest(context, step.id, body);
    }
    case 'spirometry-void': {
      const { version } = required(await SpirometryTest.findByPk(step.id));
      return await voidEntry(context, 'spirometry-test', step.id, { ...step.body, version });
    }
    case 'measurement-amend': {
      const { version } = required(await Measurement.findByPk(step.id));
      const body = measurementAmendBody.parse({ value: step.value, version, reason: step.reason });
      return await amendMeasurement(context, step.id, body);
    }
    case 'measurement-void': {
      const { version } = required(await Measurement.findByPk(step.id));
      return await voidEntry(context, 'measurement', step.id, { ...step.body, version });
    }
    case 'flag-resolve': {
      const flag = required(await Flag.findOne({ where: { patientId: step.patientId, status: 'open' } }));
      return void (await resolveFlag(context, flag.id, flag.version, step.note));
    }
  }
}

const patientOf = ({ patients }: OpenClinic, step: DemoStep): Patient => required(patients.get(step.patientId));

function required<T>(row: T | null | undefined): T {
  if (row == null) throw new Error('A step of the demo speaks of a row that does not exist');
  return row;
}

/** The patient's own account. Inviting patients is not a screen yet, so the row is written here. */
async function openAccount(
  open: OpenClinic,
  { actor }: CommandContext,
  step: DemoStep & { kind: 'account' },
): Promise<void> {
  const { clinic, passwordHash } = open;
  const patient = patientOf(open, step);
  await User.create({
    id: step.id,
    clinicId: clinic.id,
    email: step.email,
    displayName: `${patient.givenName} ${patient.familyName}`,
    roles: ['patient'],
    passwordHash,
    patientId: patient.id,
  });
  open.audit.keep(
    {
      clinicId: clinic.id,
      actorId: actor.userId,
      actorName: actor.displayName,
      action: actions.account,
      patientIds: [patient.id],
      entity: { kind: 'user', id: step.id },
    },
    step.at,
  );
}
