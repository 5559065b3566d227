/**
 * Body mass index in kg/m² (rule OM-4), unrounded. Weight in kg and height in cm above 0; throws RangeError otherwise.
 * @example bodyMassIndex(78, 172) // 26.3656
 */
export function bodyMassIndex(weightKg: number, heightCm: number): number {
  if (!(weightKg > 0) || !(heightCm > 0)) throw new RangeError('weightKg and heightCm must be more than 0');
  return weightKg / (heightCm / 100) ** 2;
}
