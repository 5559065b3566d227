import type { VoidBody, Voided } from '@slighthill/shared/contracts/common';

export const voidReasonLabels: Record<VoidBody['reason'], string> = {
  'wrong-patient': 'Wrong patient',
  'wrong-test': 'Wrong test',
  duplicate: 'Duplicate',
  other: 'Other',
};

/** Why an entry was voided: "Wrong patient, belongs to Ruth Valdane". */
export const voidWords = (voided: NonNullable<Voided>): string =>
  [voidReasonLabels[voided.reason], voided.text].filter(Boolean).join(', ');
