/** Queries of people. */
import type { Tx } from '@/db/createDb';
import type { Person, Role } from '@/shared/contract/people';

/** Everyone who is or was a member: records name people long after they have left. Those who left have no roles. */
export async function findPeople(tx: Tx): Promise<Person[]> {
  const rows = await tx
    .selectFrom('members')
    .innerJoin('people', 'people.id', 'members.person')
    .select(['people.id', 'people.name', 'members.code', 'members.roles', 'members.left_at'])
    .orderBy('members.code')
    .execute();
  return rows.map((row) => ({ id: row.id, code: row.code, name: row.name, roles: row.left_at === null ? (row.roles as Role[]) : [] }));
}
