import type { Patient } from '@slighthill/shared/contracts/patient';

/** Where a saved entry went, in words and as an address. */
export interface Saved {
  words: string;
  to: string;
}

export interface RecordDrawerProps {
  patient: Patient;
  onClose: () => void;
  onSaved: (saved: Saved) => void;
  /** The drawer closed with a draft, kept at this instant. */
  onKept?: (at: string) => void;
}
