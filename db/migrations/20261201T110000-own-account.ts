/** What a person may do with the own account: know the own sessions apart, and change the password. Frozen: a change is a new migration. */
import { sql } from 'kysely';
import type { Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql
    .raw(
      `alter table sessions add column device text not null default '' check (length(device) <= 200);
       -- reading a row to sign in goes by mail address; changing one wants the person
       create policy credentials_change on credentials as restrictive for update using (person = current_person()) with check (person = current_person());
       grant update (password_hash, changed_at) on credentials to lampstep_server;`,
    )
    .execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await sql.raw('revoke update (password_hash, changed_at) on credentials from lampstep_server; drop policy credentials_change on credentials; alter table sessions drop column device;').execute(db);
}
