/** Instruments of the workshop. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { findInstruments } from './queries';
import { instrumentToWire } from './toWire';

/** Adds the routes of instruments. */
export function addInstrumentRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.instruments, async ({ who }) => {
    const rows = await inWorkshop(parts.db, who.workshop, findInstruments);
    return { instruments: rows.map((row) => instrumentToWire(row, parts.clock())) };
  });
}
