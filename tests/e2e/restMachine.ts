/** A machine at rest for one test alone: no run has ever been on it. */
import { v7 as uuidv7 } from 'uuid';

import { createDb, inWorkshop } from '@/db/createDb';
import { demoWorkshops } from '@/db/seeds/demoPeople';

/** Puts a twin of the demo's Corvane 12 into the first workshop; its name in lists is what comes back. */
export async function addRestMachine(ownerUrl: string, serial: string): Promise<string> {
  const db = createDb(ownerUrl, { connections: 1 });
  const id = uuidv7();
  try {
    await inWorkshop(db, demoWorkshops.first.id, async (tx) => {
      const twin = await tx.selectFrom('machines').selectAll().where('serial', '=', 'C12-0417').executeTakeFirstOrThrow();
      const revision = await tx.selectFrom('profile_revisions').selectAll().where('machine', '=', twin.id).where('revision', '=', 1).executeTakeFirstOrThrow();
      await tx.insertInto('machines').values({ ...twin, id, serial }).execute();
      await tx.insertInto('profile_revisions').values({ ...revision, machine: id, document: JSON.stringify(revision.document) }).execute();
    });
  } finally {
    await db.destroy();
  }
  return `Corvane 12, serial ${serial}`;
}
