/** A run as the database holds it, read past the server. */
import { createDb, inWorkshop } from '@/db/createDb';
import { demoWorkshops } from '@/db/seeds/demoPeople';
import { findEntries } from '@/server/entries/queries';
import type { RecordEntry } from '@/shared/record/recordEntry';

export interface HeldRun {
  state: string;
  ended: string | null;
  head: { seq: number; hash: string };
  entries: RecordEntry[];
  releases: { givenBy: string; void: boolean }[];
  /** `openReleases`: those of its machine that are not void */
  machine: { id: string; openReleases: number };
}

/** Reads a run of the first demo workshop. */
export async function readRun(ownerUrl: string, id: string): Promise<HeldRun> {
  const db = createDb(ownerUrl, { connections: 1 });
  try {
    return await inWorkshop(db, demoWorkshops.first.id, async (tx) => {
      const run = await tx.selectFrom('runs').selectAll().where('id', '=', id).executeTakeFirstOrThrow();
      const head = await tx.selectFrom('run_heads').select(['seq', 'hash']).where('run', '=', id).executeTakeFirstOrThrow();
      const all = await tx
        .selectFrom('releases')
        .leftJoin('release_voids', 'release_voids.release', 'releases.id')
        .select(['releases.run', 'releases.given_by as givenBy', 'release_voids.voided_at as voidedAt'])
        .where('releases.machine', '=', run.machine)
        .execute();
      const releases = all.filter((one) => one.run === id).map(({ givenBy, voidedAt }) => ({ givenBy, void: voidedAt !== null }));
      const machine = { id: run.machine, openReleases: all.filter((one) => one.voidedAt === null).length };
      return { state: run.state, ended: run.ended, head, entries: await findEntries(tx, id, 0), releases, machine };
    });
  } finally {
    await db.destroy();
  }
}
