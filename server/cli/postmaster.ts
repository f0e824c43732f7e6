/** Reads the lock that a PostgreSQL server keeps in its data folder, and tells a living one from a crash's left-over. */
import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';

export type Postmaster = { pid: number; port: number };

/** The server that runs on this data folder, or undefined. */
export function livingPostmaster(data: string): Postmaster | undefined {
  const lock = readLock(data);
  return lock !== undefined && isPostmasterOf(lock.pid, data) ? lock : undefined;
}

/**
 * Removes the lock of a server that no longer runs. PostgreSQL does so itself unless, after a restart of the machine,
 * the number in the lock belongs to some other program of the same user: then it would refuse to start for ever.
 */
export function removeStaleLock(data: string): void {
  const lock = readLock(data);
  if (lock !== undefined && !isPostmasterOf(lock.pid, data)) rmSync(join(data, 'postmaster.pid'), { force: true });
}

function readLock(data: string): Postmaster | undefined {
  const path = join(data, 'postmaster.pid');
  if (!existsSync(path)) return undefined;
  // Line 1 is the process, line 4 the port (PostgreSQL, src/include/utils/pidfile.h).
  const lines = readFileSync(path, 'utf8').split('\n');
  return { pid: Number(lines[0]), port: Number(lines[3]) };
}

function isPostmasterOf(pid: number, data: string): boolean {
  if (!Number.isInteger(pid) || pid <= 0) return false;
  // Without /proc nothing can be said about the process: leave the decision to PostgreSQL.
  if (!existsSync('/proc/self/cmdline')) return true;
  try {
    const words = readFileSync(`/proc/${String(pid)}/cmdline`, 'utf8').split('\0');
    return (words[0] ?? '').includes('postgres') && words.includes(data);
  } catch {
    return false;
  }
}
