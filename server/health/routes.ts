/** Whether the process runs and whether it can work. */
import type { Router } from 'express';
import { sql } from 'kysely';

import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';

/** Adds the routes that watch the server. */
export function addHealthRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.health, () => Promise.resolve({ ok: true as const }));
  bindRoute(router, parts, routes.ready, async () => {
    try {
      await sql`select 1`.execute(parts.db);
    } catch (error) {
      parts.log.warn({ err: error }, 'the database does not answer');
      throw new ProblemError('not-ready');
    }
    return { ok: true as const };
  });
}
