import type { ErrorRequestHandler } from 'express';
import type { Logger } from 'pino';
import { ConnectionError, ForeignKeyConstraintError, UniqueConstraintError } from 'sequelize';
import { AppError } from '../errors/app-error';

/** Turns anything thrown into problem+json. What is not an `AppError` is logged in full and answered in general. */
export function errorHandler(logger: Logger): ErrorRequestHandler {
  return (thrown: unknown, request, response, next) => {
    if (response.headersSent) return next(thrown);
    const error = toAppError(thrown);
    if (error.code === 'internal' || error.code === 'unavailable')
      logger.error({ err: safeError(thrown), method: request.method, requestId: response.locals.requestId }, 'failed');
    if (error.retryAfterS !== undefined) response.set('Retry-After', String(error.retryAfterS));
    response.status(error.status).type('application/problem+json').send(JSON.stringify(error.toProblem()));
  };
}

function toAppError(thrown: unknown): AppError {
  if (thrown instanceof AppError) return thrown;
  if (thrown instanceof UniqueConstraintError)
    return new AppError('already-exists', 'Something with these values exists already. Nothing was stored.');
  if (thrown instanceof ForeignKeyConstraintError)
    return new AppError('wrong-state', 'What this refers to is no longer there. Nothing was stored.');
  if (thrown instanceof ConnectionError || isConnectionLoss(thrown))
    return new AppError(
      'unavailable',
      'The server is busy or restarting. Nothing was stored. Try again in a moment.',
      undefined,
      2,
    );
  const type = bodyParserType(thrown);
  if (type === 'entity.too.large')
    return new AppError('body-too-large', 'This is larger than the server takes. Nothing was stored.');
  if (type === 'entity.parse.failed')
    return new AppError('bad-json', 'The request was not readable JSON. Nothing was stored.');
  if (type !== null || thrown instanceof URIError)
    return new AppError('bad-request', 'The request could not be read. Nothing was stored.');
  return new AppError('internal', 'Something went wrong on our side. Nothing was lost; try again.');
}

/** body-parser marks its errors with a `type`. */
function bodyParserType(thrown: unknown): string | null {
  if (typeof thrown !== 'object' || thrown === null || !('type' in thrown)) return null;
  const { type } = thrown;
  return typeof type === 'string' && /^(entity|encoding|charset|request|parameters)\./.test(type) ? type : null;
}

interface DriverError {
  code?: unknown;
  message?: unknown;
}

/** PostgreSQL going down in the middle of a query: class 57P or a dropped socket. */
function isConnectionLoss(thrown: unknown): boolean {
  // the ORM wraps the driver's error; the bare reader does not
  const error = thrown as { parent?: DriverError } & DriverError;
  const { code = '', message = '' } = error?.parent ?? error ?? {};
  return (
    /^57P|^40P01$|^40001$/.test(String(code)) || code === 'ECONNRESET' || /Connection terminated/.test(String(message))
  );
}

/** Database errors carry the statement's values; the log must not. */
function safeError(thrown: unknown): { name: string; message: string; code?: unknown; stack?: string } {
  if (!(thrown instanceof Error)) return { name: 'unknown', message: 'a value that is not an error was thrown' };
  const { parent, code: own } = thrown as { parent?: DriverError } & DriverError;
  const code = parent?.code ?? own;
  const message = code === undefined ? thrown.message : `database error ${String(code)}`;
  const stack = thrown.stack
    ?.split('\n')
    .filter((line) => line.trimStart().startsWith('at '))
    .slice(0, 12)
    .join('\n');
  return { name: thrown.name, message, code, ...(stack ? { stack } : {}) };
}
