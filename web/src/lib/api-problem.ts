export interface ProblemField {
  path: string;
  message: string;
}

interface ProblemBody {
  type?: string;
  title?: string;
  status?: number;
  detail?: string;
  errors?: ProblemField[];
}

/** What the server said went wrong (RFC 9457), or what stopped the request from reaching it (status 0). */
export class ApiProblem extends Error {
  readonly status: number;
  readonly type: string;
  readonly title: string;
  readonly fields: ProblemField[];
  /** Seconds until another try is allowed, when the server names them. */
  readonly retryAfterS: number | null;

  constructor(status: number, body: ProblemBody, retryAfterS: number | null = null) {
    const title = body.title ?? 'The server could not do this';
    super(body.detail ?? title);
    this.name = 'ApiProblem';
    this.status = status;
    this.type = body.type ?? 'about:blank';
    this.title = title;
    this.fields = body.errors ?? [];
    this.retryAfterS = retryAfterS;
  }

  get isUnreachable(): boolean {
    return this.status === 0;
  }

  get isSignedOut(): boolean {
    return this.status === 401;
  }
}

export const unreachable = (): ApiProblem =>
  new ApiProblem(0, {
    title: 'Could not reach the server',
    detail: 'Could not reach the server. Nothing was lost.',
  });

/** A sentence for the reader, whatever was thrown. */
export const describeProblem = (error: unknown): string => {
  if (error instanceof ApiProblem) return error.message;
  return 'Something went wrong on this page. Nothing was lost.';
};
