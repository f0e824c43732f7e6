/** Bringing the schema up to date, as the owner's role. */
import { runMigrations } from 'graphile-worker';
import { Migrator, sql } from 'kysely';
import type { MigrationProvider } from 'kysely';

import { createDb } from './createDb';
import type { Db } from './createDb';
import * as firstRun from './migrations/20260301T090000-first-run';
import * as jobQueue from './migrations/20260301T093000-job-queue';
import * as handOver from './migrations/20260302T090000-hand-over';
import * as files from './migrations/20261201T100000-files';
import * as ownAccount from './migrations/20261201T110000-own-account';

/** Every migration by name; a name starts with its time, so that two branches cannot take the same place. */
export const migrations = {
  '20260301T090000-first-run': firstRun,
  '20260301T093000-job-queue': jobQueue,
  '20260302T090000-hand-over': handOver,
  '20261201T100000-files': files,
  '20261201T110000-own-account': ownAccount,
};

const provider: MigrationProvider = { getMigrations: () => Promise.resolve(migrations) };

const ROLES = ['lampstep_server', 'lampstep_keeper'] as const;

/** Brings the database at `ownerUrl` to the newest schema. Throws with a sentence when a role is missing or a step fails. */
export async function migrateToLatest(ownerUrl: string): Promise<void> {
  const db = createDb(ownerUrl, { connections: 2 });
  try {
    await wantRoles(db);
    // The queue's own tables come first: our migration grants the server's role what it needs of them.
    await runMigrations({ connectionString: ownerUrl });
    const { error, results } = await new Migrator({ db, provider }).migrateToLatest();
    const failed = results?.find((r) => r.status === 'Error');
    if (error !== undefined) throw new Error(`The migration ${failed?.migrationName ?? ''} failed: ${error instanceof Error ? error.message : JSON.stringify(error)}`, { cause: error });
  } finally {
    await db.destroy();
  }
}

/** Takes back every migration. All content is lost; for tests and for a workshop that is made anew. */
export async function migrateDown(ownerUrl: string): Promise<void> {
  const db = createDb(ownerUrl, { connections: 2 });
  try {
    const migrator = new Migrator({ db, provider });
    for (let i = 0; i < Object.keys(migrations).length; i += 1) {
      const { error } = await migrator.migrateDown();
      if (error !== undefined) throw error instanceof Error ? error : new Error(JSON.stringify(error));
    }
  } finally {
    await db.destroy();
  }
}

async function wantRoles(db: Db): Promise<void> {
  const { rows } = await sql<{ rolname: string }>`select rolname from pg_roles where rolname in (${sql.join(ROLES)})`.execute(db);
  const missing = ROLES.filter((role) => !rows.some((r) => r.rolname === role));
  if (missing.length === 0) return;
  throw new Error(
    `The database has no role ${missing.join(' and no role ')}. Someone who may create roles makes it with: ` +
      missing.map((role) => `CREATE ROLE ${role} LOGIN NOSUPERUSER NOBYPASSRLS PASSWORD '…';`).join(' '),
  );
}
