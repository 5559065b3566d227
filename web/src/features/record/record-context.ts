import { createContext, use, type ReactNode } from 'react';
import type { Patient } from '@slighthill/shared/contracts/patient';

interface RecordContextValue {
  patient: Patient;
  /** The Record button, for an empty section's one button; null where nothing may be recorded. */
  record: ReactNode;
}

export const RecordContext = createContext<RecordContextValue | null>(null);

/** The patient whose record is open. Only for sections of the record. */
export const useRecord = (): RecordContextValue => {
  const value = use(RecordContext);
  if (!value) throw new Error('useRecord is for sections of a record');
  return value;
};
