import { dateInWords, daysBetween } from '@slighthill/shared/calendar';
import { formatNumber, snap } from '@slighthill/shared/format';
import type { Measure } from '@slighthill/shared/measures';
import { conditionValue, valueWords } from './condition-words';
import type { TrendMeasurement } from './types';

const heightStepCm = 1.5;
const exacerbationDays = 28;

/** What does not block a comparison but must be said about it (rules TR-1 b, TR-7, 0.6). */
export function pairNotes(
  measure: Measure,
  baseline: TrendMeasurement,
  latest: TrendMeasurement,
  exacerbationOnsets: readonly string[],
): string[] {
  return [
    ...conditionNotes(measure, baseline, latest),
    ...(measure.referenceKind ? heightNotes(baseline, latest) : []),
    ...exacerbationNotes(baseline, latest, exacerbationOnsets),
    ...qualityNotes(measure, baseline, latest),
  ];
}

function conditionNotes(measure: Measure, baseline: TrendMeasurement, latest: TrendMeasurement): string[] {
  return Object.entries(measure.conditions).flatMap(([key, condition]) => {
    const [from, to] = [baseline, latest].map((result) => conditionValue(condition, key, result.conditions));
    if (condition.onDifference !== 'notes' || from === to) return [];
    return [
      `${condition.label}: ${valueWords(condition, from)} at baseline, ${valueWords(condition, to)} at the latest test.`,
    ];
  });
}

const methodWords: Record<string, string> = { stated: 'stated', 'arm-span': 'from arm span', measured: 'measured' };

function heightNotes(baseline: TrendMeasurement, latest: TrendMeasurement): string[] {
  const notes: string[] = [];
  if (baseline.heightCm !== null && latest.heightCm !== null) {
    const change = snap(latest.heightCm - baseline.heightCm);
    if (Math.abs(change) > heightStepCm) {
      const [from, to] = [baseline.heightCm, latest.heightCm].map((cm) => formatNumber(cm, 1));
      notes.push(`Height changed from ${from} to ${to} cm; percent predicted moves with it.`);
    }
  }
  const [from, to] = [baseline.heightMethod, latest.heightMethod];
  const estimated = [from, to].some((method) => method !== null && method !== 'measured');
  if (estimated && from !== null && to !== null) {
    const words =
      from === to
        ? `Height was ${methodWords[from] ?? from} at both tests`
        : `Height was ${methodWords[from] ?? from} at baseline and ${methodWords[to] ?? to} at the latest test`;
    notes.push(`${words}; percent predicted and z are shown and not compared.`);
  }
  return notes;
}

function exacerbationNotes(baseline: TrendMeasurement, latest: TrendMeasurement, onsets: readonly string[]): string[] {
  return onsets.flatMap((onset) =>
    [
      { result: baseline, name: 'baseline' },
      { result: latest, name: 'the latest test' },
    ]
      .filter(({ result }) => Math.abs(daysBetween(onset, result.takenOn)) <= exacerbationDays)
      .map(({ name }) => `Exacerbation of ${dateInWords(onset)} within 4 weeks of ${name}.`),
  );
}

function qualityNotes(measure: Measure, baseline: TrendMeasurement, latest: TrendMeasurement): string[] {
  if (!measure.hasQuality) return [];
  const low = [baseline, latest].filter(({ quality }) => quality === 'D' || quality === 'E');
  const notes = low.map(({ quality, takenOn }) => `Quality ${quality} on ${dateInWords(takenOn)}, compared as asked.`);
  if (baseline.quality === null || latest.quality === null) notes.push('Quality not graded.');
  return notes;
}
