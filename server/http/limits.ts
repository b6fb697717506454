import { rateLimit } from 'express-rate-limit';
import type { RequestHandler } from 'express';
import { ProblemError } from './problems.ts';

/** At most `perMinute` calls a minute from one address; past it, words and a Retry-After header. */
export function limitPerMinute(perMinute: number, what: string): RequestHandler {
  return rateLimit({
    windowMs: 60_000,
    limit: perMinute,
    standardHeaders: 'draft-7',
    legacyHeaders: false,
    handler: (_req, _res, next) => next(new ProblemError('too-many', `Too many ${what} in a short time. Please wait a minute and try again.`)),
  });
}
