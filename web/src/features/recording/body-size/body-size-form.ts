import { heightMethods } from '@slighthill/shared/contracts/common';
import { bodySizeCreate } from '@slighthill/shared/contracts/measurement';
import { getMeasure } from '@slighthill/shared/measures';
import { z } from 'zod';
import { fromLocalInput } from '../../../lib/clinic-time';
import { parseDecimal } from '../../../lib/parse-decimal';
import { issuesOf, type FormIssue } from '../forms/form-issues';
import { isDefined, type FormQuestion } from '../forms/form-question';
import { heightQuestion, typed, usableHeightCm, weightQuestion, type Earlier } from '../forms/number-questions';

export const bodySizeForm = z.object({
  id: z.string(),
  takenAt: z.string(),
  heightCm: z.string(),
  heightMethod: z.enum(heightMethods),
  weightKg: z.string(),
  note: z.string(),
  answered: z.array(z.string()),
  amendReason: z.string(),
});

export type BodySizeForm = z.infer<typeof bodySizeForm>;

export const emptyBodySizeForm = (takenAt: string, id: string): BodySizeForm => ({
  id,
  takenAt,
  heightCm: '',
  heightMethod: 'measured',
  weightKg: '',
  note: '',
  answered: [],
  amendReason: '',
});

export const bodySizeFields = ['takenAt', 'heightCm', 'heightMethod', 'weightKg', 'note'] as const;

export interface CheckedBodySize {
  issues: FormIssue[];
  body: z.infer<typeof bodySizeCreate> | null;
}

export const checkBodySize = (form: BodySizeForm, timeZone: string): CheckedBodySize => {
  const result = bodySizeCreate.safeParse({
    id: form.id,
    takenAt: fromLocalInput(form.takenAt, timeZone) ?? '',
    heightCm: parseDecimal(form.heightCm),
    heightMethod: form.heightMethod,
    weightKg: parseDecimal(form.weightKg),
    note: form.note,
  });
  const isEmpty = (path: string): boolean => form[path as keyof BodySizeForm] === '';
  const issues = issuesOf(result, (path) => path.map(String).join('.'), isEmpty);
  return { issues, body: result.success ? result.data : null };
};

export const bodySizeQuestions = (
  form: Pick<BodySizeForm, 'heightCm' | 'weightKg'>,
  earlier: { heightCm: Earlier | null; weightKg: Earlier | null },
): FormQuestion[] =>
  [heightQuestion(form.heightCm, earlier.heightCm), weightQuestion(form.weightKg, earlier.weightKg)].filter(isDefined);

/** Body mass index of what is typed, by the registry's own derivation (rule OM-4); an empty height is the last one. */
export const typedBmi = (
  form: Pick<BodySizeForm, 'heightCm' | 'weightKg'>,
  earlierHeight: Earlier | null,
): number | null => {
  const weight = typed(form.weightKg);
  const heightCm = form.heightCm.trim() === '' ? (earlierHeight?.value ?? null) : usableHeightCm(form.heightCm);
  const compute = getMeasure('bmi').derivedFrom?.compute;
  return weight === null || heightCm === null || !compute ? null : compute({ weight }, heightCm);
};
