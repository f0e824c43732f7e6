/** Debian packages that the project needs beside its node modules: found, or installed when this user may. */
import { existsSync, mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';

import { runTool, tryTool, type Say } from './runTool';

const postgresHome = '/usr/lib/postgresql';

/** True when this process runs as root and may install packages. */
export function isRoot(): boolean {
  return process.getuid?.() === 0;
}

/** The folder with `initdb` and `pg_ctl`: Debian's newest version first, then PATH. Undefined when there is none. */
export function findPostgres(): string | undefined {
  const versions = existsSync(postgresHome) ? readdirSync(postgresHome) : [];
  const newestFirst = versions.filter((name) => /^\d+$/.test(name)).sort((a, b) => Number(b) - Number(a));
  const debian = newestFirst.map((version) => join(postgresHome, version, 'bin'));
  const onPath = (process.env['PATH'] ?? '').split(delimiter).filter((folder) => folder !== '');
  return [...debian, ...onPath].find((folder) => existsSync(join(folder, 'initdb')) && existsSync(join(folder, 'pg_ctl')));
}

/**
 * The folder of PostgreSQL's programs; installs Debian's package when it is missing and this user may.
 * Throws a line that names the package otherwise.
 */
export async function ensurePostgres(say: Say): Promise<string> {
  const found = findPostgres();
  if (found !== undefined) return found;
  // Debian makes and starts a cluster of its own on installation, which nobody asked for here.
  const dropIn = '/etc/postgresql-common/createcluster.d/lampstep.conf';
  const folderWasThere = existsSync('/etc/postgresql-common/createcluster.d');
  await installPackages(['postgresql'], 'the database', say, () => {
    mkdirSync('/etc/postgresql-common/createcluster.d', { recursive: true });
    writeFileSync(dropIn, 'create_main_cluster = false\n');
  }).finally(() => {
    if (!isRoot()) return;
    rmSync(dropIn, { force: true });
    if (!folderWasThere) rmSync('/etc/postgresql-common/createcluster.d', { recursive: true, force: true });
  });
  const installed = findPostgres();
  if (installed === undefined) throw new Error('The package postgresql was installed, but initdb and pg_ctl are not to be found.');
  return installed;
}

/** The path of Chromium: CHROMIUM in the environment, else Debian's; undefined when there is none. */
export function findChromium(): string | undefined {
  const named = process.env['CHROMIUM'];
  return [named, '/usr/bin/chromium'].find((path) => path !== undefined && path !== '' && existsSync(path));
}

/** The path of Chromium for the browser tests; installs Debian's package when it is missing and this user may. */
export async function ensureChromium(say: Say): Promise<string> {
  const found = findChromium();
  if (found !== undefined) return found;
  await installPackages(['chromium'], 'the browser tests', say);
  const installed = findChromium();
  if (installed === undefined) throw new Error('The package chromium was installed, but /usr/bin/chromium is not there.');
  return installed;
}

/** Makes sure of ngspice, which the workings are held against; installs Debian's package when it is missing and this user may. */
export async function ensureNgspice(say: Say): Promise<void> {
  const found = (process.env['PATH'] ?? '').split(delimiter).some((folder) => folder !== '' && existsSync(join(folder, 'ngspice')));
  if (!found) await installPackages(['ngspice'], 'the checks of the workings', say);
}

async function installPackages(names: readonly string[], purpose: string, say: Say, prepare?: () => void): Promise<void> {
  const list = names.join(' ');
  const byHand = `apt-get install --no-install-recommends ${list}`;
  if (!existsSync('/usr/bin/apt-get')) {
    throw new Error(`The package ${list} is needed for ${purpose}. This is not a Debian system: please install it with your system's own tool.`);
  }
  if (!isRoot()) {
    throw new Error(`The Debian package ${list} is needed for ${purpose} and is not installed. As root: ${byHand}`);
  }
  say(`Installing the Debian package ${list} for ${purpose} …`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' };
  // An old package list names files that the mirrors no longer hold; a failed update may still leave a usable list.
  const update = await tryTool('/usr/bin/apt-get', ['update', '-q'], { env });
  prepare?.();
  try {
    await runTool('/usr/bin/apt-get', ['install', '-y', '-q', '--no-install-recommends', ...names], { env });
  } catch (error) {
    const hint = update.code === 0 ? '' : '\n(apt-get update had failed before.)';
    throw new Error(`The Debian package ${list} could not be installed. ${error instanceof Error ? error.message : ''}${hint}`);
  }
}
