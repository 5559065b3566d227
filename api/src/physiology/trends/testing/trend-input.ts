import type { MeasureId } from '@slighthill/shared/measures';
import type { TrendEnrollment, TrendInput, TrendMeasurement, TrendOptions } from '../types';

let serial = 0;

/** Ids as the database makes them, so that responses can be held to the contract. */
export const uuidOf = (n: number): string => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;

/** One result at noon UTC of a day; a time may follow the date as in `2026-03-01T15:00`. */
export function result(
  measure: MeasureId,
  when: string,
  value: number,
  more: Partial<TrendMeasurement> = {},
): TrendMeasurement {
  serial += 1;
  const [takenOn = when, time = '12:00'] = when.split('T');
  const spirometry = measure === 'fev1' || measure === 'fvc' || measure === 'fev1fvc';
  return {
    id: uuidOf(serial),
    measure,
    takenAt: `${takenOn}T${time}:00.000Z`,
    takenOn,
    value,
    state: spirometry ? 'after' : null,
    conditions: {},
    quality: null,
    heightCm: 174.5,
    heightMethod: 'measured',
    heightCarried: false,
    weightKg: 80,
    sourceKind: spirometry ? 'spirometry-test' : 'measurement',
    sourceId: uuidOf(serial),
    ...more,
  };
}

/** The three results of one spirometry test. */
export function spirometry(
  when: string,
  fev1: number,
  fvc: number,
  more: Partial<TrendMeasurement> = {},
): TrendMeasurement[] {
  const test = { sourceId: uuidOf(500_000 + serial), ...more };
  return [result('fev1', when, fev1, test), result('fvc', when, fvc, test), result('fev1fvc', when, fev1 / fvc, test)];
}

export const enrollment = (more: Partial<TrendEnrollment> = {}): TrendEnrollment => ({
  id: uuidOf(900_001),
  status: 'active',
  startOn: '2026-01-10',
  firstExerciseOn: null,
  lastSessionOn: null,
  endOn: null,
  ...more,
});

export function trendInput(
  measurements: readonly TrendMeasurement[],
  options: Partial<TrendOptions> & { measures: readonly MeasureId[] },
  more: Partial<Omit<TrendInput, 'measurements' | 'options'>> = {},
): TrendInput {
  return {
    person: {
      birthDate: '1958-03-14',
      sexForPrediction: 'male',
      diagnosisGroup: 'copd',
      diagnosisConfirmed: true,
    },
    measurements: measurements.toSorted((a, b) => (a.takenAt < b.takenAt ? -1 : a.takenAt > b.takenAt ? 1 : 0)),
    enrollments: [],
    exacerbationOnsets: [],
    clinic: {
      ratioRule: 'fixed-ratio',
      fev1SeverityRule: 'ats-ers-2005',
      tlcSeverityRule: 'tlc-percent',
      tlcWindowDays: 180,
    },
    options,
    ...more,
  };
}
