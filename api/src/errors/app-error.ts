import { errorTable, problemType, type ErrorCode, type InputError, type Problem } from '@slighthill/shared/errors';

/** The one kind of error a reader is meant to see; anything else is a bug and answers as `internal`. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly errors: InputError[] | undefined;
  readonly retryAfterS: number | undefined;

  constructor(code: ErrorCode, detail: string, errors?: InputError[], retryAfterS?: number) {
    super(detail);
    this.code = code;
    this.errors = errors;
    this.retryAfterS = retryAfterS;
  }

  get status(): number {
    return errorTable[this.code].status;
  }

  toProblem(): Problem {
    const { status, title } = errorTable[this.code];
    const problem: Problem = { type: problemType(this.code), title, status, detail: this.message };
    return this.errors ? { ...problem, errors: this.errors } : problem;
  }
}

export const notFound = (what = 'This') =>
  new AppError('not-found', `${what} does not exist, or it is not yours to see.`);

export const staleVersion = () =>
  new AppError(
    'stale-version',
    'Someone else changed this since you opened it. Nothing was overwritten. Open it again to see the newest version.',
  );

export const invalidInput = (...errors: InputError[]) =>
  new AppError('invalid-input', 'Nothing was stored. Look at the fields named below.', errors);
