/** Who is signed in, read from the access cookie and checked against the database at every request. */
import type { Request } from 'express';

import { inWorkshop } from '@/db/createDb';
import type { Role } from '@/shared/contract/people';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { ACCESS_COOKIE } from './cookies';
import { findLiveSession } from './queries';
import { readAccessToken } from './tokens';

export interface SignedIn {
  readonly session: string;
  readonly person: string;
  readonly workshop: string;
  readonly code: string;
  readonly name: string;
  readonly roles: readonly Role[];
  /** epoch milliseconds */
  readonly expiresAt: number;
}

/**
 * The person signed in. Roles are read afresh, so that a role taken away or a session ended counts at once and not only when the
 * token has run out. Throws `signed-out` without a cookie, `session-expired` when the token or its session has ended.
 */
export async function wantSession(parts: Parts, req: Request): Promise<SignedIn> {
  const cookies = req.cookies as Record<string, unknown>;
  const token = cookies[ACCESS_COOKIE];
  if (typeof token !== 'string' || token === '') throw new ProblemError('signed-out');
  const claims = await readAccessToken(parts.config.sessionSecret, token, parts.clock());
  if (claims === 'invalid') throw new ProblemError('signed-out');
  if (claims === 'expired') throw new ProblemError('session-expired');
  const found = await inWorkshop(parts.db, claims.workshop, (tx) => findLiveSession(tx, claims.session, claims.person, new Date(parts.clock())));
  if (found === undefined) throw new ProblemError('session-expired');
  return { session: claims.session, person: claims.person, workshop: claims.workshop, code: found.code, name: found.name, roles: found.roles as Role[], expiresAt: claims.expiresAt };
}
