import { ApiProblem, describeProblem } from '../../../lib/api-problem';
import type { FormIssue } from './form-issues';

export interface SaveProblem {
  words: string;
  issues: FormIssue[];
}

const isType = (error: ApiProblem, code: string): boolean => error.type.endsWith(`/${code}`);

/** What a failed save means for the person who typed: always that nothing typed was lost, and what to do. */
export const saveProblem = (
  error: unknown,
  toFormPath: (path: string) => string | null,
  kept = 'numbers',
): SaveProblem => {
  const lead = `Not saved. Your ${kept} are here.`;
  if (!(error instanceof ApiProblem)) return { words: `${lead} ${describeProblem(error)}`, issues: [] };
  if (error.isSignedOut) return { words: `${lead} Continue with your password, then save again.`, issues: [] };
  if (error.isUnreachable) return { words: `${lead} The server could not be reached. Try again.`, issues: [] };
  if (isType(error, 'id-taken'))
    return {
      words: `An earlier try was saved with other values. Your ${kept} are here. Look in the record and amend it there.`,
      issues: [],
    };
  const issues: FormIssue[] = [];
  const rest: string[] = [];
  for (const { path, message } of error.fields) {
    const field = toFormPath(path);
    if (field === null) rest.push(message);
    else issues.push({ path: field, message });
  }
  const told = issues.length > 0 ? [...rest, 'See the marked fields.'] : rest.length > 0 ? rest : [error.message];
  return { words: [lead, ...told].join(' '), issues };
};

export const isStale = (error: unknown): boolean => error instanceof ApiProblem && isType(error, 'stale-version');

/** A lost connection or a fault of the server passes by itself; any other answer wants something changed first. */
export const mayWorkAgain = (error: unknown): boolean =>
  !(error instanceof ApiProblem) || error.isUnreachable || error.status >= 500 || error.status === 429;
