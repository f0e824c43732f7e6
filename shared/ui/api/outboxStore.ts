/** Where answers are kept on this device until the server has said that it has them. */
import type { MachineEvent } from '@/flows/machine/events';
import { openDevice } from '@/shared/ui/api/device';

/** Why an answer was not taken. */
export interface NotTaken {
  readonly say: string;
  readonly rule: string | null;
}

/** One answer on its way to the record. */
export interface Queued {
  /** UUIDv7, made once: sending twice is harmless */
  readonly id: string;
  readonly run: string;
  /** who answered; nobody else's session sends it */
  readonly person: string;
  readonly seq: number;
  readonly event: MachineEvent;
  /** set when it was refused; it is kept and shown, never dropped */
  readonly notTaken: NotTaken | null;
  /** the restorer has read the refusal */
  readonly seen: boolean;
}

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
