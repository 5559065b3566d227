import { isDefined, type FormQuestion } from '../forms/form-question';
import {
  changeQuestion,
  heightQuestion,
  plausibleQuestion,
  typed,
  weightQuestion,
  type Earlier,
} from '../forms/number-questions';
import { measureOfForm, type ResultForm } from './result-form';

export interface ResultEarlier {
  heightCm: Earlier | null;
  weightKg: Earlier | null;
  /** The last result of the chosen measure. */
  value: Earlier | null;
}

/** What the form asks about: the value, then the body size where the measure uses it. */
export const resultQuestions = (form: ResultForm, earlier: ResultEarlier): FormQuestion[] => {
  const measure = measureOfForm(form);
  if (!measure) return [];
  const body = measure.referenceKind
    ? [heightQuestion(form.heightCm, earlier.heightCm), weightQuestion(form.weightKg, earlier.weightKg)]
    : [];
  return [
    plausibleQuestion(measure.id, form.value, 'value', measure.shortLabel) ??
      changeQuestion(measure.id, typed(form.value), earlier.value, 'value', measure.shortLabel),
    ...body,
  ].filter(isDefined);
};
