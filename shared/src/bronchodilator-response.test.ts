import { describe, expect, it } from 'vitest';
import { bronchodilatorResponse, isResponseBy2005 } from './bronchodilator-response';

// Rules GR-9 (Pellegrino 2005) and GR-10 (Stanojevic 2022), example table: before, after and predicted in mL.
const examples: [number, number, number, boolean, number, boolean][] = [
  [2000, 2400, 3200, true, 12.5, true],
  [1200, 1360, 2900, false, 5.52, false],
  [800, 980, 2600, false, 6.92, false],
  [1500, 1700, 2000, true, 10, false],
  [1500, 1680, 3000, false, 6, false],
  [2000, 2300, 3000, true, 10, false],
];

describe('bronchodilator response', () => {
  it.each(examples)('%d to %d mL, predicted %d mL', (before, after, predicted, by2005, percent, by2021) => {
    expect(isResponseBy2005(before, after)).toBe(by2005);
    const found = bronchodilatorResponse(before, after, predicted);
    expect(found?.percent).toBeCloseTo(percent, 2);
    expect(found?.isResponse).toBe(by2021);
    expect(bronchodilatorResponse(before / 1000, after / 1000, predicted / 1000)).toEqual(found);
  });

  it('says nothing without a pair of volumes and a predicted value', () => {
    expect(bronchodilatorResponse(1, null, 3)).toBeNull();
    expect(bronchodilatorResponse(null, 2, 3)).toBeNull();
    expect(bronchodilatorResponse(1, 2, null)).toBeNull();
    expect(bronchodilatorResponse(1, 2, 0)).toBeNull();
    expect(isResponseBy2005(1500, null)).toBeNull();
    expect(isResponseBy2005(0, 100)).toBeNull();
  });
});
