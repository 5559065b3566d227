/** Something a form asks about a typed value (rules 0.6 and 0.7). It never stops anyone from typing. */
export interface FormQuestion {
  /** Names the matter and the value, so that another value is asked about anew. */
  key: string;
  /** The form's path of the field it points at. */
  field: string;
  text: string;
  note?: string;
  /** The likely answer, put into the field when it is chosen. */
  fix?: { label: string; value: string };
  /** False where the value is refused anyway and only another value helps. */
  mayStand: boolean;
}

export const openQuestions = (questions: readonly FormQuestion[], answered: readonly string[]): FormQuestion[] =>
  questions.filter((question) => !answered.includes(question.key));

export const countWords = (open: number): string => (open === 1 ? '1 question open' : `${open} questions open`);

export const isDefined = (question: FormQuestion | null): question is FormQuestion => question !== null;
