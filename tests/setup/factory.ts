/** Builds what a test names: a workshop with its people, a machine and issued trees. */
import { randomUUID } from 'node:crypto';

import { createDb, inWorkshop } from '@/db/createDb';
import type { Db, Tx } from '@/db/createDb';
import type { Profile } from '@/flows/document/profile';
import type { Settings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { hashOf } from '@/server/program/hashOf';
import { hashPassword } from '@/server/session/passwords';
import { benchProfile, lampTree, makeDeadTree } from '@/tests/flows/support/bench';

import { instrumentsOf } from './instrumentsOf';

export const password = 'a long enough pass phrase';

/** The day on which tests begin: a Monday morning. */
export const START = Date.UTC(2026, 0, 5, 8, 0, 0);

export interface TestPerson {
  id: string;
  mail: string;
  code: string;
}

export interface TestWorkshop {
  id: string;
  restorer: TestPerson;
  restorer2: TestPerson;
  senior: TestPerson;
  senior2: TestPerson;
  reviewer: TestPerson;
  reviewer2: TestPerson;
  keeper: TestPerson;
  machine: string;
  instruments: { tester: string; meter: string; old: string };
}

const PEOPLE = {
  restorer: ['restorer'],
  restorer2: ['restorer'],
  senior: ['senior'],
  senior2: ['senior', 'reviewer'],
  reviewer: ['reviewer'],
  reviewer2: ['reviewer', 'restorer'],
  keeper: ['keeper'],
} as const;

let count = 0;

/** Writes a workshop as the owner: one person a role, one machine, the trees “lamp” and “make-dead” issued, three instruments. */
export async function makeWorkshop(ownerUrl: string): Promise<TestWorkshop> {
  count += 1;
  const id = randomUUID();
  const password_hash = await hashPassword(password, 4);
  const instruments = { tester: randomUUID(), meter: randomUUID(), old: randomUUID() };
  const made: Partial<Record<keyof typeof PEOPLE, TestPerson>> = {};
  const machine = randomUUID();
  await asOwner(ownerUrl, id, async (tx) => {
    await tx.insertInto('workshops').values({ id, name: `Workshop ${count}` }).execute();
    for (const [name, roles] of Object.entries(PEOPLE)) {
      const person = { id: randomUUID(), mail: `${name}-${count}@example.org`, code: name.toUpperCase() };
      made[name as keyof typeof PEOPLE] = person;
      await tx.insertInto('people').values({ id: person.id, name: `${name} of ${count}`, mail: person.mail }).execute();
      await tx.insertInto('members').values({ workshop: id, person: person.id, code: person.code, roles: [...roles], joined_at: new Date(START), left_at: null }).execute();
      await tx.insertInto('credentials').values({ person: person.id, password_hash, changed_at: new Date(START) }).execute();
    }
    await tx.insertInto('instruments').values(instrumentsOf(id, instruments)).execute();
  });
  const workshop = { id, ...(made as Record<keyof typeof PEOPLE, TestPerson>), machine, instruments };
  await addMachine(ownerUrl, workshop, { id: machine });
  await addTree(ownerUrl, workshop, makeDeadTree);
  await addTree(ownerUrl, workshop, lampTree);
  return workshop;
}

/** Adds a machine with a first profile revision. */
export async function addMachine(ownerUrl: string, workshop: Pick<TestWorkshop, 'id' | 'senior'>, machine: { id?: string; profile?: Profile; serial?: string } = {}): Promise<string> {
  const id = machine.id ?? randomUUID();
  const profile = machine.profile ?? benchProfile;
  await asOwner(ownerUrl, workshop.id, async (tx) => {
    await tx.insertInto('machines').values({ id, workshop: workshop.id, name: profile.title, serial: machine.serial ?? id.slice(0, 8), machine_class: profile.machineClass }).execute();
    await tx
      .insertInto('profile_revisions')
      .values({ workshop: workshop.id, machine: id, revision: 1, document: JSON.stringify(profile), hash: hashOf(profile), author: workshop.senior.id, created_at: new Date(START) })
      .execute();
  });
  return id;
}

/** Adds a version of a tree, issued unless another state is named. */
export async function addTree(
  ownerUrl: string,
  workshop: Pick<TestWorkshop, 'id' | 'senior' | 'senior2'>,
  tree: Tree,
  as: { version?: number; state?: 'draft' | 'in-check' | 'issued' | 'withdrawn' } = {},
): Promise<void> {
  const state = as.state ?? 'issued';
  const out = state === 'issued' || state === 'withdrawn';
  await asOwner(ownerUrl, workshop.id, async (tx) => {
    await tx.insertInto('trees').values({ workshop: workshop.id, id: tree.id }).onConflict((conflict) => conflict.doNothing()).execute();
    await tx
      .insertInto('tree_versions')
      .values({
        workshop: workshop.id, tree: tree.id, version: as.version ?? 1, document: JSON.stringify(tree), hash: hashOf(tree), state, author: workshop.senior.id,
        checker: out ? workshop.senior2.id : null, issued_at: out ? new Date(START) : null, withdrawn_at: state === 'withdrawn' ? new Date(START) : null,
      })
      .execute();
  });
}

/** Sets the workshop's settings. */
export async function setSettings(ownerUrl: string, workshop: Pick<TestWorkshop, 'id'>, settings: Settings): Promise<void> {
  const row = { document: JSON.stringify(settings), hash: hashOf(settings), changed_at: new Date(START) };
  await asOwner(ownerUrl, workshop.id, async (tx) => {
    await tx.insertInto('settings').values({ workshop: workshop.id, ...row }).onConflict((conflict) => conflict.column('workshop').doUpdateSet(row)).execute();
  });
}

/** Works as the owner in one workshop. */
export async function asOwner<T>(ownerUrl: string, workshop: string, work: (tx: Tx) => Promise<T>): Promise<T> {
  const db: Db = createDb(ownerUrl, { connections: 1 });
  try {
    return await inWorkshop(db, workshop, work);
  } finally {
    await db.destroy();
  }
}
