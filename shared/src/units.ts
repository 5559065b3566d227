/** Exact by the international definition; not rounded. */
export const inchesToCm = (inches: number): number => inches * 2.54;
