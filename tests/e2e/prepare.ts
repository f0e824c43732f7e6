/** Migrates a throw-away database and loads the demo workshops; a process of its own, run as the product is run. */
import { migrateToLatest } from '@/db/migrate';
import { loadDemo } from '@/db/seeds/loadDemo';

const ownerUrl = process.env['DATABASE_OWNER_URL'] ?? '';
await migrateToLatest(ownerUrl);
await loadDemo({ ownerUrl });
