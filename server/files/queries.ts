/** Queries of photos and papers. */
import type { Tx } from '@/db/createDb';
import type { FileRow, InsertableFileRow } from '@/db/tables';

/** The file of that hash, if it is in this workshop. */
export function findFile(tx: Tx, hash: string): Promise<FileRow | undefined> {
  return tx.selectFrom('files').selectAll().where('hash', '=', hash).executeTakeFirst();
}

/** Who leads and who led the run for which a file was sent; a restorer of null stands for a use by the whole workshop. */
export interface FileUse {
  readonly restorer: string | null;
  readonly former: string[] | null;
}

/** For what the file of that hash was sent. */
export function findFileUses(tx: Tx, hash: string): Promise<FileUse[]> {
  return tx
    .selectFrom('file_uses')
    .leftJoin('runs', (join) => join.onRef('runs.workshop', '=', 'file_uses.workshop').onRef('runs.id', '=', 'file_uses.run'))
    .select(['runs.restorer', 'runs.former'])
    .where('file_uses.hash', '=', hash)
    .execute();
}

/** Stores a file and its use; both may be there already. */
export async function insertFile(tx: Tx, file: InsertableFileRow, use: { run: string | null; addedBy: string }): Promise<void> {
  const { workshop, hash, added_at } = file;
  await tx.insertInto('files').values(file).onConflict((conflict) => conflict.columns(['workshop', 'hash']).doNothing()).execute();
  await tx.insertInto('file_uses').values({ workshop, hash, run: use.run, added_by: use.addedBy, added_at }).onConflict((conflict) => conflict.columns(['workshop', 'hash', 'run']).doNothing()).execute();
}
