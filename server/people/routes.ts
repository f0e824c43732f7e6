/** Members of the workshop. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { findPeople } from './queries';

/** Adds the routes of people. */
export function addPeopleRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.people, async ({ who }) => ({ people: await inWorkshop(parts.db, who.workshop, findPeople) }));
}
