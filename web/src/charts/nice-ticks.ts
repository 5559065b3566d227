import { snap } from '@slighthill/shared/format';

export interface NiceTicks {
  ticks: number[];
  /** Where the axis ends; above what was asked for when fewer than five ticks would fit. */
  to: number;
}

/** The steps 1, 2 and 5 of every power of ten, from a smallest one on. */
function* steps(smallest: number): Generator<number> {
  for (let power = Math.floor(Math.log10(smallest)) - 1; power < 12; power += 1) {
    for (const digit of [1, 2, 5]) {
      const step = snap(digit * 10 ** power);
      if (step >= smallest) yield step;
    }
  }
}

const maxTicks = 7;
const minTicks = 5;

/** Five to seven ticks in steps of 1, 2 or 5. `smallestStep` keeps whole-number scores on whole numbers. */
export const niceTicks = (from: number, to: number, smallestStep: number): NiceTicks => {
  for (const step of steps(smallestStep)) {
    const first = Math.ceil(snap(from / step));
    const last = Math.floor(snap(to / step));
    if (last - first + 1 > maxTicks) continue;
    const end = Math.max(last, first + minTicks - 1);
    const ticks = Array.from({ length: end - first + 1 }, (_, index) => snap((first + index) * step));
    return { ticks, to: Math.max(to, ticks.at(-1) ?? to) };
  }
  return { ticks: [from, to], to };
};
