/** What the server's role may do in the job queue, whose tables another package keeps. Frozen: a change is a new migration. */
import { sql } from 'kysely';
import type { Kysely } from 'kysely';

// The queue switches row security on without a policy, so that only its owner works in it; its rows belong to no workshop.
const TABLES = ['_private_jobs', '_private_job_queues', '_private_tasks', '_private_known_crontabs'];

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql.raw('grant usage on schema graphile_worker to lampstep_server; grant select on graphile_worker.migrations to lampstep_server;').execute(db);
  for (const table of TABLES) {
    await sql
      .raw(
        `grant select, insert, update, delete on graphile_worker.${table} to lampstep_server;
         create policy lampstep_server_works on graphile_worker.${table} to lampstep_server using (true) with check (true);`,
      )
      .execute(db);
  }
  await sql.raw('grant usage on all sequences in schema graphile_worker to lampstep_server; grant select on graphile_worker.jobs to lampstep_server;').execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  for (const table of TABLES) await sql.raw(`drop policy lampstep_server_works on graphile_worker.${table};`).execute(db);
  await sql.raw('revoke all on all tables in schema graphile_worker from lampstep_server; revoke all on all sequences in schema graphile_worker from lampstep_server; revoke usage on schema graphile_worker from lampstep_server;').execute(db);
}
