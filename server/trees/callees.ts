/** The trees that a tree calls. */
import type { Tx } from '@/db/createDb';
import type { TreeVersionRow } from '@/db/tables';
import type { DocumentFault } from '@/flows/document/parseTree';
import type { Tree } from '@/flows/document/tree';

import { findNewestIssued, findTreeVersion } from './queries';

export interface Callees {
  found: TreeVersionRow[];
  missing: string[];
  /** calls of versions that have been withdrawn: such a tree can be read, and is led by no more */
  withdrawn: DocumentFault[];
}

/** Each tree that this one calls, and that those call in turn: once, in the version that the first call pins, or the newest issued one where it pins none. */
export async function findCallees(tx: Tx, tree: Tree): Promise<Callees> {
  const found = new Map<string, TreeVersionRow>();
  const missing = new Set<string>();
  const withdrawn: DocumentFault[] = [];
  const toRead = [tree];
  for (let own = toRead.shift(); own !== undefined; own = toRead.shift()) {
    for (const step of own.steps) {
      if (step.kind !== 'call' || found.has(step.tree) || missing.has(step.tree)) continue;
      const row = step.version === null ? await findNewestIssued(tx, step.tree) : await findTreeVersion(tx, step.tree, step.version);
      if (row === undefined || (row.state !== 'issued' && row.state !== 'withdrawn')) {
        missing.add(step.tree);
        continue;
      }
      if (row.state === 'withdrawn') withdrawn.push({ step: own === tree ? step.id : `${own.id}/${step.id}`, key: 'version', message: `version ${row.version} of “${row.document.title}” has been withdrawn` });
      found.set(step.tree, row);
      toRead.push(row.document);
    }
  }
  return { found: [...found.values()], missing: [...missing], withdrawn };
}
