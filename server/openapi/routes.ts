/** The description of the interface for machines. */
import type { Router } from 'express';

import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { openApiDocument } from './openApiDocument';

/** Adds the route of the OpenAPI document, which is made once. */
export function addOpenApiRoutes(router: Router, parts: Parts): void {
  let made: ReturnType<typeof openApiDocument> | undefined;
  bindRoute(router, parts, routes.openApi, () => {
    made ??= openApiDocument();
    return Promise.resolve({ ...made });
  });
}
