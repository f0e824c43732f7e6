/** Queries of sessions and sign-in. */
import type { Tx } from '@/db/createDb';
import type { InsertableSessionRow } from '@/db/tables';

/** Only inside `asPerson({ mail })`. */
export function findSignIn(tx: Tx, mail: string) {
  return tx
    .selectFrom('people')
    .innerJoin('credentials', 'credentials.person', 'people.id')
    .select(['people.id', 'credentials.password_hash'])
    .where('people.mail', '=', mail)
    .executeTakeFirst();
}

/** Only inside `asPerson({ id })`. */
export function findPasswordHash(tx: Tx, person: string) {
  return tx.selectFrom('credentials').select('password_hash').where('person', '=', person).executeTakeFirst();
}

/** Workshops that the person is a member of now, by name. Only inside `asPerson({ id })`. */
export function findMemberships(tx: Tx, person: string) {
  return tx
    .selectFrom('members')
    .innerJoin('workshops', 'workshops.id', 'members.workshop')
    .select(['workshops.id', 'workshops.name'])
    .where('members.person', '=', person)
    .where('members.left_at', 'is', null)
    .orderBy('workshops.name')
    .orderBy('workshops.id')
    .execute();
}

/** The session, if it still counts and its person is still a member. */
export function findLiveSession(tx: Tx, session: string, person: string, now: Date) {
  return tx
    .selectFrom('sessions')
    .innerJoin('members', (join) => join.onRef('members.workshop', '=', 'sessions.workshop').onRef('members.person', '=', 'sessions.person'))
    .innerJoin('people', 'people.id', 'sessions.person')
    .select(['members.code', 'members.roles', 'people.name', 'people.mail'])
    .where('sessions.id', '=', session)
    .where('sessions.person', '=', person)
    .where('sessions.revoked_at', 'is', null)
    .where('sessions.expires_at', '>', now)
    .where('members.left_at', 'is', null)
    .executeTakeFirst();
}

/** Own sessions that still count, the last used first. */
export function findOwnSessions(tx: Tx, person: string, now: Date) {
  return tx
    .selectFrom('sessions')
    .select(['id', 'device', 'created_at', 'rotated_at'])
    .where('person', '=', person)
    .where('revoked_at', 'is', null)
    .where('expires_at', '>', now)
    .orderBy('rotated_at', 'desc')
    .orderBy('id')
    .execute();
}

/** Ends sessions of a person: one, or all but one. Gives back how many. */
export async function revokeOwnSessions(tx: Tx, person: string, which: { only: string } | { but: string }, now: Date, why: string): Promise<number> {
  const rows = await tx
    .updateTable('sessions')
    .set({ revoked_at: now, revoked_why: why })
    .where('person', '=', person)
    .where('revoked_at', 'is', null)
    .where('id', 'only' in which ? '=' : '!=', 'only' in which ? which.only : which.but)
    .returning('id')
    .execute();
  return rows.length;
}

/** Only inside `asPerson({ id })`. */
export async function updatePassword(tx: Tx, person: string, passwordHash: string, now: Date): Promise<void> {
  await tx.updateTable('credentials').set({ password_hash: passwordHash, changed_at: now }).where('person', '=', person).execute();
}

/** Stores a new session. */
export async function insertSession(tx: Tx, row: InsertableSessionRow): Promise<void> {
  await tx.insertInto('sessions').values(row).execute();
}

/** Locks the session's row until the transaction ends. */
export function lockSession(tx: Tx, session: string) {
  return tx.selectFrom('sessions').selectAll().where('id', '=', session).forUpdate().executeTakeFirst();
}

/** Puts the next refresh token in force. */
export async function rotateSession(tx: Tx, session: string, next: { generation: number; tokenHash: string; now: Date; expiresAt: Date }): Promise<void> {
  await tx
    .updateTable('sessions')
    .set({ generation: next.generation, token_hash: next.tokenHash, rotated_at: next.now, expires_at: next.expiresAt })
    .where('id', '=', session)
    .execute();
}

/** Ends a session; one that has ended already keeps its first reason. */
export async function revokeSession(tx: Tx, session: string, now: Date, why: string): Promise<void> {
  await tx.updateTable('sessions').set({ revoked_at: now, revoked_why: why }).where('id', '=', session).where('revoked_at', 'is', null).execute();
}
