import type { FileEntry } from '@slighthill/shared/contracts/file-entry';
import { formatDate, formatInstant } from '../../../lib/clinic-time';
import { factsFrom, type Fact } from '../history/fact';
import { dateLabels, fileEntryWords, kindLabel } from './file-words';

/** What an entry says; an earlier content of the same entry has the same shape. */
export const fileFacts = (entry: Partial<FileEntry>, timeZone: string): Fact[] => {
  const { kind, details } = entry;
  if (!kind || !details) return [];
  const lastDose = typeof details.lastDoseAt === 'string' ? details.lastDoseAt : null;
  return factsFrom([
    [dateLabels[kind], entry.on && formatDate(entry.on)],
    [kindLabel(kind), fileEntryWords({ kind, details })],
    ['Last dose', lastDose && formatInstant(lastDose, timeZone)],
    ['Note', entry.note],
  ]);
};
