/** Probability that |T| stays under `t`, for whole degrees of freedom (Abramowitz and Stegun 26.7.3 and 26.7.4). */
function centralProbability(t: number, degrees: number): number {
  const angle = Math.atan(t / Math.sqrt(degrees));
  const cos = Math.cos(angle);
  const odd = degrees % 2 === 1;
  let term = odd ? cos : 1;
  let sum = degrees === 1 ? 0 : term;
  for (let k = odd ? 3 : 2; k < degrees; k += 2) {
    term *= ((k - 1) / k) * cos * cos;
    sum += term;
  }
  return odd ? (2 / Math.PI) * (angle + Math.sin(angle) * sum) : Math.sin(angle) * sum;
}

const known = new Map<number, number>();

/**
 * Student's t that leaves 2.5 percent above it, for a two-sided 95 percent interval (rule TR-5). Whole degrees of
 * freedom from 1; throws RangeError otherwise.
 * @example studentT975(1) // 12.7062
 */
export function studentT975(degrees: number): number {
  if (!Number.isInteger(degrees) || degrees < 1)
    throw new RangeError(`degrees ${degrees} must be a whole number from 1`);
  const found = known.get(degrees);
  if (found !== undefined) return found;
  let [low, high] = [1.9, 13];
  for (let step = 0; step < 60; step += 1) {
    const middle = (low + high) / 2;
    if (centralProbability(middle, degrees) < 0.95) low = middle;
    else high = middle;
  }
  known.set(degrees, high);
  return high;
}
