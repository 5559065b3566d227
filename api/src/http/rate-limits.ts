import { createHash } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { AppError } from '../errors/app-error';
import { RateLimitStore } from './rate-limit-store';

const windowMs = 15 * 60_000;

/** Failed sign-ins per account and per address; a clinic's people share one address, so that limit is wider. */
export function createRateLimits(): Record<string, RequestHandler> {
  const limit = (prefix: string, max: number, keyOf: (request: Request) => string) =>
    rateLimit({
      windowMs,
      limit: max,
      store: new RateLimitStore(prefix),
      keyGenerator: keyOf,
      skipSuccessfulRequests: true,
      standardHeaders: false,
      legacyHeaders: false,
      validate: { xForwardedForHeader: false },
      handler: (request, _response, next) => {
        const resetTime = (request as Request & { rateLimit?: { resetTime?: Date } }).rateLimit?.resetTime;
        const waitS = Math.max(1, Math.ceil(((resetTime?.getTime() ?? Date.now() + windowMs) - Date.now()) / 1000));
        const minutes = Math.ceil(waitS / 60);
        const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`;
        next(new AppError('too-many-requests', `Too many tries. Wait ${wait}, then try again.`, undefined, waitS));
      },
    });
  const address = (request: Request) => ipKeyGenerator(request.ip ?? 'unknown');
  return {
    'sign-in-account': limit('sign-in-account:', 10, (request) => accountKey(request)),
    'sign-in-address': limit('sign-in-address:', 100, address),
    'link-address': limit('link-address:', 30, address),
  };
}

function accountKey(request: Request): string {
  const body: unknown = request.body;
  const email = typeof body === 'object' && body !== null && 'email' in body ? String(body.email) : '';
  return createHash('sha256').update(email.trim().toLowerCase()).digest('hex');
}
