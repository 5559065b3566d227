import { snap } from '@slighthill/shared/format';

function checkVolumes(...volumesMl: number[]): void {
  for (const volume of volumesMl) if (!(volume > 0)) throw new RangeError(`volume ${volume} mL must be more than 0`);
}

/**
 * Bronchodilator response by the 2005 rule (GR-9; Pellegrino 2005, ERJ 26:948) for FEV1 or FVC in whole mL: a rise of
 * 12 percent of the earlier value and 200 mL. Sources print both "at least" and "more than"; the default is at least,
 * `strict` asks for more than. Throws RangeError for volumes that are not positive.
 * @example respondsBy2005(1500, 1700) // true
 */
export function respondsBy2005(beforeMl: number, afterMl: number, options: { strict?: boolean } = {}): boolean {
  checkVolumes(beforeMl, afterMl);
  const change = afterMl - beforeMl;
  return options.strict ? 100 * change > 12 * beforeMl && change > 200 : 100 * change >= 12 * beforeMl && change >= 200;
}

export interface Response2021 {
  percentOfPredicted: number;
  responds: boolean;
}

/**
 * Bronchodilator response by the 2021 rule (GR-10; Stanojevic 2022, ERJ 60:2101499), the default: the change as percent
 * of the predicted value, a response when it is more than 10. Volumes in mL; throws RangeError for volumes that are not
 * positive.
 * @example responseBy2021(2000, 2300, 3000) // { percentOfPredicted: 10, responds: false }
 */
export function responseBy2021(beforeMl: number, afterMl: number, predictedMl: number): Response2021 {
  checkVolumes(beforeMl, afterMl, predictedMl);
  const percentOfPredicted = (100 * (afterMl - beforeMl)) / predictedMl;
  return { percentOfPredicted, responds: snap(percentOfPredicted) > 10 };
}
