/** The own account. */
import type { Router } from 'express';

import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import type { ConfirmPassword } from '../session/confirmPassword';
import { changePassword, endOwnSession, readOwnSessions } from './service';

/** Adds the routes of the own account. */
export function addAccountRoutes(router: Router, parts: Parts, confirm: ConfirmPassword): void {
  bindRoute(router, parts, routes.sessions, async ({ who }) => ({ sessions: await readOwnSessions(parts, who) }));
  bindRoute(router, parts, routes.endSession, async ({ who, params }) => {
    await endOwnSession(parts, who, params.session);
    return { done: true as const };
  });
  bindRoute(router, parts, routes.changePassword, async ({ who, body }) => {
    await changePassword(parts, who, confirm, body);
    return { done: true as const };
  });
}
