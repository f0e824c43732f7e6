/** Signing in, renewing and ending a session. */
import { randomUUID } from 'node:crypto';

import { asPerson, inWorkshop } from '@/db/createDb';
import type { Tx } from '@/db/createDb';
import type { SessionRow } from '@/db/tables';
import type { Role } from '@/shared/contract/people';
import type { Me } from '@/shared/contract/session';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import type { SignedIn } from './access';
import { REFRESH_MS } from './cookies';
import { checkPassword } from './passwords';
import { findLiveSession, findMemberships, findSignIn, insertSession, lockSession, revokeSession, rotateSession } from './queries';
import { hashToken, makeAccessToken, makeRefreshToken, readRefreshToken } from './tokens';

export interface Tokens {
  access: string;
  refresh: string;
}

/** The same old token may come again this long after its rotation: the answer may have been lost, or two tabs asked at once. */
export const GRACE_MS = 60_000;

/** Opens a session. An unknown address and a wrong password are one answer, in the same time. */
export async function signIn(parts: Parts, input: { mail: string; password: string; workshop?: string | undefined }, device: string): Promise<{ me: Me; tokens: Tokens }> {
  const found = await asPerson(parts.db, { mail: input.mail }, (tx) => findSignIn(tx, input.mail));
  const fits = await checkPassword(input.password, found?.password_hash, parts.config.bcryptCost);
  if (found === undefined || !fits) throw new ProblemError('sign-in-failed');
  const workshops = await asPerson(parts.db, { id: found.id }, (tx) => findMemberships(tx, found.id));
  const workshop = input.workshop === undefined ? workshops[0] : workshops.find((w) => w.id === input.workshop);
  if (workshop === undefined) throw new ProblemError('sign-in-failed', 'This account belongs to no such workshop.');
  const now = parts.clock();
  const session = randomUUID();
  const refresh = makeRefreshToken(parts.config.sessionSecret, session, workshop.id, 1);
  return inWorkshop(parts.db, workshop.id, async (tx) => {
    await insertSession(tx, {
      id: session, workshop: workshop.id, person: found.id, generation: 1, token_hash: hashToken(refresh),
      rotated_at: new Date(now), created_at: new Date(now), expires_at: new Date(now + REFRESH_MS), device,
    });
    return openWith(parts, tx, { session, person: found.id, workshop: workshop.id }, refresh, workshops, now);
  });
}

/** Renews a session. A refresh token that was used before ends the session: someone else has a copy of it. */
export async function refreshSession(parts: Parts, token: string | undefined): Promise<{ me: Me; tokens: Tokens }> {
  const claims = token === undefined ? null : readRefreshToken(parts.config.sessionSecret, token);
  if (token === undefined || claims === null) throw new ProblemError('signed-out');
  const now = parts.clock();
  const result = await inWorkshop(parts.db, claims.workshop, async (tx) => {
    const row = await lockSession(tx, claims.session);
    if (row === undefined || row.revoked_at !== null || row.expires_at.getTime() <= now) return null;
    const refresh = await nextRefresh(parts, tx, row, token, claims.generation, now);
    return refresh === null ? null : { row, refresh };
  });
  // Thrown after the transaction, so that the revocation is kept.
  if (result === null) throw new ProblemError('session-expired', undefined, { retry: false });
  const { row, refresh } = result;
  const workshops = await asPerson(parts.db, { id: row.person }, (tx) => findMemberships(tx, row.person));
  return inWorkshop(parts.db, row.workshop, (tx) => openWith(parts, tx, { session: row.id, person: row.person, workshop: row.workshop }, refresh, workshops, now));
}

async function nextRefresh(parts: Parts, tx: Tx, row: SessionRow, token: string, generation: number, now: number): Promise<string | null> {
  const secret = parts.config.sessionSecret;
  if (generation === row.generation && hashToken(token) === row.token_hash) {
    const next = makeRefreshToken(secret, row.id, row.workshop, generation + 1);
    await rotateSession(tx, row.id, { generation: generation + 1, tokenHash: hashToken(next), now: new Date(now), expiresAt: new Date(now + REFRESH_MS) });
    return next;
  }
  if (generation === row.generation - 1 && now - row.rotated_at.getTime() <= GRACE_MS) return makeRefreshToken(secret, row.id, row.workshop, row.generation);
  await revokeSession(tx, row.id, new Date(now), 'an old refresh token was used again');
  return null;
}

/** Ends the session of the refresh token; without a good one there is nothing to end. */
export async function signOut(parts: Parts, token: string | undefined): Promise<void> {
  const claims = token === undefined ? null : readRefreshToken(parts.config.sessionSecret, token);
  if (claims === null) return;
  await inWorkshop(parts.db, claims.workshop, (tx) => revokeSession(tx, claims.session, new Date(parts.clock()), 'signed out'));
}

/** Who is signed in, with the workshops that could be chosen instead. */
export async function readMe(parts: Parts, who: SignedIn): Promise<Me> {
  const workshops = await asPerson(parts.db, { id: who.person }, (tx) => findMemberships(tx, who.person));
  return inWorkshop(parts.db, who.workshop, async (tx) => {
    const found = await findLiveSession(tx, who.session, who.person, new Date(parts.clock()));
    if (found === undefined) throw new ProblemError('session-expired');
    return toMe(who, found, workshops, who.expiresAt);
  });
}

type Workshops = { id: string; name: string }[];
type SessionOf = { session: string; person: string; workshop: string };

async function openWith(parts: Parts, tx: Tx, who: SessionOf, refresh: string, workshops: Workshops, now: number): Promise<{ me: Me; tokens: Tokens }> {
  const found = await findLiveSession(tx, who.session, who.person, new Date(now));
  if (found === undefined) throw new ProblemError('session-expired');
  const access = await makeAccessToken(parts.config.sessionSecret, who, now);
  return { me: toMe(who, found, workshops, access.expiresAt), tokens: { access: access.token, refresh } };
}

function toMe(who: SessionOf, found: { code: string; name: string; mail: string; roles: string[] }, workshops: Workshops, expiresAt: number): Me {
  return {
    person: { id: who.person, code: found.code, name: found.name, mail: found.mail },
    workshop: { id: who.workshop, name: workshops.find((w) => w.id === who.workshop)?.name ?? '' },
    workshops,
    roles: found.roles as Role[],
    expiresAt: new Date(expiresAt).toISOString(),
  };
}
