/** Where answers are kept on this device until the server has said that it has them. */
import { openDevice } from '@/shared/ui/api/device';
import type { Queued } from '@/shared/ui/api/queued';

export interface OutboxStore {
  /** all answers of a run, in no order */
  read(run: string): Promise<Queued[]>;
  /** puts and removes in one go; returns once it is on the disk */
  write(put: readonly Queued[], remove?: readonly string[]): Promise<void>;
}

/** The store in this browser's database, or null where it keeps nothing. */
export async function openOutboxStore(): Promise<OutboxStore | null> {
  const db = await openDevice();
  if (db === null) return null;
  return {
    read: (run) => db.getAllFromIndex('answers', 'run', run),
    async write(put, remove = []) {
      // relaxed durability may lose the last energise in a power cut, and the device would then think the bench dead
      const tx = db.transaction('answers', 'readwrite', { durability: 'strict' });
      await Promise.all([...put.map((q) => tx.store.put(q)), ...remove.map((id) => tx.store.delete(id)), tx.done]);
    },
  };
}
