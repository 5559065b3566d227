/** Every error the API answers with: one code, one status, one title in the reader's words. */
export const errorTable = {
  'bad-json': { status: 400, title: 'The request could not be read' },
  'bad-request': { status: 400, title: 'The request could not be read' },
  'not-signed-in': { status: 401, title: 'You are not signed in' },
  'session-idle': { status: 401, title: 'You were signed out after a time without activity' },
  'wrong-credentials': { status: 401, title: 'E-mail or password is not right' },
  forbidden: { status: 403, title: 'You may not do this' },
  'foreign-origin': { status: 403, title: 'This request came from another site' },
  'not-found': { status: 404, title: 'Not found' },
  'stale-version': { status: 409, title: 'Someone changed this since you opened it' },
  'id-taken': { status: 409, title: 'This id was used for something else' },
  'already-exists': { status: 409, title: 'This exists already' },
  'wrong-state': { status: 409, title: 'This cannot be done in its present state' },
  'body-too-large': { status: 413, title: 'This is too large to send' },
  'invalid-input': { status: 422, title: 'Some fields need another look' },
  'too-many-requests': { status: 429, title: 'Too many tries' },
  internal: { status: 500, title: 'Something went wrong on our side' },
  unavailable: { status: 503, title: 'The server is busy or restarting' },
} as const satisfies Record<string, { status: number; title: string }>;

export type ErrorCode = keyof typeof errorTable;

export interface InputError {
  path: string;
  message: string;
}

/** RFC 9457 problem details as this API writes them; `type` is `/problems/<code>`. */
export interface Problem {
  type: string;
  title: string;
  status: number;
  detail: string;
  errors?: InputError[];
}

export const problemType = (code: ErrorCode): string => `/problems/${code}`;
