/** A version of a tree as the contract shows it. */
import { purposeOf } from '@/flows/document/purpose';
import type { TreeVersionRow } from '@/db/tables';
import type { TreeVersion } from '@/shared/contract/trees';

/** A version without its document. */
export function treeVersionToWire(row: TreeVersionRow): TreeVersion {
  return {
    tree: row.tree,
    version: row.version,
    title: row.document.title,
    symptom: row.document.symptom,
    purpose: purposeOf(row.document),
    state: row.state,
    hash: row.hash,
    steps: row.document.steps.length,
    author: row.author,
    checker: row.checker,
    issuedAt: row.issued_at?.toISOString() ?? null,
  };
}
