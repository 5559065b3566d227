import type { RequestHandler } from 'express';
import { AppError } from '../errors/app-error';

const readOnly = new Set(['GET', 'HEAD', 'OPTIONS']);

/** Writes must come from our own pages: the Origin header has to name this host (or the configured public one). */
export function originCheck(publicOrigin: string | undefined): RequestHandler {
  return (request, _response, next) => {
    if (readOnly.has(request.method)) return next();
    const origin = request.get('origin');
    const allowed = publicOrigin ? new URL(publicOrigin).host : request.get('host');
    if (origin && allowed && hostOf(origin) === allowed) return next();
    next(new AppError('foreign-origin', 'Nothing was stored. Open the page again from its own address.'));
  };
}

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host;
  } catch {
    return null;
  }
}
