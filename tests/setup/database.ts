/** A database of its own for a test file, copied from the migrated template and dropped afterwards. */
import { randomBytes } from 'node:crypto';

import { inject } from 'vitest';

import { createDatabase, dropDatabase, type DatabaseUrls } from '@/server/cli/cluster';

import { templateName } from './cluster';

export type FreshDatabase = DatabaseUrls & {
  name: string;
  /** Drops it, open connections included. Call it in `afterAll`. */
  drop(): Promise<void>;
};

/** Makes a migrated, otherwise empty database; `migrated: false` makes one without a single table. */
export async function freshDatabase({ migrated = true }: { migrated?: boolean } = {}): Promise<FreshDatabase> {
  const adminUrl = inject('clusterAdminUrl');
  const name = `test_${randomBytes(6).toString('hex')}`;
  await createDatabase(adminUrl, name, migrated ? templateName : undefined);
  const at = (url: string) => url.replace(/DATABASE$/, name);
  const { ownerUrl, serverUrl, keeperUrl } = inject('clusterUrls');
  return {
    name,
    ownerUrl: at(ownerUrl),
    serverUrl: at(serverUrl),
    keeperUrl: at(keeperUrl),
    drop: () => dropDatabase(adminUrl, name),
  };
}
