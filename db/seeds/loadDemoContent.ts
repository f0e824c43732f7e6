/** Loading demo content into a database: once, and anew when the content has changed. */
import { pino } from 'pino';
import { sql } from 'kysely';
import { v7 as uuidv7 } from 'uuid';

import { createDb, inWorkshop } from '@/db/createDb';
import type { Db, Tx } from '@/db/createDb';
import { ENGINE } from '@/flows/machine/compile';
import { readConfig } from '@/server/config';
import type { Parts } from '@/server/parts';
import { hashOf } from '@/server/program/hashOf';
import { createProgramCache } from '@/server/program/programCache';
import { startRun } from '@/server/runs/startRun';
import { hashPassword } from '@/server/session/passwords';

import type { DemoContent, DemoRun } from './DemoContent';
import { DemoDevice } from './DemoDevice';
import { demoInstruments } from './demoInstruments';
import { DEMO_PASSWORD, demoPeople, demoWorkshops } from './demoPeople';
import { playReview } from './playReview';
import { playRun } from './playRun';

/** No run of the demo has a photo, so none is kept and none is looked for. */
const NO_PHOTOS: Parts['objects'] = {
  put: () => Promise.reject(new Error('the demo keeps no photos')),
  get: () => Promise.resolve(null),
  close: () => undefined,
};

export type DemoResult = 'loaded' | 'kept' | 'rebuilt';

const NAME = 'workshops';
const LOCK = 511_207;
const DAY_MS = 24 * 3_600_000;
/** Raised when the way of loading changes, so that what an older one has loaded is made anew. */
const LOADER = 1;

export interface DemoWish {
  ownerUrl: string;
  content: DemoContent;
  /** epoch milliseconds; all times of the demo lie before it */
  now: number;
  /** of the demo accounts' passwords */
  bcryptCost: number;
}

/** Loads the two demo workshops, leaves them as they are when their content is the same, or makes them anew. Other workshops are not touched. */
export async function loadDemoContent({ ownerUrl, content, now, bcryptCost }: DemoWish): Promise<DemoResult> {
  const db = createDb(ownerUrl, { connections: 3 });
  try {
    // One loader at a time: the lock is held by a transaction that does nothing else.
    return await db.transaction().execute(async (lock) => {
      await sql`select pg_advisory_xact_lock(${LOCK})`.execute(lock);
      const hash = hashOf(JSON.parse(JSON.stringify([LOADER, ENGINE, content, demoPeople, demoWorkshops, demoInstruments])));
      const before = await db.selectFrom('demo_content').select('hash').where('name', '=', NAME).executeTakeFirst();
      if (before?.hash === hash) return 'kept';
      await wipeDemo(db);
      await load(db, content, now, bcryptCost, ownerUrl);
      // Written last: a loader that was killed half-way leaves no hash, and the next one begins anew.
      await db.insertInto('demo_content').values({ name: NAME, hash }).execute();
      return before === undefined ? 'loaded' : 'rebuilt';
    });
  } finally {
    await db.destroy();
  }
}

const OF_WORKSHOP = ['machine_tags', 'release_voids', 'releases', 'snapshots', 'entries', 'run_heads', 'runs', 'instruments', 'tree_versions', 'trees', 'profile_revisions', 'machines', 'settings', 'sessions', 'members'] as const;

async function wipeDemo(db: Db): Promise<void> {
  await db.deleteFrom('demo_content').where('name', '=', NAME).execute();
  for (const { id } of Object.values(demoWorkshops)) {
    await inWorkshop(db, id, async (tx) => {
      for (const table of OF_WORKSHOP) await tx.deleteFrom(table).where('workshop', '=', id).execute();
      await tx.deleteFrom('workshops').where('id', '=', id).execute();
    });
  }
  const ids = Object.values(demoPeople).map((person) => person.id);
  await db.deleteFrom('credentials').where('person', 'in', ids).execute();
  await db.deleteFrom('people').where('id', 'in', ids).execute();
}

async function load(db: Db, content: DemoContent, now: number, bcryptCost: number, ownerUrl: string): Promise<void> {
  const began = new Date(now - 400 * DAY_MS);
  const password_hash = await hashPassword(DEMO_PASSWORD, bcryptCost);
  const machineIds = new Map(content.machines.map((machine, i) => [`${machine.workshop}/${machine.key}`, `5f0c6a13-0000-4000-8000-${String(i + 1).padStart(12, '0')}`]));
  for (const key of ['first', 'second'] as const) {
    await inWorkshop(db, demoWorkshops[key].id, async (tx) => {
      await insertPeople(tx, key, password_hash, began);
      await insertThings(tx, key, content, machineIds, now);
    });
  }
  const time = { now };
  const config = { ...readConfig({ NODE_ENV: 'development', DATABASE_URL: ownerUrl }), bcryptCost };
  const parts: Parts = { db, config, clock: () => time.now, log: pino({ level: 'silent' }), programs: createProgramCache(), objects: NO_PHOTOS };
  for (const run of content.runs) {
    try {
      await loadRun(parts, time, run, now, machineIds);
    } catch (error) {
      throw new Error(`demo run “${run.key}”: ${error instanceof Error ? error.message : String(error)}`, { cause: error });
    }
  }
  // Nobody wants a letter about a hold point of long ago.
  await sql`delete from graphile_worker._private_jobs where payload ->> 'workshop' in (${sql.join(Object.values(demoWorkshops).map(({ id }) => id))})`.execute(db);
}

async function insertPeople(tx: Tx, key: keyof typeof demoWorkshops, password_hash: string, began: Date): Promise<void> {
  const workshop = demoWorkshops[key];
  await tx.insertInto('workshops').values({ ...workshop }).execute();
  for (const person of Object.values(demoPeople)) {
    if (person.workshop !== key) continue;
    await tx.insertInto('people').values({ id: person.id, name: person.name, mail: person.mail }).execute();
    await tx.insertInto('members').values({ workshop: workshop.id, person: person.id, code: person.code, roles: [...person.roles], joined_at: began, left_at: null }).execute();
    if (person.account) await tx.insertInto('credentials').values({ person: person.id, password_hash, changed_at: began }).execute();
  }
}

async function insertThings(tx: Tx, key: keyof typeof demoWorkshops, content: DemoContent, machineIds: ReadonlyMap<string, string>, now: number): Promise<void> {
  const workshop = demoWorkshops[key].id;
  const author = key === 'first' ? demoPeople.senior.id : demoPeople.other.id;
  for (const one of demoInstruments.filter((instrument) => instrument.workshop === key)) {
    const calibrated_until = new Date(now + one.calibratedForDays * DAY_MS).toISOString().slice(0, 10);
    await tx
      .insertInto('instruments')
      .values({ id: one.id, workshop, tag: one.tag, name: one.name, kind: one.kind, serial: one.serial, ranges: JSON.stringify(one.ranges), category: one.category, two_pole: one.twoPole, calibrated_until })
      .execute();
  }
  for (const machine of content.machines.filter((one) => one.workshop === key)) {
    const id = machineIds.get(`${key}/${machine.key}`) ?? '';
    await tx.insertInto('machines').values({ id, workshop, name: machine.name, serial: machine.serial, machine_class: machine.profile.machineClass }).execute();
    await tx
      .insertInto('profile_revisions')
      .values({ workshop, machine: id, revision: 1, document: JSON.stringify(machine.profile), hash: hashOf(machine.profile), author, created_at: new Date(now - 200 * DAY_MS) })
      .execute();
  }
  for (const tree of content.trees.filter((one) => one.workshop === key)) {
    const at = new Date(now - tree.daysAgo * DAY_MS);
    const out = tree.state === 'issued' || tree.state === 'withdrawn';
    await tx.insertInto('trees').values({ workshop, id: tree.document.id }).onConflict((conflict) => conflict.doNothing()).execute();
    await tx
      .insertInto('tree_versions')
      .values({
        workshop, tree: tree.document.id, version: tree.version, document: JSON.stringify(tree.document), hash: hashOf(tree.document), state: tree.state,
        author: demoPeople[tree.author].id, checker: tree.checker === null ? null : demoPeople[tree.checker].id, issued_at: out ? at : null, withdrawn_at: tree.state === 'withdrawn' ? at : null,
      })
      .execute();
  }
}

async function loadRun(parts: Parts, time: { now: number }, run: DemoRun, now: number, machineIds: ReadonlyMap<string, string>): Promise<void> {
  time.now = now - run.hoursAgo * 3_600_000;
  const newId = () => uuidv7({ msecs: time.now });
  const workshop = demoWorkshops[run.workshop].id;
  const { id: person, roles } = demoPeople[run.restorer];
  const machine = machineIds.get(`${run.workshop}/${run.machine}`);
  if (machine === undefined) throw new Error(`there is no machine “${run.machine}”`);
  const { id } = await startRun(parts, { person, workshop, roles }, { id: newId(), machine, tree: run.tree, version: run.version, monotonic: 0 });
  const device = await DemoDevice.open(parts, time, { workshop, run: id, restorer: person, newId });
  await playRun(device, run, demoInstruments.filter((one) => one.workshop === run.workshop));
  await playReview(parts, time, workshop, id, run, newId);
  if (time.now > now) throw new Error(`it ends ${Math.ceil((time.now - now) / 3_600_000)} h after the time of loading: raise hoursAgo`);
}
