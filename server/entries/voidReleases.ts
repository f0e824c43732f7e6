/** Work on a supply makes the releases of its machine void. */
import { v7 as uuidv7 } from 'uuid';

import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';

import { appendEntries } from './appendEntries';
import { lockHead } from './queries';

const REASON = 'work on the supply after the release';

/**
 * Makes every release of the run's machine void that is not so already. The record that carries the release says so too.
 * @param entry the entry of `run` that did it
 */
export async function voidReleases(tx: Tx, run: RunRow, entry: string, now: number, reason: string = REASON): Promise<void> {
  const standing = await tx
    .selectFrom('releases')
    .leftJoin('release_voids', 'release_voids.release', 'releases.id')
    .select(['releases.id', 'releases.run'])
    .where('releases.machine', '=', run.machine)
    .where('release_voids.release', 'is', null)
    .execute();
  for (const release of standing) {
    await tx
      .insertInto('release_voids')
      .values({ release: release.id, workshop: run.workshop, run: run.id, entry, voided_at: new Date(now), reason })
      .execute();
    const head = await lockHead(tx, release.run);
    const body = { release: release.id, byRun: run.id, byEntry: entry, reason };
    await appendEntries(tx, head, [{ id: uuidv7(), actor: run.restorer, kind: 'void', at: new Date(now).toISOString(), monotonic: 0, body }], now);
  }
}
