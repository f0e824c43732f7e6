/** What a person may do with the own account: know the own sessions apart, and change the password. Frozen: a change is a new migration. */
import { sql } from 'kysely';
import type { Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql
    .raw(
      `alter table sessions add column device text not null default '' check (length(device) <= 200);
       -- the policy of the table leaves a person their own row alone
       grant update (password_hash, changed_at) on credentials to lampstep_server;`,
    )
    .execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await sql.raw('revoke update (password_hash, changed_at) on credentials from lampstep_server; alter table sessions drop column device;').execute(db);
}
