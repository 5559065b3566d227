import type { Ability } from '@slighthill/shared/permissions';
import type { Request } from 'express';
import type { z } from 'zod';
import type { RequestContext } from './request-context';

export type Method = 'get' | 'post' | 'patch' | 'put' | 'delete';

type Schema = z.ZodType;
type Parsed<S> = S extends Schema ? z.output<S> : undefined;

export interface RouteContract {
  /** One line for the API description. */
  summary: string;
  params?: Schema;
  query?: Schema;
  body?: Schema;
  /** Schema of the JSON answer; null answers 204 without a body. */
  response: Schema | null;
  /** Status of a first success when it is not 200 (or 204). */
  status?: 201;
}

export interface PublicInput<C extends RouteContract> {
  params: Parsed<C['params']>;
  query: Parsed<C['query']>;
  body: Parsed<C['body']>;
  request: Request;
}

export interface SignedInInput<C extends RouteContract> extends PublicInput<C> {
  context: RequestContext;
}

/** Answers with another status or headers than the contract's first success. */
export class Reply<T> {
  readonly status: number;
  readonly body: T;
  readonly headers: Record<string, string>;

  constructor(status: number, body: T, headers: Record<string, string> = {}) {
    this.status = status;
    this.body = body;
    this.headers = headers;
  }
}

type Answer<C extends RouteContract> = C['response'] extends Schema ? z.input<C['response']> : void;
type Handled<C extends RouteContract> = Promise<Answer<C> | Reply<Answer<C>>>;

/**
 * Who may call: `public`, any `signed-in` person, or holders of an ability. `audit` names the action in the trail.
 */
export type Access = 'public' | 'signed-in' | Ability;

export interface Route {
  method: Method;
  path: string;
  contract: RouteContract;
  access: Access;
  audit: string;
  limits: readonly string[];
  handle(input: SignedInInput<RouteContract> | PublicInput<RouteContract>): Promise<unknown>;
}

interface Definition<C extends RouteContract, A extends Access> {
  method: Method;
  path: `/api/${string}`;
  contract: C;
  access: A;
  /** Names the action in the audit trail, e.g. `trend.read`. */
  audit: string;
  /** Names of rate limits that apply, see rate-limits. */
  limits?: readonly string[];
  handler: (input: A extends 'public' ? PublicInput<C> : SignedInInput<C>) => Handled<C>;
}

/** Declares a route; one without `access` does not type-check. */
export function defineRoute<const C extends RouteContract, const A extends Access>(
  definition: Definition<C, A>,
): Route {
  const { handler, limits = [], ...rest } = definition;
  return { ...rest, limits, handle: (input) => handler(input as never) };
}
