/** The two cookies of a session. No script can read them and no other site makes a browser send them. */
import type { CookieOptions, Response } from 'express';

export const ACCESS_COOKIE = 'lampstep_access';
export const REFRESH_COOKIE = 'lampstep_refresh';
/** The refresh token travels to the session's own routes only. */
const REFRESH_PATH = '/api/session';

export const ACCESS_MS = 15 * 60_000;
export const REFRESH_MS = 14 * 24 * 3_600_000;

function options(secure: boolean, path: string): CookieOptions {
  return { httpOnly: true, sameSite: 'strict', secure, path };
}

/**
 * Sets both cookies; `secure` where the site is reached by https. The access cookie outlives its token, so that the server can say
 * "expired" rather than "signed out" and the client renews it.
 */
export function setSessionCookies(res: Response, secure: boolean, tokens: { access: string; refresh: string }): void {
  res.cookie(ACCESS_COOKIE, tokens.access, { ...options(secure, '/'), maxAge: REFRESH_MS });
  res.cookie(REFRESH_COOKIE, tokens.refresh, { ...options(secure, REFRESH_PATH), maxAge: REFRESH_MS });
}

/** Takes both cookies back. */
export function clearSessionCookies(res: Response, secure: boolean): void {
  res.clearCookie(ACCESS_COOKIE, options(secure, '/'));
  res.clearCookie(REFRESH_COOKIE, options(secure, REFRESH_PATH));
}
