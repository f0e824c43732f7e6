/** Keeps a second `npm start` in one checkout from sharing, and then stopping, the database of the first. */
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

type Holder = { pid: number; url?: string };

export type StartLock = {
  /** Notes where the server answers, for whoever comes second. */
  note(url: string): void;
  release(): void;
};

/** Takes the lock at `path`, also over a left-over of a killed start; throws a sentence when another start lives. */
export function takeStartLock(path: string): StartLock {
  const mine = (holder: Holder) => `${JSON.stringify(holder)}\n`;
  try {
    mkdirSync(dirname(path), { recursive: true });
    const holder = readHolder(path);
    if (holder !== undefined && isStart(holder.pid)) {
      throw new Error(`Lampstep already runs from this folder (process ${String(holder.pid)}${holder.url === undefined ? '' : `, ${holder.url}`}). Stop that one first.`);
    }
    rmSync(path, { force: true });
    writeFileSync(path, mine({ pid: process.pid }), { flag: 'wx' });
  } catch (error) {
    const code = (error as NodeJS.ErrnoException).code;
    if (code === 'EACCES' || code === 'EPERM') throw new Error(`${dirname(path)} belongs to another user: start as that user, or remove it first (it holds the private database).`);
    if (code === 'EEXIST') throw new Error('Lampstep is just being started from this folder by somebody else.');
    throw error;
  }
  return {
    note: (url) => writeFileSync(path, mine({ pid: process.pid, url })),
    release: () => rmSync(path, { force: true }),
  };
}

function readHolder(path: string): Holder | undefined {
  if (!existsSync(path)) return undefined;
  try {
    return JSON.parse(readFileSync(path, 'utf8')) as Holder;
  } catch {
    return undefined;
  }
}

/** True when the process lives and is a start, not some other program that has been given its number since. */
function isStart(pid: number): boolean {
  if (!Number.isInteger(pid) || pid <= 0 || pid === process.pid) return false;
  try {
    process.kill(pid, 0);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EPERM') return false;
  }
  const command = `/proc/${String(pid)}/cmdline`;
  return !existsSync('/proc/self/cmdline') || (existsSync(command) && readFileSync(command, 'utf8').includes('bootstrap.mjs'));
}
