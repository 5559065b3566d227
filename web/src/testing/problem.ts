import { errorTable, problemType, type ErrorCode, type InputError, type Problem } from '@slighthill/shared/errors';

/** A problem as the API writes it. */
export const problem = (code: ErrorCode, detail: string, errors?: InputError[]): Problem => ({
  type: problemType(code),
  title: errorTable[code].title,
  status: errorTable[code].status,
  detail,
  ...(errors ? { errors } : {}),
});
