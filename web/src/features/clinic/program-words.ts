import { sessionKinds, type SessionKind } from '@slighthill/shared/contracts/clinic';

export const kindLabels: Record<SessionKind, string> = {
  exercise: 'Exercise',
  education: 'Education',
  assessment: 'Assessment',
};

export const kindWords = (kinds: readonly SessionKind[]): string =>
  sessionKinds
    .filter((kind) => kinds.includes(kind))
    .map((kind) => kindLabels[kind])
    .join(', ');
