/** `npm run migrate` (after `npm run build:server`): brings the database at DATABASE_OWNER_URL to the newest schema, for a server that is set up by hand. */
import { existsSync } from 'node:fs';

import { migrateToLatest } from '@/db/migrate';

try {
  if (existsSync('.env')) process.loadEnvFile('.env');
  const ownerUrl = process.env['DATABASE_OWNER_URL'] ?? '';
  if (ownerUrl === '') throw new Error('DATABASE_OWNER_URL is not set: it names the database and the role that owns it.');
  await migrateToLatest(ownerUrl);
  console.log('The database schema is up to date.');
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
