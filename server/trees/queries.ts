/** Queries of fault trees. */
import type { Tx } from '@/db/createDb';
import type { TreeVersionRow } from '@/db/tables';

/** All versions of all trees, the newest of each first. */
export function findTreeVersions(tx: Tx): Promise<TreeVersionRow[]> {
  return tx.selectFrom('tree_versions').selectAll().orderBy('tree').orderBy('version', 'desc').execute();
}

/** One version, whatever its state. */
export function findTreeVersion(tx: Tx, tree: string, version: number): Promise<TreeVersionRow | undefined> {
  return tx.selectFrom('tree_versions').selectAll().where('tree', '=', tree).where('version', '=', version).executeTakeFirst();
}

/** The newest issued version of a tree, for a call that names none. */
export function findNewestIssued(tx: Tx, tree: string): Promise<TreeVersionRow | undefined> {
  return tx.selectFrom('tree_versions').selectAll().where('tree', '=', tree).where('state', '=', 'issued').orderBy('version', 'desc').limit(1).executeTakeFirst();
}
