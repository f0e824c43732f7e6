/** Where a cluster's files lie and which user owns them: PostgreSQL refuses to run as root. */
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { chmodSync, chownSync, mkdirSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';

import { isRoot } from './packages';
import type { Say, ToolUser } from './runTool';

/** The user that runs PostgreSQL: `postgres` when this process is root, else undefined (this same user). */
export function clusterUser(): ToolUser | undefined {
  if (!isRoot()) return undefined;
  const number = (flag: string) => {
    const answer = spawnSync('id', [flag, 'postgres'], { encoding: 'utf8' });
    if (answer.status !== 0) throw new Error('The user postgres is missing, although PostgreSQL is installed. It cannot run as root.');
    return Number(answer.stdout.trim());
  };
  return { uid: number('-u'), gid: number('-g') };
}

/** A bare environment for PostgreSQL's programs, so that no PG… variable of the caller leads them elsewhere. */
export function userEnv(home: string): NodeJS.ProcessEnv {
  return { PATH: '/usr/bin:/bin', HOME: home, LC_ALL: 'C.UTF-8' };
}

/**
 * Makes the folder for a cluster, owned by the user that runs it and closed to others. When user postgres cannot
 * reach the wanted place (a checkout under a closed home), takes one under /var/lib or the temporary folder and says so.
 */
export function clusterFolder(wanted: string, say: Say): string {
  const user = clusterUser();
  const first = resolve(wanted);
  if (user === undefined) {
    mkdirSync(first, { recursive: true, mode: 0o700 });
    chmodSync(first, 0o700);
    return first;
  }
  const name = `lampstep-${createHash('sha256').update(first).digest('hex').slice(0, 12)}`;
  for (const dir of [first, join('/var/lib', name), join(tmpdir(), name)]) {
    try {
      mkdirSync(dir, { recursive: true });
      chownSync(dir, user.uid, user.gid);
      chmodSync(dir, 0o700);
    } catch {
      continue;
    }
    if (canWrite(dir, user)) {
      if (dir !== first) say(`User postgres cannot reach ${first}: the database is kept in ${dir}.`);
      return dir;
    }
  }
  throw new Error(`User postgres can reach neither ${first} nor /var/lib nor ${tmpdir()}: the database has no place.`);
}

function canWrite(dir: string, user: ToolUser): boolean {
  return spawnSync('test', ['-w', dir], { uid: user.uid, gid: user.gid, cwd: '/', env: { PATH: '/usr/bin:/bin' } }).status === 0;
}
