import { getMeasure, isMeasureId } from '@slighthill/shared/measures';
import type { Measurement } from '../models/measurement';

export interface FlagRule {
  id: string;
  label: string;
  severity: 'safety' | 'attention';
  /** Where the threshold comes from. */
  source: string;
  /** What to say when the measurement raises the flag, else null. */
  detail(measurement: Pick<Measurement, 'measure' | 'safetyAnswer'>): string | null;
}

/** The one list of flag rules over measurements. Adding a rule is adding an entry. */
export const flagRules: readonly FlagRule[] = [
  {
    id: 'safety-answer',
    label: 'PHQ-9 ninth answer',
    severity: 'safety',
    source: 'A positive or missing ninth answer is a safety matter at any total (common practice with the PHQ-9)',
    detail({ measure, safetyAnswer }) {
      const item = isMeasureId(measure) ? getMeasure(measure).safetyItem : null;
      if (!item || safetyAnswer === null) return null;
      if (safetyAnswer === 'not-answered') return 'The ninth answer is missing. Ask today, or escalate.';
      if (Number(safetyAnswer) < item.positiveFrom) return null;
      return `The ninth answer is ${safetyAnswer} of 3. Same-day contact is needed.`;
    },
  },
];

export const flagRule = (id: string): FlagRule | undefined => flagRules.find((rule) => rule.id === id);
