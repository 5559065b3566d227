import {
  fileEntryCreate,
  fileEntryKinds,
  medicineClasses,
  oxygenDevices,
  smokingStatuses,
  type FileEntryCreate,
  type FileEntryKind,
} from '@slighthill/shared/contracts/file-entry';
import { z } from 'zod';
import { fromLocalInput } from '../../../lib/clinic-time';
import { parseDecimal } from '../../../lib/parse-decimal';
import { issuesOf, type FormIssue } from '../forms/form-issues';

/** One flat form for every kind, so that a wrong kind can be changed without losing what was typed. */
export const fileForm = z.object({
  id: z.string(),
  kind: z.enum(['', ...fileEntryKinds]),
  on: z.string(),
  note: z.string(),
  diagnosisGroup: z.string(),
  description: z.string(),
  confirmedBy: z.string(),
  steroid: z.boolean(),
  antibiotic: z.boolean(),
  admitted: z.boolean(),
  restLpm: z.string(),
  walkingLpm: z.string(),
  asleepLpm: z.string(),
  device: z.enum(['', ...oxygenDevices]),
  prescriber: z.string(),
  outside: z.boolean(),
  name: z.string(),
  medicineClass: z.enum(['', ...medicineClasses]),
  lastDoseAt: z.string(),
  stoppedOn: z.string(),
  atrialFibrillation: z.enum(['', 'yes', 'no']),
  status: z.enum(['', ...smokingStatuses]),
  packYears: z.string(),
  quitOn: z.string(),
  item: z.string(),
  answered: z.array(z.string()),
  amendReason: z.string(),
});

export type FileForm = z.infer<typeof fileForm>;

export const emptyFileForm = (on: string, id: string, diagnosisGroup: string, outside: boolean): FileForm => ({
  id,
  kind: '',
  on,
  note: '',
  diagnosisGroup,
  description: '',
  confirmedBy: '',
  steroid: false,
  antibiotic: false,
  admitted: false,
  restLpm: '',
  walkingLpm: '',
  asleepLpm: '',
  device: '',
  prescriber: '',
  outside,
  name: '',
  medicineClass: '',
  lastDoseAt: '',
  stoppedOn: '',
  atrialFibrillation: '',
  status: '',
  packYears: '',
  quitOn: '',
  item: '',
  answered: [],
  amendReason: '',
});

const orNull = (text: string): string | null => (text === '' ? null : text);
const orMissing = (text: string): string | undefined => (text === '' ? undefined : text);

const detailsOf: Record<FileEntryKind, (form: FileForm, timeZone: string) => Record<string, unknown>> = {
  diagnosis: (form) => ({
    diagnosisGroup: orMissing(form.diagnosisGroup),
    description: form.description,
    confirmedBy: form.confirmedBy,
  }),
  exacerbation: ({ steroid, antibiotic, admitted }) => ({ steroid, antibiotic, admitted }),
  'oxygen-order': (form) => ({
    restLpm: parseDecimal(form.restLpm),
    walkingLpm: parseDecimal(form.walkingLpm),
    asleepLpm: parseDecimal(form.asleepLpm),
    device: orMissing(form.device),
    prescriber: form.prescriber,
    outside: form.outside,
  }),
  medicine: (form, timeZone) => ({
    name: form.name,
    medicineClass: orMissing(form.medicineClass),
    lastDoseAt: form.lastDoseAt === '' ? null : (fromLocalInput(form.lastDoseAt, timeZone) ?? form.lastDoseAt),
    stoppedOn: orNull(form.stoppedOn),
  }),
  'heart-rhythm': (form) => ({
    atrialFibrillation: form.atrialFibrillation === '' ? undefined : form.atrialFibrillation === 'yes',
  }),
  smoking: (form) => ({
    status: orMissing(form.status),
    packYears: form.status === 'never' ? null : parseDecimal(form.packYears),
    quitOn: form.status === 'former' ? orNull(form.quitOn) : null,
  }),
  'safety-hold': (form) => ({ item: orMissing(form.item) }),
};

export interface CheckedFileEntry {
  issues: FormIssue[];
  body: FileEntryCreate | null;
}

/** The form's fields carry the names of the details, so a message under `details` loses only that prefix. */
export const fileFormPath = (path: readonly PropertyKey[]): string =>
  (path[0] === 'details' ? path.slice(1) : path).map(String).join('.') || 'kind';

const nothingGiven: FormIssue = { path: 'restLpm', message: 'Enter at least one flow' };

/** Holds the form to the API's contract for its kind. */
export const checkFileEntry = (form: FileForm, timeZone: string): CheckedFileEntry => {
  if (form.kind === '') return { issues: [{ path: 'kind', message: 'Choose what to enter' }], body: null };
  const details = detailsOf[form.kind](form, timeZone);
  const result = fileEntryCreate.safeParse({ id: form.id, kind: form.kind, on: form.on, note: form.note, details });
  const issues = issuesOf(result, fileFormPath, (path) => form[path as keyof FileForm] === '');
  const noFlow =
    form.kind === 'oxygen-order' && [form.restLpm, form.walkingLpm, form.asleepLpm].every((flow) => flow.trim() === '');
  if (noFlow) issues.unshift(nothingGiven);
  return { issues, body: result.success && issues.length === 0 ? result.data : null };
};
