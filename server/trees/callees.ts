/** The trees that a tree calls. */
import type { Tx } from '@/db/createDb';
import type { TreeVersionRow } from '@/db/tables';
import type { Tree } from '@/flows/document/tree';

import { findNewestIssued, findTreeVersion } from './queries';

/** Each called tree once, in the version that the call pins, or the newest issued one where it pins none. Calls go one level deep. */
export async function findCallees(tx: Tx, tree: Tree): Promise<{ found: TreeVersionRow[]; missing: string[] }> {
  const found = new Map<string, TreeVersionRow>();
  const missing: string[] = [];
  for (const step of tree.steps) {
    if (step.kind !== 'call' || found.has(step.tree)) continue;
    const row = step.version === null ? await findNewestIssued(tx, step.tree) : await findTreeVersion(tx, step.tree, step.version);
    if (row === undefined || (row.state !== 'issued' && row.state !== 'withdrawn')) missing.push(step.tree);
    else found.set(step.tree, row);
  }
  return { found: [...found.values()], missing };
}
