import type { InputError } from '@slighthill/shared/errors';
import type { z } from 'zod';
import { AppError } from './app-error';

/** What zod says where neither the schema nor the contracts have words for a problem. */
const noWords = 'Invalid input';
const unknownField = 'This field is not known here';

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
  const errors = result.success ? unstorable : inputErrors(result.error, part === 'query' ? repeatedFields(input) : []);
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

/** Fields of an address that stand in it more than once; the framework hands them on as a list. */
function repeatedFields(query: unknown): string[] {
  return Object.entries(query ?? {}).flatMap(([key, value]) => (Array.isArray(value) ? [key] : []));
}

function inputErrors(error: z.ZodError, repeated: readonly string[]): InputError[] {
  const found = error.issues
    .flatMap((issue) => flatten(issue, []))
    .map((problem) =>
      repeated.includes(problem.path) && problem.message !== unknownField
        ? { ...problem, message: 'Must be given once' }
        : problem,
    );
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
    return issue.keys.map((key) => ({ path: [...path, key].join('.'), message: unknownField }));
  if (issue.code === 'invalid_union' && issue.message === noWords) {
    const closest = closestBranch(issue.errors);
    if (closest) return closest.flatMap((inner) => flatten(inner, path));
  }
  return [{ path: path.map(String).join('.'), message: readable(issue, path) }];
}

/** Of a union's branches the one the reader most likely meant: the one with the fewest unknown keys, then problems. */
function closestBranch(branches: z.core.$ZodIssue[][]): z.core.$ZodIssue[] | undefined {
  const weight = (issues: z.core.$ZodIssue[]) =>
    issues.reduce((sum, issue) => sum + (issue.code === 'unrecognized_keys' ? 10 * issue.keys.length : 1), 0);
  return [...branches].sort((a, b) => weight(a) - weight(b))[0];
}

function readable(issue: z.core.$ZodIssue, path: PropertyKey[]): string {
  return path.length === 0 && issue.code === 'invalid_type' ? 'Send one object with named fields' : issue.message;
}
