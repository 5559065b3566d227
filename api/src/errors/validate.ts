import type { InputError } from '@slighthill/shared/errors';
import type { z } from 'zod';
import { AppError } from './app-error';

/** Parses one part of a request; every problem is listed with the path of its field. */
export function validate<S extends z.ZodType>(
  schema: S,
  input: unknown,
  part: 'body' | 'query' | 'params',
): z.output<S> {
  const result = schema.safeParse(input);
  if (result.success) return result.data;
  if (part === 'params') throw new AppError('not-found', 'There is nothing at this address.');
  throw new AppError('invalid-input', 'Nothing was stored. Look at the fields named below.', inputErrors(result.error));
}

function inputErrors(error: z.ZodError): InputError[] {
  const found = error.issues.flatMap((issue) => flatten(issue, []));
  const seen = new Set<string>();
  return found.filter(({ path, message }) => {
    const key = `${path}\n${message}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}

function flatten(issue: z.core.$ZodIssue, prefix: PropertyKey[]): InputError[] {
  const path = [...prefix, ...issue.path];
  if (issue.code === 'unrecognized_keys')
    return issue.keys.map((key) => ({ path: [...path, key].join('.'), message: 'This field is not known here' }));
  if (issue.code === 'invalid_union') {
    const closest = closestBranch(issue.errors);
    if (closest) return closest.flatMap((inner) => flatten(inner, path));
  }
  return [{ path: path.map(String).join('.'), message: readable(issue) }];
}

/** Of a union's branches the one the reader most likely meant: the one with the fewest unknown keys, then problems. */
function closestBranch(branches: z.core.$ZodIssue[][]): z.core.$ZodIssue[] | undefined {
  const weight = (issues: z.core.$ZodIssue[]) =>
    issues.reduce((sum, issue) => sum + (issue.code === 'unrecognized_keys' ? 10 * issue.keys.length : 1), 0);
  return [...branches].sort((a, b) => weight(a) - weight(b))[0];
}

function readable(issue: z.core.$ZodIssue): string {
  if (issue.code === 'invalid_type' && issue.message.startsWith('Invalid input')) {
    if (issue.input === undefined) return 'This field is missing';
    return `Expected ${issue.expected === 'int' ? 'a whole number' : `a ${issue.expected}`}`;
  }
  return issue.message;
}
