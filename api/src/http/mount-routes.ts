import type { Express, Request, RequestHandler, Response } from 'express';
import { AuditTrail, writeAuditEvent } from '../audit/audit-trail';
import type { Sessions } from '../auth/session';
import { AppError } from '../errors/app-error';
import type { Clock } from '../services/command-context';
import { Reply, type Route } from './define-route';
import { RequestContext } from './request-context';
import { validate } from '../errors/validate';

export interface MountOptions {
  sessions: Sessions;
  clock: Clock;
  limits: Record<string, RequestHandler>;
  /** Checks every answer against its contract; on in development and tests. */
  checkResponses: boolean;
}

export function mountRoutes(app: Express, routes: readonly Route[], options: MountOptions): void {
  for (const route of routes) {
    const limits = route.limits.map((name) => {
      const limit = options.limits[name];
      if (!limit) throw new Error(`${route.path} names an unknown rate limit: ${name}`);
      return limit;
    });
    const named: RequestHandler = (_request, response, next) => {
      response.locals.route = route.path;
      next();
    };
    app[route.method](route.path, named, ...limits, async (request, response) => {
      await serve(route, options, request, response);
    });
  }
}

async function serve(route: Route, options: MountOptions, request: Request, response: Response): Promise<void> {
  response.set('Cache-Control', 'no-store');
  const context = route.access === 'public' ? null : await signIn(route, options, request, response);
  try {
    if (context && route.access !== 'signed-in' && route.access !== 'public') context.authorize(route.access);
    const { contract } = route;
    const input = {
      params: contract.params ? validate(contract.params, request.params, 'params') : undefined,
      query: contract.query ? validate(contract.query, request.query, 'query') : undefined,
      body: contract.body ? validate(contract.body, request.body ?? {}, 'body') : undefined,
      request,
      ...(context ? { context } : {}),
    };
    const answer = await route.handle(input as never);
    if (context?.audit.isDue) await context.audit.write();
    if (context && route.path.includes('/:') && !context.rowAuthorized)
      throw new Error(`${route.method} ${route.path} answered without authorizing its row`);
    send(route, options, response, answer);
  } catch (error) {
    if (context && error instanceof AppError && error.code === 'forbidden') {
      await recordRefusal(context, route, request, options.clock.now());
    }
    throw error;
  }
}

async function signIn(route: Route, options: MountOptions, request: Request, response: Response) {
  const now = options.clock.now();
  const session = await options.sessions.read(request.headers.cookie, now, request.get('x-background') !== '1');
  if (session.state !== 'signed-in') {
    response.appendHeader('Set-Cookie', options.sessions.blankCookie());
    if (session.state === 'idle')
      throw new AppError('session-idle', 'You were signed out after 15 minutes without activity. Nothing was lost.');
    throw new AppError('not-signed-in', 'Sign in to go on.');
  }
  if (session.cookieToRefresh) response.appendHeader('Set-Cookie', session.cookieToRefresh);
  response.locals.sessionToken = session.token;
  response.locals.email = session.email;
  const audit = new AuditTrail(session.actor, route.audit, request.ip ?? null, () => options.clock.now());
  return new RequestContext(session.actor, options.clock, audit);
}

async function recordRefusal(context: RequestContext, route: Route, request: Request, at: Date): Promise<void> {
  await writeAuditEvent(
    {
      clinicId: context.actor.clinicId,
      actorId: context.actor.userId,
      actorName: context.actor.displayName,
      action: route.audit,
      outcome: 'refused',
      address: request.ip ?? null,
    },
    at,
  );
}

function send(route: Route, options: MountOptions, response: Response, answer: unknown): void {
  const reply = answer instanceof Reply ? answer : new Reply(route.contract.status ?? 200, answer);
  for (const [name, value] of Object.entries(reply.headers)) response.appendHeader(name, value);
  if (route.contract.response === null) {
    response.status(204).end();
    return;
  }
  if (options.checkResponses) {
    const checked = route.contract.response.safeParse(reply.body);
    if (!checked.success)
      throw new Error(`${route.method} ${route.path} broke its contract: ${JSON.stringify(checked.error.issues)}`);
  }
  response.status(reply.status).json(reply.body);
}
