/** Access tokens (signed, short) and refresh tokens (one per rotation, only their hash is stored). */
import { createHash, createHmac, timingSafeEqual } from 'node:crypto';

import { errors, jwtVerify, SignJWT } from 'jose';

import { ACCESS_MS } from './cookies';

const ISSUER = 'lampstep';
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

export interface AccessClaims {
  session: string;
  person: string;
  workshop: string;
  /** epoch milliseconds */
  expiresAt: number;
}

/** A signed access token that runs out 15 minutes after `now` (epoch milliseconds). */
export async function makeAccessToken(secret: string, who: Omit<AccessClaims, 'expiresAt'>, now: number): Promise<{ token: string; expiresAt: number }> {
  const issued = Math.floor(now / 1000);
  const expires = issued + ACCESS_MS / 1000;
  const token = await new SignJWT({ sid: who.session, ws: who.workshop })
    .setProtectedHeader({ alg: 'HS256' })
    .setIssuer(ISSUER)
    .setSubject(who.person)
    .setIssuedAt(issued)
    .setExpirationTime(expires)
    .sign(keyOf(secret));
  return { token, expiresAt: expires * 1000 };
}

/** Checks signature and time. */
export async function readAccessToken(secret: string, token: string, now: number): Promise<AccessClaims | 'expired' | 'invalid'> {
  try {
    const { payload } = await jwtVerify(token, keyOf(secret), { algorithms: ['HS256'], issuer: ISSUER, currentDate: new Date(now), requiredClaims: ['sub', 'exp', 'sid', 'ws'] });
    const { sub, exp, sid, ws } = payload;
    if (typeof sid !== 'string' || typeof ws !== 'string' || sub === undefined || exp === undefined) return 'invalid';
    return { session: sid, person: sub, workshop: ws, expiresAt: exp * 1000 };
  } catch (error) {
    if (error instanceof errors.JWTExpired) return 'expired';
    if (error instanceof errors.JOSEError) return 'invalid';
    throw error;
  }
}

/**
 * The refresh token of one rotation. It is derived and not drawn: when the answer to a refresh is lost on a bad network, the server can
 * give the same token again within the grace time instead of ending the session.
 */
export function makeRefreshToken(secret: string, session: string, workshop: string, generation: number): string {
  const mark = createHmac('sha256', `${secret}/refresh`).update(`${session}.${workshop}.${generation}`).digest('base64url');
  return `${session}.${workshop}.${generation}.${mark}`;
}

/** The parts of a refresh token whose mark is right, or null. */
export function readRefreshToken(secret: string, token: string): { session: string; workshop: string; generation: number } | null {
  const [session, workshop, generationText, mark, ...rest] = token.split('.');
  if (session === undefined || workshop === undefined || generationText === undefined || mark === undefined || rest.length > 0) return null;
  if (!UUID.test(session) || !UUID.test(workshop) || !/^\d{1,9}$/.test(generationText)) return null;
  const generation = Number(generationText);
  const wanted = Buffer.from(makeRefreshToken(secret, session, workshop, generation));
  const got = Buffer.from(token);
  return wanted.length === got.length && timingSafeEqual(wanted, got) ? { session, workshop, generation } : null;
}

/** What is stored of a refresh token. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

function keyOf(secret: string): Uint8Array {
  return new TextEncoder().encode(`${secret}/access`);
}
