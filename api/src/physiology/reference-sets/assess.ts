import { snap } from '@slighthill/shared/format';
import { limitZ, zFromLms } from './lms';
import type { Predicted } from './types';

export interface Assessed {
  percentPredicted: number;
  /** Null where the set publishes no L, M, S. */
  z: number | null;
  /** For display only, where there is no z: from the distance between predicted and LLN (rule PV-4). */
  zApproximate: number | null;
  belowLln: boolean;
  aboveUln: boolean | null;
}

/**
 * Holds a measured value to its prediction (rule PV-1): percent predicted, z, and on which side of the limits of normal
 * it lies. A value equal to the LLN is not below it; z is snapped before it is compared (rule 0.2). Where the set gives
 * no z the value is compared with the LLN itself. Throws RangeError for a value that is not positive.
 * @example assess(1.8, { predicted: 3.1507, lln: 2.4138, uln: null, lms: null }).zApproximate // -3.015
 */
export function assess(value: number, { predicted, lln, uln, lms }: Predicted): Assessed {
  if (!(value > 0)) throw new RangeError(`value ${value} must be more than 0`);
  const percentPredicted = (100 * value) / predicted;
  if (lms) {
    const z = zFromLms(value, lms);
    return {
      percentPredicted,
      z,
      zApproximate: null,
      belowLln: snap(z) < -limitZ,
      aboveUln: snap(z) > limitZ,
    };
  }
  return {
    percentPredicted,
    z: null,
    zApproximate: (value - predicted) / ((predicted - lln) / limitZ),
    belowLln: snap(value) < snap(lln),
    aboveUln: uln === null ? null : snap(value) > snap(uln),
  };
}
