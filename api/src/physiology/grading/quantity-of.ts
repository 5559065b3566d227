import type { BandQuantity } from './types';

export interface Gradable {
  value: number;
  percentPredicted: number | null;
  z: number | null;
}

/** The number a rule looks at; null where there is none (no equation, or a set without z). */
export function quantityOf(quantity: BandQuantity, { value, percentPredicted, z }: Gradable): number | null {
  if (quantity === 'value') return value;
  return quantity === 'z' ? z : percentPredicted;
}
