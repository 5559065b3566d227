import { set, type FieldErrors, type FieldValues, type Resolver } from 'react-hook-form';
import type { z } from 'zod';

/** One message at one field of a form; `path` is the form's own, dotted. */
export interface FormIssue {
  path: string;
  message: string;
}

const asksFor = (label: string): string => (/^[A-Z0-9]{2}/.test(label) ? label : `the ${label.toLowerCase()}`);

/** "Height must be a number" said of an empty field becomes "Enter the height". */
export const missingMessage = (message: string): string => {
  const label = /^(?:The )?(.+) must be a number$/.exec(message)?.[1];
  return label ? `Enter ${asksFor(label)}` : message;
};

/** The schema's complaints about a request, moved to the fields the request was made from. */
export const issuesOf = (
  result: { success: true } | { success: false; error: z.ZodError },
  toFormPath: (path: readonly PropertyKey[]) => string,
  isEmpty: (formPath: string) => boolean,
): FormIssue[] => {
  if (result.success) return [];
  return result.error.issues.map((issue) => {
    const path = toFormPath(issue.path);
    return { path, message: isEmpty(path) ? missingMessage(issue.message) : issue.message };
  });
};

/** Lets React Hook Form ask a pure function; the first message at a field is the one shown. */
export const resolverFor =
  <Form extends FieldValues>(check: (form: Form) => readonly FormIssue[]): Resolver<Form> =>
  (values) => {
    const issues = check(values);
    if (issues.length === 0) return { values, errors: {} };
    const errors: FieldErrors<Form> = {};
    for (const issue of [...issues].reverse()) set(errors, issue.path, { type: 'schema', message: issue.message });
    return { values: {}, errors };
  };
