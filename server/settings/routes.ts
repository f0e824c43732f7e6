/** Settings of the workshop. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { getSettings } from './queries';

/** Adds the route of the settings. */
export function addSettingsRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.settings, ({ who }) => inWorkshop(parts.db, who.workshop, getSettings));
}
