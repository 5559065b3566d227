import { roundHalfAway } from '../format';
import { inchesToCm } from '../units';

/** Standing heights accepted (rule 0.6, set by this product). */
export const heightLimitsCm = { min: 120, max: 220 } as const;

export interface HeightQuestion {
  looksLike: 'inches' | 'meters';
  suggestionCm: number;
  question: string;
}

/** Names the likely unit of a number that is no height in cm (rule 0.6); it is asked about, never converted silently. */
export function questionHeight(height: number): HeightQuestion | null {
  if (height >= 48 && height <= 84) return question(height, 'inches', inchesToCm(height));
  if (height >= 1.2 && height <= 2.2) return question(height, 'meters', height * 100);
  return null;
}

function question(height: number, looksLike: 'inches' | 'meters', cm: number): HeightQuestion {
  const suggestionCm = roundHalfAway(cm, 1);
  return {
    looksLike,
    suggestionCm,
    question: `${height} cm. Did you mean ${height} ${looksLike} (${suggestionCm.toFixed(1)} cm)?`,
  };
}
