import { ApiProblem, unreachable } from './api-problem';
import { sessionEnded } from './session-events';

type QueryValue = string | number | boolean | null | undefined;

export interface ApiRequest {
  method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  body?: unknown;
  query?: Record<string, QueryValue | readonly string[]>;
  signal?: AbortSignal | undefined;
  /** Sign-in itself answers 401 for a wrong password: that is not the end of a session. */
  expectSignedOut?: boolean;
}

const withQuery = (path: string, query: ApiRequest['query']): string => {
  if (!query) return path;
  const params = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value === undefined || value === null || value === '') continue;
    params.set(name, Array.isArray(value) ? value.join(',') : String(value));
  }
  const text = params.toString();
  return text === '' ? path : `${path}?${text}`;
};

const readProblem = async (response: Response): Promise<ApiProblem> => {
  const retryAfter = Number(response.headers.get('retry-after'));
  const retryAfterS = Number.isFinite(retryAfter) && retryAfter > 0 ? retryAfter : null;
  const type = response.headers.get('content-type') ?? '';
  if (!type.includes('json')) {
    // A proxy in front of an absent server answers in HTML or plain text.
    return response.status >= 502 ? unreachable() : new ApiProblem(response.status, {}, retryAfterS);
  }
  try {
    return new ApiProblem(response.status, (await response.json()) as Record<string, never>, retryAfterS);
  } catch {
    return new ApiProblem(response.status, {}, retryAfterS);
  }
};

const send = async (path: string, request: ApiRequest): Promise<Response> => {
  const hasBody = request.body !== undefined;
  try {
    return await fetch(withQuery(path, request.query), {
      method: request.method ?? 'GET',
      credentials: 'same-origin',
      headers: hasBody
        ? { accept: 'application/json', 'content-type': 'application/json' }
        : { accept: 'application/json' },
      ...(hasBody ? { body: JSON.stringify(request.body) } : {}),
      ...(request.signal ? { signal: request.signal } : {}),
    });
  } catch (error) {
    if (request.signal?.aborted) throw error;
    throw unreachable();
  }
};

/** JSON in, JSON out. Every failure is an `ApiProblem`. The caller names the contract's response type. */
export const apiFetch = async <Result = void>(path: string, request: ApiRequest = {}): Promise<Result> => {
  const response = await send(path, request);
  if (!response.ok) {
    const problem = await readProblem(response);
    if (problem.isSignedOut && request.expectSignedOut !== true) sessionEnded(problem.type);
    throw problem;
  }
  if (response.status === 204) return undefined as Result;
  return (await response.json()) as Result;
};
