/** Limits how often a password can be tried, by address and account, over 15 minutes. */
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

/** Counts wrong passwords of one person who signs something while signed in. */
export function makeConfirmLimit(tries: number, clock: () => number): { check(person: string): void; missed(person: string): void } {
  const missed = new Map<string, number[]>();
  const recent = (person: string) => (missed.get(person) ?? []).filter((at) => at > clock() - WINDOW_MS);
  return {
    check: (person) => {
      if (recent(person).length >= tries) throw new ProblemError('too-many', 'Too many wrong passwords. Wait 15 minutes, then try again.');
    },
    missed: (person) => missed.set(person, [...recent(person), clock()]),
  };
}
