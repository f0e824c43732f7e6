/** Where answers are kept on this device until the server has said that it has them. */
import { openDevice } from '@/shared/ui/api/device';
import type { Entry } from '@/shared/contract/entries';
import type { Queued } from '@/shared/ui/api/queued';

export interface OutboxStore {
  /** all answers of a run, in no order */
  read(run: string): Promise<Queued[]>;
  /** puts and removes in one go, with what the record has instead; returns once it is on the disk */
  write(put: readonly Queued[], remove?: readonly string[], record?: RecordPart): Promise<void>;
}

/** What the server was heard to hold of a run behind the place `after`: this and nothing else. */
export interface RecordPart {
  readonly run: string;
  readonly after: number;
  readonly entries: readonly Entry[];
}

/** The store in this browser's database, or null where it keeps nothing. */
export async function openOutboxStore(): Promise<OutboxStore | null> {
  const db = await openDevice();
  if (db === null) return null;
  return {
    read: (run) => db.getAllFromIndex('answers', 'run', run),
    async write(put, remove = [], record) {
      // relaxed durability may lose the last energise in a power cut, and the device would then think the bench dead
      const tx = db.transaction(['answers', 'held'], 'readwrite', { durability: 'strict' });
      const [answers, held] = [tx.objectStore('answers'), tx.objectStore('held')];
      const known = record === undefined ? [] : [held.delete(IDBKeyRange.bound([record.run, record.after + 1], [record.run, Infinity])), ...record.entries.map((entry) => held.put({ run: record.run, seq: entry.seq, entry }))];
      await Promise.all([...put.map((q) => answers.put(q)), ...remove.map((id) => answers.delete(id)), ...known, tx.done]);
    },
  };
}
