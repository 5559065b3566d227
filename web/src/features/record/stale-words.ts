import { ApiProblem } from '../../lib/api-problem';

/** A stale version overwrites nothing: the form keeps what was typed and says so; null for any other problem. */
export const staleWords = (error: unknown): string | null =>
  error instanceof ApiProblem && error.type.endsWith('/stale-version')
    ? 'Not saved: someone changed this since you opened it. What you typed is here. Close and open it to see the change.'
    : null;
