/** The database of this browser: answers and photos that wait to be sent. */
import { openDB } from 'idb';
import type { DBSchema, IDBPDatabase } from 'idb';

import type { Queued } from '@/shared/ui/api/queued';

export interface Device extends DBSchema {
  answers: { key: string; value: Queued; indexes: { run: string } };
  photos: { key: string; value: { hash: string; run: string; photo: Blob } };
}

let opening: Promise<IDBPDatabase<Device> | null> | null = null;

/** Opens the database once a page; null where the browser keeps nothing (private windows, no room, switched off). */
export function openDevice(): Promise<IDBPDatabase<Device> | null> {
  opening ??= open();
  return opening;
}

async function open(): Promise<IDBPDatabase<Device> | null> {
  try {
    return await openDB<Device>('lampstep', 2, {
      upgrade(db, before) {
        if (before < 1) db.createObjectStore('answers', { keyPath: 'id' }).createIndex('run', 'run');
        if (before < 2) db.createObjectStore('photos', { keyPath: 'hash' });
      },
    });
  } catch {
    return null;
  }
}
