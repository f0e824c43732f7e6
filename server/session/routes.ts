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
  bindRoute(router, parts, routes.signIn, async ({ body, res }) => {
    const { me, tokens } = await signIn(parts, body);
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

function refreshCookie(req: Request): string | undefined {
  const token = (req.cookies as Record<string, unknown>)[REFRESH_COOKIE];
  return typeof token === 'string' ? token : undefined;
}
