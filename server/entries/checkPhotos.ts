/** Whether the photos that a batch names have reached the server. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { SentEntry } from '@/shared/contract/entries';

import { ProblemError } from '../problems';

/** Throws `photo-missing` at the first photo that was not sent for this run: the device sends photos before the entries that name them. */
export async function checkPhotos(tx: Tx, run: RunRow, sent: readonly SentEntry[]): Promise<void> {
  const named = sent.flatMap(({ id, event }) => (event.type === 'PHOTO' ? [{ id, hash: event.photo }] : []));
  if (named.length === 0) return;
  const rows = await tx.selectFrom('file_uses').select('hash').where('run', '=', run.id).where('hash', 'in', named.map(({ hash }) => hash)).execute();
  const kept = new Set(rows.map(({ hash }) => hash));
  const missing = named.find(({ hash }) => !kept.has(hash));
  if (missing !== undefined) throw new ProblemError('photo-missing', undefined, { entry: missing.id, photo: missing.hash });
}
