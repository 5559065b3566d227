import { fileEntryKindLabels, type FileEntry, type FileEntryKind } from '@slighthill/shared/contracts/file-entry';
import type { medicineClasses, oxygenDevices, smokingStatuses } from '@slighthill/shared/contracts/file-entry';
import { diagnosisGroupLabels, type DiagnosisGroup } from '@slighthill/shared/contracts/patient';
import { formatNumber } from '@slighthill/shared/format';
import { safetyItem, type SafetyItemId } from '@slighthill/shared/safety-checklist';
import { formatDate } from '../../../lib/clinic-time';

export const medicineClassLabels: Record<(typeof medicineClasses)[number], string> = {
  'short-acting-beta-agonist': 'Short-acting beta-agonist',
  'short-acting-antimuscarinic': 'Short-acting antimuscarinic',
  'long-acting-beta-agonist': 'Long-acting beta-agonist',
  'long-acting-antimuscarinic': 'Long-acting antimuscarinic',
  'beta-blocker': 'Beta-blocker',
  other: 'Other',
};

export const oxygenDeviceLabels: Record<(typeof oxygenDevices)[number], string> = {
  concentrator: 'Concentrator',
  'portable-concentrator': 'Portable concentrator',
  cylinder: 'Cylinder',
  liquid: 'Liquid oxygen',
  other: 'Other device',
};

export const smokingLabels: Record<(typeof smokingStatuses)[number], string> = {
  never: 'Never smoked',
  former: 'Stopped smoking',
  current: 'Smokes',
};

/** What the date of an entry speaks of, by kind. */
export const dateLabels: Record<FileEntryKind, string> = {
  diagnosis: 'Date of the diagnosis',
  exacerbation: 'Onset',
  'oxygen-order': 'Ordered on',
  medicine: 'Taken since',
  'heart-rhythm': 'Known on',
  smoking: 'Asked on',
  'safety-hold': 'Found on',
};

export const kindLabel = (kind: FileEntryKind): string => fileEntryKindLabels[kind];

const text = (value: unknown): string | null => (typeof value === 'string' && value !== '' ? value : null);
const lowerFirst = (words: string | undefined): string | null =>
  words ? words.charAt(0).toLowerCase() + words.slice(1) : null;
const joined = (...parts: (string | null | false | undefined)[]): string => parts.filter(Boolean).join(', ');

const flowWords = (name: string, value: unknown): string | null =>
  typeof value === 'number' ? `${name} ${formatNumber(value, Number.isInteger(value) ? 0 : 1)} L/min` : null;

type Details = Record<string, unknown>;

const writers: Record<FileEntryKind, (details: Details) => string> = {
  diagnosis: (details) =>
    joined(
      diagnosisGroupLabels[details.diagnosisGroup as DiagnosisGroup],
      text(details.description),
      text(details.confirmedBy) ? `confirmed by ${text(details.confirmedBy)}` : 'not confirmed',
    ),
  exacerbation: (details) =>
    joined(
      details.steroid === true && 'Treated with a steroid',
      details.antibiotic === true && 'treated with an antibiotic',
      details.admitted === true && 'admitted',
    ) || 'No steroid, no antibiotic, not admitted',
  'oxygen-order': (details) =>
    joined(
      flowWords('at rest', details.restLpm),
      flowWords('walking', details.walkingLpm),
      flowWords('asleep', details.asleepLpm),
      lowerFirst(oxygenDeviceLabels[details.device as keyof typeof oxygenDeviceLabels]),
      details.outside === true
        ? `outside order by ${text(details.prescriber)}`
        : `ordered by ${text(details.prescriber)}`,
    ),
  medicine: (details) =>
    joined(
      text(details.name),
      lowerFirst(medicineClassLabels[details.medicineClass as keyof typeof medicineClassLabels]),
      text(details.stoppedOn) && `stopped ${formatDate(String(details.stoppedOn))}`,
    ),
  'heart-rhythm': (details) => (details.atrialFibrillation === true ? 'Atrial fibrillation' : 'No atrial fibrillation'),
  smoking: (details) =>
    joined(
      smokingLabels[details.status as keyof typeof smokingLabels],
      typeof details.packYears === 'number' && `${details.packYears} pack-years`,
      text(details.quitOn) && `since ${formatDate(String(details.quitOn))}`,
    ),
  'safety-hold': (details) => safetyItem(details.item as SafetyItemId)?.label ?? '',
};

const upperFirst = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

/** One entry in a line. */
export const fileEntryWords = ({ kind, details }: Pick<FileEntry, 'kind' | 'details'>): string =>
  upperFirst(writers[kind](details));
