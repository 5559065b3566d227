import type { Band, BandQuantity, GradingRule } from './types';

export type QuantifiedBand = Band & { quantity: BandQuantity };

const known = new Map<GradingRule, readonly QuantifiedBand[]>();

/** A rule's bands, each with the quantity its limits are in, as answers carry them. Range and order are the rule's own. */
export function bandsOf(rule: GradingRule): readonly QuantifiedBand[] {
  const found = known.get(rule);
  if (found) return found;
  const bands = rule.bands.map((band) => ({ ...band, quantity: rule.quantity }));
  known.set(rule, bands);
  return bands;
}
