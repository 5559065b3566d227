import { useDebounced } from '../../../lib/use-debounced';
import { openQuestions, type FormQuestion } from './form-question';

/** Half-typed numbers are not asked about: a question shows once its value has stood for a moment. */
const settleMs = 400;

export const useSettledQuestions = (
  questions: readonly FormQuestion[],
  answered: readonly string[],
): FormQuestion[] => {
  const open = openQuestions(questions, answered);
  const settled = useDebounced(open.map(({ key }) => key).join('\n'), settleMs).split('\n');
  return open.filter(({ key }) => settled.includes(key));
};
