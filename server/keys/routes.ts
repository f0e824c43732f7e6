/** The public keys with which anyone can check a signed record. */
import type { Router } from 'express';

import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { publicJwk } from './publicJwk';

/** Adds the route of the public keys. */
export function addKeyRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.jwks, async () => ({ keys: [await publicJwk(parts.config.signingKey)] }));
}
