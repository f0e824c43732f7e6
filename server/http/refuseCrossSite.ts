/** Refuses requests that change something and come from another site, beside what SameSite cookies do already. */
import type { RequestHandler } from 'express';

import { ProblemError } from '../problems';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/** `publicUrl` is the address that browsers see; without one the Host header of the request stands for it. */
export function refuseCrossSite(publicUrl: string | null): RequestHandler {
  const own = publicUrl === null ? null : new URL(publicUrl).origin;
  return (req, _res, next) => {
    if (SAFE.has(req.method)) {
      next();
      return;
    }
    const site = req.get('sec-fetch-site');
    const origin = req.get('origin');
    const sameOrigin = origin === undefined || origin === own || origin === `${req.protocol}://${req.get('host') ?? ''}`;
    if (!sameOrigin || (site !== undefined && site !== 'same-origin' && site !== 'none')) throw new ProblemError('cross-site');
    next();
  };
}
