import type { FileEntry } from '@slighthill/shared/contracts/file-entry';
import { toLocalInput } from '../../../lib/clinic-time';
import { emptyFileForm, fileForm, type FileForm } from './file-form';

const write = (value: unknown): unknown => {
  if (value === null || value === undefined) return '';
  return typeof value === 'number' ? String(value) : value;
};

/** The form as it would have been typed for an entry in the file. */
export const formOfEntry = (entry: FileEntry, timeZone: string): FileForm => {
  const empty = emptyFileForm(entry.on, entry.id, '', false);
  const details = Object.fromEntries(Object.entries(entry.details).map(([name, value]) => [name, write(value)]));
  const { lastDoseAt, atrialFibrillation } = entry.details;
  return fileForm.parse({
    ...empty,
    ...details,
    kind: entry.kind,
    note: entry.note ?? '',
    lastDoseAt: typeof lastDoseAt === 'string' ? toLocalInput(lastDoseAt, timeZone) : '',
    atrialFibrillation: typeof atrialFibrillation === 'boolean' ? (atrialFibrillation ? 'yes' : 'no') : '',
  });
};
