/** Once for the whole `api` project: a throw-away cluster with a migrated database that each test file copies. */
import type { TestProject } from 'vitest/node';

import { migrateToLatest } from '@/db/migrate';
import { createDatabase } from '@/server/cli/cluster';
import { openThrowAwayCluster } from '@/server/cli/throwAwayCluster';

export const templateName = 'lampstep_template';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Superuser address of the cluster, for making and dropping databases. */
    clusterAdminUrl: string;
    /** Addresses by role, with the word DATABASE where the name of a database belongs. */
    clusterUrls: { ownerUrl: string; serverUrl: string; keeperUrl: string };
  }
}

/** Opens the cluster and hands its addresses to the test files; the returned function removes it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const cluster = await openThrowAwayCluster({ durable: false, say: (line) => process.stderr.write(`${line}\n`) });
  try {
    await createDatabase(cluster.adminUrl, templateName);
    await migrateToLatest(cluster.urlsOf(templateName).ownerUrl);
  } catch (error) {
    await cluster.stop();
    throw error;
  }
  project.provide('clusterAdminUrl', cluster.adminUrl);
  project.provide('clusterUrls', cluster.urlsOf('DATABASE'));
  return () => cluster.stop();
}
