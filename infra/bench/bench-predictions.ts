import { referenceSets } from '@slighthill/api/physiology/reference-sets/index';
import { predict } from '@slighthill/api/physiology/reference-sets/predict';
import type { BenchRow } from './table';

const people = 20_000;

/** One person, one set: predicted value and limits of every measure of the set. */
export function benchPredictions(): BenchRow[] {
  return referenceSets.map((set) => {
    const run = () => {
      let sum = 0;
      for (let n = 0; n < people; n += 1) {
        const person = {
          sex: n % 2 ? ('male' as const) : ('female' as const),
          ageYears: 40 + (n % 380) / 10,
          heightCm: 150 + (n % 400) / 10,
          weightKg: 70,
          ...(set.groups ? { group: set.groups[n % set.groups.length] } : {}),
        };
        for (const measure of set.measures) {
          const found = predict(set, measure, person);
          if (found.computable) sum += found.predicted;
        }
      }
      return sum;
    };
    run();
    const startedAt = performance.now();
    if (!(run() > 0)) throw new Error(`${set.id} predicted nothing`);
    const us = ((performance.now() - startedAt) * 1000) / people;
    return {
      what: `predictions, ${set.id} (${set.measures.length} measures)`,
      measured: `${us.toFixed(2)} \u00b5s a person`,
      reference: `${Math.round(1e6 / us).toLocaleString('en-US')} a second`,
      ratio: null,
      aim: 'under 50 \u00b5s',
      met: us < 50,
    };
  });
}
