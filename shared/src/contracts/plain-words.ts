import type { z } from 'zod';

type RawIssue = z.core.$ZodRawIssue;

const kinds: Record<string, string> = {
  number: 'a number',
  int: 'a whole number',
  boolean: 'yes or no',
  string: 'text',
  array: 'a list',
  date: 'a date',
};

function wrongType(issue: Extract<RawIssue, { code: 'invalid_type' }>): string {
  if (issue.input === undefined) return 'This field is missing';
  if (issue.expected === 'number' && typeof issue.input === 'number') return 'Must be a number';
  return `Must be ${kinds[issue.expected] ?? 'an object with named fields'}`;
}

const plural = (count: number | bigint, one: string): string => `${count} ${count === 1 ? one : `${one}s`}`;

function tooBig({ origin, maximum, inclusive }: Extract<RawIssue, { code: 'too_big' }>): string {
  if (origin === 'string') return `Use at most ${plural(maximum, 'character')}`;
  if (origin === 'array' || origin === 'set') return `Give at most ${maximum}`;
  return inclusive === false ? `Must be less than ${maximum}` : `Must be ${maximum} or less`;
}

function tooSmall({ origin, minimum, inclusive }: Extract<RawIssue, { code: 'too_small' }>): string {
  if (origin === 'string') return minimum === 1 ? 'This field is missing' : `Use at least ${minimum} characters`;
  if (origin === 'array' || origin === 'set') return `Give at least ${minimum}`;
  return inclusive === false ? `Must be more than ${minimum}` : `Must be ${minimum} or more`;
}

/** The reader's words for a problem whose schema has none of its own. */
export function plainWords(issue: RawIssue): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      return wrongType(issue);
    case 'too_big':
      return tooBig(issue);
    case 'too_small':
      return tooSmall(issue);
    case 'invalid_value':
      return `Must be ${issue.values.length === 1 ? '' : 'one of '}${issue.values.map(String).join(', ')}`;
    case 'invalid_format':
      return issue.format === 'date' ? 'Enter a date as YYYY-MM-DD' : 'This is not written as expected';
    default:
      return undefined;
  }
}
