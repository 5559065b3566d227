import type { InputError } from '@slighthill/shared/errors';
import type { z } from 'zod';
import { AppError } from './app-error';

/** Parses one part of a request; every problem is listed with the path of its field. */
export function validate<S extends z.ZodType>(
  schema: S,
  input: unknown,
  part: 'body' | 'query' | 'params',
): z.output<S> {
  const unstorable = unstorableParts(input, '');
  const result = schema.safeParse(input);
  if (result.success && unstorable.length === 0) return result.data;
  if (part === 'params') throw new AppError('not-found', 'There is nothing at this address.');
  const errors = result.success ? unstorable : inputErrors(result.error);
  throw new AppError('invalid-input', 'Nothing was stored. Look at the fields named below.', errors);
}

/** The one character PostgreSQL cannot keep in a text; refused here, so that it is neither a fault nor dropped. */
function unstorableParts(input: unknown, path: string): InputError[] {
  if (typeof input === 'string')
    return input.includes('\0') ? [{ path, message: 'This holds a character that cannot be stored' }] : [];
  if (typeof input !== 'object' || input === null) return [];
  return Object.entries(input).flatMap(([key, value]) => {
    const inner = path === '' ? key : `${path}.${key}`;
    return [...unstorableParts(key, path), ...unstorableParts(value, inner)];
  });
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
