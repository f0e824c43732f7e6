/** The run that is led on this device, kept on it: a page that is loaded anew without the network comes back to it. */
import type { RunBundle } from '@/shared/contract/runs';
import { openDevice } from '@/shared/ui/api/device';

/** A run as this device last knew it, and who leads it. */
export interface KeptRun {
  readonly bundle: RunBundle;
  readonly person: string;
}

/** Keeps what does not change of a run; its entries are kept by the outbox as they are acknowledged. A disk that is full keeps nothing, and nothing is lost by it. */
export async function keepRun({ bundle, person }: KeptRun): Promise<void> {
  try {
    const db = await openDevice();
    await db?.put('runs', { id: bundle.run.id, person, bundle: { ...bundle, entries: [] } });
  } catch {
    // the run goes on with the network alone
  }
}

/** The run with the entries that the server was heard to have, or null where this device does not hold all of it. */
export async function readKeptRun(run: string): Promise<KeptRun | null> {
  try {
    const db = await openDevice();
    const kept = await db?.get('runs', run);
    if (db === null || kept === undefined) return null;
    const held = await db.getAllFromIndex('held', 'run', run);
    const entries = held.map(({ entry }) => entry).sort((a, b) => a.seq - b.seq);
    const whole = entries.length > 0 && entries.every((entry, i) => entry.seq === i + 1);
    return whole ? { person: kept.person, bundle: { ...kept.bundle, entries } } : null;
  } catch {
    return null;
  }
}

/** Forgets every run: nobody else who takes up this device reads them. Answers that wait to be sent stay. */
export async function forgetRuns(): Promise<void> {
  try {
    const db = await openDevice();
    if (db === null) return;
    const tx = db.transaction(['runs', 'held'], 'readwrite');
    await Promise.all([tx.objectStore('runs').clear(), tx.objectStore('held').clear(), tx.done]);
  } catch {
    // what cannot be opened cannot be read by anybody else here either
  }
}
