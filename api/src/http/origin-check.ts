import type { RequestHandler } from 'express';
import { AppError } from '../errors/app-error';

const readOnly = new Set(['GET', 'HEAD', 'OPTIONS']);

/** Writes must come from our own pages: the Origin header has to name this host (or the configured public one). */
export function originCheck(publicOrigin: string | undefined): RequestHandler {
  return (request, _response, next) => {
    if (readOnly.has(request.method)) return next();
    const origin = request.get('origin');
    if (origin && isOwn(origin, request.get('host'), publicOrigin)) return next();
    next(new AppError('foreign-origin', 'Nothing was stored. Open the page again from its own address.'));
  };
}

/** Behind a proxy the whole public origin must match; on loopback the host and port do. */
function isOwn(origin: string, host: string | undefined, publicOrigin: string | undefined): boolean {
  if (publicOrigin) return origin === new URL(publicOrigin).origin;
  return host !== undefined && hostOf(origin) === host;
}

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host;
  } catch {
    return null;
  }
}
