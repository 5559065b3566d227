import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';

/** Logs the route's pattern, never the address itself: addresses carry ids, search words and names. */
export function requestLog(logger: Logger): RequestHandler {
  return (request, response, next) => {
    const startedAt = process.hrtime.bigint();
    response.locals.requestId = randomUUID();
    response.on('finish', () => {
      logger.info({
        requestId: response.locals.requestId as string,
        method: request.method,
        route: (response.locals.route as string | undefined) ?? 'unmatched',
        status: response.statusCode,
        ms: Math.round(Number(process.hrtime.bigint() - startedAt) / 1e5) / 10,
      });
    });
    next();
  };
}
