/**
 * `npm start` and `npm test` on a machine where nothing is installed yet: plain JavaScript without a dependency.
 * Checks Node.js, installs the modules of the lock file when they are missing or other ones, then hands over.
 */
import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../../', import.meta.url));
const verbs = ['start', 'test'];

/** What is wrong with this Node.js, or undefined. `engines` is the form that package.json uses: `>=20.19 <21`. */
export function nodeFault(version, engines) {
  const range = /^>=(\d+)\.(\d+) <(\d+)$/.exec(engines);
  if (range === null) throw new Error(`package.json names the engine as “${engines}”, which is not of the form >=20.19 <21.`);
  const [leastMajor, leastMinor, below] = range.slice(1).map(Number);
  const [major, minor] = version.replace(/^v/, '').split('.').map(Number);
  const fits = major < below && (major > leastMajor || (major === leastMajor && minor >= leastMinor));
  return fits ? undefined : `Lampstep needs Node.js ${engines}; this is ${version}.`;
}

/**
 * True when `installed` (npm's own list of what lies in node_modules) holds what `lock` asks for. A package for another
 * kind of machine may be absent, and what the lock file itself calls extraneous; nothing else may.
 */
export function fitsLock(lock, installed) {
  return Object.entries(lock.packages).every(([path, wanted]) => {
    if (path === '') return true;
    const found = installed.packages[path];
    return found === undefined ? wanted.optional === true || wanted.extraneous === true : found.version === wanted.version;
  });
}

function readJson(path) {
  return JSON.parse(readFileSync(new URL(path, `file://${root}`), 'utf8'));
}

function modulesAreThere() {
  const list = `${root}node_modules/.package-lock.json`;
  if (!existsSync(list)) return false;
  try {
    return fitsLock(readJson('package-lock.json'), readJson('node_modules/.package-lock.json'));
  } catch {
    return false;
  }
}

function installModules() {
  const begun = Date.now();
  const seconds = () => Math.round((Date.now() - begun) / 1000);
  console.log('Installing the node modules of package-lock.json (about a minute) …');
  const ticking = setInterval(() => console.log(`  … still installing, ${seconds()} s`), 15_000);
  // npm's own script when npm started this, so that the same npm installs; development packages are part of both commands.
  const npm = process.env.npm_execpath;
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const [command, all] = npm !== undefined && npm.endsWith('.js') ? [process.execPath, [npm, ...args]] : ['npm', args];
  return new Promise((resolve, reject) => {
    const child = spawn(command, all, { cwd: root, stdio: ['ignore', 'inherit', 'inherit'] });
    const stop = (signal) => child.kill(signal);
    process.once('SIGINT', stop);
    process.once('SIGTERM', stop);
    child.on('error', (error) => reject(new Error(`npm could not be run: ${error.message}`)));
    child.on('close', (code) => {
      process.off('SIGINT', stop);
      process.off('SIGTERM', stop);
      if (code === 0) {
        console.log(`✓ Node modules installed (${seconds()} s)`);
        resolve();
      } else {
        reject(new Error('The node modules could not be installed; npm’s own words are above.'));
      }
    });
  }).finally(() => clearInterval(ticking));
}

async function main(verb) {
  const fault = nodeFault(process.version, readJson('package.json').engines.node);
  if (fault !== undefined) throw new Error(fault);
  if (!verbs.includes(verb)) throw new Error(`Usage: node server/cli/bootstrap.mjs ${verbs.join('|')}`);
  process.chdir(root);
  if (!modulesAreThere()) await installModules();
  // TypeScript runs in this same process: one process to signal, and none left over.
  const { register } = await import('tsx/esm/api');
  register();
  await import(new URL(`${verb}.ts`, import.meta.url).href);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  main(process.argv[2]).catch((error) => {
    console.error(error instanceof Error ? error.message : error);
    process.exitCode = 1;
  });
}
