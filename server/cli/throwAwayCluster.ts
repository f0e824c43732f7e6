/** A cluster for one test run, in the temporary folder, gone afterwards. */
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { openCluster, type Cluster } from './cluster';
import { livingPostmaster } from './postmaster';
import type { Say } from './runTool';

const prefix = 'lampstep-test-';

/**
 * Makes and starts a cluster that `stop()` removes. `durable: true` for tests that kill the server: what they assert
 * about a crash must hold with the settings of a real workshop.
 */
export async function openThrowAwayCluster(wish: { durable: boolean; say?: Say }): Promise<Cluster> {
  sweep();
  const dir = mkdtempSync(join(tmpdir(), `${prefix}${String(process.pid)}-`));
  const cluster = await openCluster({ dir, port: 0, durable: wish.durable, say: wish.say ?? (() => undefined) });
  return {
    ...cluster,
    stop: async () => {
      await cluster.stop();
      rmSync(cluster.dir, { recursive: true, force: true });
      rmSync(dir, { recursive: true, force: true });
    },
  };
}

/** Ends and removes clusters whose test run was killed before it could: the maker's process number is in the name. */
function sweep(): void {
  for (const name of readdirSync(tmpdir())) {
    const maker = new RegExp(`^${prefix}(\\d+)-`).exec(name)?.[1];
    if (maker === undefined || isAlive(Number(maker))) continue;
    const dir = join(tmpdir(), name);
    try {
      const left = livingPostmaster(join(dir, 'data'));
      if (left !== undefined) process.kill(left.pid, 'SIGQUIT');
      rmSync(dir, { recursive: true, force: true, maxRetries: 5, retryDelay: 100 });
    } catch {
      // Another user's left-over: theirs to remove.
    }
  }
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}
