import type { VoidBody } from '@slighthill/shared/contracts/common';
import type { FileEntryInput } from '@slighthill/shared/contracts/file-entry';
import type { MeasurementInput } from '@slighthill/shared/contracts/measurement';
import type { EnrollmentCreate, EnrollmentPatch, PatientCreate } from '@slighthill/shared/contracts/patient';
import type { SpirometryTestInput } from '@slighthill/shared/contracts/spirometry-test';
import type { StaffRole } from '@slighthill/shared/permissions';

export type SpirometryEntry = SpirometryTestInput | { tests: [SpirometryTestInput, SpirometryTestInput] };

type Withdrawn = Omit<VoidBody, 'version'>;

export type StepAction =
  | { kind: 'patient'; body: PatientCreate & { id: string } }
  | { kind: 'account'; id: string; email: string }
  | { kind: 'enrollment'; body: EnrollmentCreate & { id: string } }
  | { kind: 'enrollment-change'; id: string; changes: Omit<EnrollmentPatch, 'version'> }
  | { kind: 'file-entry'; body: FileEntryInput }
  | { kind: 'hold-release'; id: string; reason: string }
  | { kind: 'spirometry'; body: SpirometryEntry }
  | { kind: 'spirometry-amend'; id: string; reason: string; changes: Partial<SpirometryTestInput> }
  | { kind: 'spirometry-void'; id: string; body: Withdrawn }
  | { kind: 'measurement'; body: MeasurementInput }
  | { kind: 'measurement-amend'; id: string; reason: string; value: number }
  | { kind: 'measurement-void'; id: string; body: Withdrawn }
  | { kind: 'flag-resolve'; note: string };

/** One thing somebody did about one patient, at the moment they did it. */
export type DemoStep = StepAction & { at: Date; by: StaffRole; patientId: string };
