import express, { type Express } from 'express';
import helmet from 'helmet';
import path from 'node:path';
import { pino, type Logger } from 'pino';
import { createSessions, type Sessions } from './auth/session';
import { AppError } from './errors/app-error';
import type { Route } from './http/define-route';
import { errorHandler } from './http/error-handler';
import { mountRoutes } from './http/mount-routes';
import { openApiDocument } from './http/openapi';
import { originCheck } from './http/origin-check';
import { createRateLimits } from './http/rate-limits';
import { requestLog } from './http/request-log';
import { allRoutes } from './routes/all-routes';
import type { Clock } from './services/command-context';

export interface AppOptions {
  clock: Clock;
  logger?: Logger;
  webDist?: string | undefined;
  publicOrigin?: string | undefined;
  trustProxy?: number;
  checkResponses?: boolean;
  /** Routes beside the product's own, for measurements and tests of the machinery. */
  extraRoutes?: readonly Route[];
}

export interface App {
  express: Express;
  sessions: Sessions;
}

/** Puts the server together; the order of the middleware is the order of this function. */
export function createApp(options: AppOptions): App {
  const logger = options.logger ?? pino({ level: 'silent' });
  const isPublic = options.publicOrigin !== undefined;
  const sessions = createSessions({ secureCookies: isPublic });
  const routes = [...allRoutes({ sessions, clock: options.clock }), ...(options.extraRoutes ?? [])];
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', options.trustProxy ?? 0);
  app.set('etag', false);
  app.use(requestLog(logger));
  app.use(helmet(helmetOptions(isPublic)));
  app.use('/api', originCheck(options.publicOrigin));
  app.use('/api', express.json({ limit: '200kb', strict: true }));
  mountRoutes(app, routes, {
    sessions,
    clock: options.clock,
    limits: createRateLimits(),
    checkResponses: options.checkResponses ?? false,
  });
  serveDescription(app, () => openApiDocument(routes));
  app.use('/api', () => {
    throw new AppError('not-found', 'There is nothing at this address.');
  });
  if (options.webDist) serveWeb(app, options.webDist);
  app.use(errorHandler(logger));
  return { express: app, sessions };
}

function helmetOptions(isPublic: boolean): Parameters<typeof helmet>[0] {
  return {
    contentSecurityPolicy: {
      directives: {
        'default-src': ["'self'"],
        'script-src': ["'self'"],
        // dialogs lock scrolling by a style element of their own
        'style-src': ["'self'", "'unsafe-inline'"],
        'font-src': ["'self'"],
        'img-src': ["'self'"],
        'connect-src': ["'self'"],
        'object-src': ["'none'"],
        'frame-ancestors': ["'none'"],
        'upgrade-insecure-requests': isPublic ? [] : null,
      },
    },
    strictTransportSecurity: isPublic ? undefined : false,
    referrerPolicy: { policy: 'no-referrer' },
  } as Parameters<typeof helmet>[0];
}

/** The description is made once, on the first request. */
function serveDescription(app: Express, make: () => object): void {
  let text: string | null = null;
  app.get('/api/openapi.json', (_request, response) => {
    response.locals.route = '/api/openapi.json';
    text ??= JSON.stringify(make());
    response.type('application/json').send(text);
  });
}

function serveWeb(app: Express, webDist: string): void {
  const root = path.resolve(webDist);
  app.use('/assets', express.static(path.join(root, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }));
  app.use(express.static(root, { index: false, maxAge: '1h' }));
  app.get('/{*path}', (_request, response) => {
    response.locals.route = 'page';
    response.set('Cache-Control', 'no-cache').sendFile(path.join(root, 'index.html'));
  });
}
