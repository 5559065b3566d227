import { heightMethods } from '@slighthill/shared/contracts/common';
import { getMeasure, isMeasureId, measures, type Measure, type MeasureId } from '@slighthill/shared/measures';
import { z } from 'zod';

/** Every number as it was typed; `measure` is empty until one is chosen. */
export const resultForm = z.object({
  id: z.string(),
  measure: z.string(),
  takenAt: z.string(),
  value: z.string(),
  heightCm: z.string(),
  heightMethod: z.enum(heightMethods),
  weightKg: z.string(),
  /** By key of the registry's conditions; yes and no for what is true or false, empty for not stated. */
  conditions: z.record(z.string(), z.string()),
  item9: z.string(),
  note: z.string(),
  answered: z.array(z.string()),
  amendReason: z.string(),
});

export type ResultForm = z.infer<typeof resultForm>;

export const emptyResultForm = (takenAt: string, id: string): ResultForm => ({
  id,
  measure: '',
  takenAt,
  value: '',
  heightCm: '',
  heightMethod: 'measured',
  weightKg: '',
  conditions: {},
  item9: '',
  note: '',
  answered: [],
  amendReason: '',
});

/** Measures entered as one number; the others belong to a spirometry test or are worked out. */
export const enterableMeasures: readonly Measure[] = measures.filter((measure) => measure.entry === 'single');

export const measureOfForm = (form: Pick<ResultForm, 'measure'>): Measure | null =>
  isMeasureId(form.measure) ? getMeasure(form.measure) : null;

const write = (value: number | boolean | string | null): string => {
  if (value === null) return '';
  return typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value);
};

/** The registry's usual circumstances of a measure, as the form shows them. */
export const usualConditions = (id: MeasureId): Record<string, string> =>
  Object.fromEntries(
    Object.entries(getMeasure(id).conditions).map(([key, condition]) => [key, write(condition.default)]),
  );

export const writtenConditions = (
  id: MeasureId,
  stored: Record<string, number | boolean | string>,
): Record<string, string> =>
  Object.fromEntries(Object.keys(getMeasure(id).conditions).map((key) => [key, write(stored[key] ?? null)]));

/** One more result in the same sitting keeps when it was taken and the body size. */
export const nextResultForm = (saved: ResultForm, id: string): ResultForm => ({
  ...emptyResultForm(saved.takenAt, id),
  heightCm: saved.heightCm,
  heightMethod: saved.heightMethod,
  weightKg: saved.weightKg,
  answered: saved.answered.filter((key) => /^(heightCm|weightKg):/.test(key)),
});
