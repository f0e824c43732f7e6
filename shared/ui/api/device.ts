/** The database of this browser: answers that wait to be sent. */
import { openDB } from 'idb';
import type { DBSchema, IDBPDatabase } from 'idb';

import type { Queued } from '@/shared/ui/api/queued';

export interface Device extends DBSchema {
  answers: { key: string; value: Queued; indexes: { run: string } };
}

let opening: Promise<IDBPDatabase<Device> | null> | null = null;

/** Opens the database once a page; null where the browser keeps nothing (private windows, no room, switched off). */
export function openDevice(): Promise<IDBPDatabase<Device> | null> {
  opening ??= open();
  return opening;
}

async function open(): Promise<IDBPDatabase<Device> | null> {
  try {
    return await openDB<Device>('lampstep', 1, {
      upgrade(db) {
        db.createObjectStore('answers', { keyPath: 'id' }).createIndex('run', 'run');
      },
    });
  } catch {
    return null;
  }
}
