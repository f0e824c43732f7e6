/** Limits how often signing in can fail. */
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import type { RequestHandler } from 'express';

import { ProblemError } from '../problems';

const WINDOW_MS = 15 * 60_000;

/** Sign-in, by network address. Good tries do not count, so that a whole workshop behind one address can sign in. */
export function limitSignIn(tries: number): RequestHandler {
  return rateLimit({
    windowMs: WINDOW_MS,
    limit: tries,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    keyGenerator: (req) => ipKeyGenerator(req.ip ?? ''),
    handler: (_req, _res, next) => next(new ProblemError('too-many', 'Too many tries to sign in. Wait 15 minutes, then try again.')),
  });
}
