/** The database of this browser: answers and photos that wait to be sent, and the run that they belong to. */
import { openDB } from 'idb';
import type { DBSchema, IDBPDatabase } from 'idb';

import type { Entry } from '@/shared/contract/entries';
import type { RunBundle } from '@/shared/contract/runs';
import type { Queued } from '@/shared/ui/api/queued';

export interface Device extends DBSchema {
  answers: { key: string; value: Queued; indexes: { run: string } };
  photos: { key: string; value: { hash: string; run: string; photo: Blob } };
  /** runs led on this device, without their entries */
  runs: { key: string; value: { id: string; person: string; bundle: RunBundle } };
  /** entries that the server was heard to have, by run and place */
  held: { key: [string, number]; value: { run: string; seq: number; entry: Entry }; indexes: { run: string } };
}

let opening: Promise<IDBPDatabase<Device> | null> | null = null;

/** Opens the database once a page; null where the browser keeps nothing (private windows, no room, switched off). */
export function openDevice(): Promise<IDBPDatabase<Device> | null> {
  opening ??= open();
  return opening;
}

function open(): Promise<IDBPDatabase<Device> | null> {
  return new Promise((resolve) => {
    // where the browser has no database at all, asking for it throws
    if (typeof indexedDB === 'undefined') {
      resolve(null);
      return;
    }
    openDB<Device>('lampstep', 3, {
      upgrade(db, before) {
        if (before < 1) db.createObjectStore('answers', { keyPath: 'id' }).createIndex('run', 'run');
        if (before < 2) db.createObjectStore('photos', { keyPath: 'hash' });
        if (before < 3) {
          db.createObjectStore('runs', { keyPath: 'id' });
          db.createObjectStore('held', { keyPath: ['run', 'seq'] }).createIndex('run', 'run');
        }
      },
      // a page of an older version that is still open elsewhere holds it up: this one does without rather than wait
      blocked: () => resolve(null),
      blocking: (_current, _next, event) => (event.target as IDBDatabase).close(),
    }).then(resolve, () => resolve(null));
  });
}
