/** Routes of signing in and out. */
import type { Request, Router } from 'express';

import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { clearSessionCookies, REFRESH_COOKIE, setSessionCookies } from './cookies';
import { limitSignIn } from './limitSignIn';
import { readMe, refreshSession, signIn, signOut } from './service';

/** Adds the routes of signing in and out. */
export function addSessionRoutes(router: Router, parts: Parts): void {
  const secure = parts.config.publicUrl?.startsWith('https:') === true;

  router.post(routes.signIn.path, limitSignIn(parts.config.signInTries));
  bindRoute(router, parts, routes.signIn, async ({ body, req, res }) => {
    const { me, tokens } = await signIn(parts, body, deviceOf(req));
    setSessionCookies(res, secure, tokens);
    return me;
  });
  bindRoute(router, parts, routes.refreshSession, async ({ req, res }) => {
    try {
      const { me, tokens } = await refreshSession(parts, refreshCookie(req));
      setSessionCookies(res, secure, tokens);
      return me;
    } catch (error) {
      clearSessionCookies(res, secure);
      throw error;
    }
  });
  bindRoute(router, parts, routes.signOut, async ({ req, res }) => {
    await signOut(parts, refreshCookie(req));
    clearSessionCookies(res, secure);
    return { done: true as const };
  });
  bindRoute(router, parts, routes.me, ({ who }) => readMe(parts, who));
}

/** What the browser calls itself, for its person to tell one session from another; never trusted for anything. */
function deviceOf(req: Request): string {
  return (req.headers['user-agent'] ?? '').replace(/[^\x20-\x7e]/g, '').slice(0, 200);
}

function refreshCookie(req: Request): string | undefined {
  const token = (req.cookies as Record<string, unknown>)[REFRESH_COOKIE];
  return typeof token === 'string' ? token : undefined;
}
