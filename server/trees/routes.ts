/** Fault trees of the workshop. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';
import type { TreeVersion } from '@/shared/contract/trees';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { maySeeVersion } from './access';
import { findCallees } from './callees';
import { findTreeVersion, findTreeVersions } from './queries';
import { treeVersionToWire } from './toWire';

/** Adds the routes of fault trees. */
export function addTreeRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.trees, async ({ who }) => {
    const rows = await inWorkshop(parts.db, who.workshop, findTreeVersions);
    const byTree = new Map<string, TreeVersion[]>();
    for (const row of rows) if (maySeeVersion(who, row)) byTree.set(row.tree, [...(byTree.get(row.tree) ?? []), treeVersionToWire(row)]);
    return { trees: [...byTree].map(([id, versions]) => ({ id, versions })) };
  });
  bindRoute(router, parts, routes.treeVersion, ({ who, params }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const row = await findTreeVersion(tx, params.tree, params.version);
      if (row === undefined || !maySeeVersion(who, row)) throw new ProblemError('not-found', `There is no version ${params.version} of the tree “${params.tree}”.`);
      const { found } = await findCallees(tx, row.document);
      return { version: treeVersionToWire(row), document: row.document, callees: found.map((callee) => callee.document) };
    }),
  );
}
