/** Photos on their way to the record: on this device until the server has said that it has them. */
import { openDevice } from '@/shared/ui/api/device';

export interface PhotoKeep {
  /** Keeps a photo under the hash of its bytes; false where this device has no room. */
  put(hash: string, run: string, photo: Blob): Promise<boolean>;
  /** The photo, or null when this device does not have it. */
  get(hash: string): Promise<Blob | null>;
  drop(hash: string): Promise<void>;
}

/** What this load of the page has taken, also where the browser keeps nothing. */
const here = new Map<string, Blob>();

/** The photos of this browser's database, with those of this load of the page before them. */
export const photoKeep: PhotoKeep = {
  async put(hash, run, photo) {
    here.set(hash, photo);
    const db = await openDevice();
    if (db === null) return true;
    try {
      const tx = db.transaction('photos', 'readwrite', { durability: 'strict' });
      await Promise.all([tx.store.put({ hash, run, photo }), tx.done]);
      return true;
    } catch {
      here.delete(hash);
      return false;
    }
  },
  async get(hash) {
    const held = here.get(hash);
    if (held !== undefined) return held;
    const db = await openDevice();
    return (await db?.get('photos', hash))?.photo ?? null;
  },
  async drop(hash) {
    here.delete(hash);
    const db = await openDevice();
    await db?.delete('photos', hash).catch(() => undefined);
  },
};
