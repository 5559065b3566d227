import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { ApiProblem, describeProblem } from './api-problem';

/**
 * Puts the server's messages at their fields. What belongs to no field of this form comes back as one sentence for
 * its foot; null when every message found its place.
 */
export const applyProblem = <Values extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Values>,
  fields: readonly FieldPath<Values>[],
): string | null => {
  if (!(error instanceof ApiProblem)) return describeProblem(error);
  if (error.isSignedOut) return 'Not saved: your sign-in had ended. What you typed is here; save it again.';
  if (error.isUnreachable) return 'Not saved: the server could not be reached. What you typed is here. Try again.';
  const rest: string[] = [];
  let placed = false;
  for (const { path, message } of error.fields) {
    const field = fields.find((name) => path === name || path.startsWith(`${name}.`));
    if (!field) {
      rest.push(message);
      continue;
    }
    setError(field, { type: 'server', message }, { shouldFocus: !placed });
    placed = true;
  }
  if (rest.length > 0) return `Not saved. ${rest.join('. ')}`;
  return placed ? null : `Not saved. ${error.message}`;
};
