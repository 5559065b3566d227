/**
 * FEV1Q (rule GR-13; ERS/ATS 2021): FEV1 in L over 0.5 for men and 0.4 for women. Adults. Higher is better, near 1 is
 * high risk. FEV1 above 0; throws RangeError otherwise.
 * @example fev1q('female', 0.9) // 2.25
 */
export function fev1q(sex: 'male' | 'female', fev1L: number): number {
  if (!(fev1L > 0)) throw new RangeError(`fev1L ${fev1L} must be more than 0`);
  return fev1L / (sex === 'male' ? 0.5 : 0.4);
}
