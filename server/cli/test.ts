/** `npm test`: everything that must hold, each as a claim with its duration, and one plain line of numbers at the end. */
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import { join } from 'node:path';

import { buildWeb } from './buildWeb';
import { ensureChromium, ensureNgspice, ensurePostgres } from './packages';
import { seconds, step } from './progress';
import { inProject, projectRoot, stateFolder } from './projectFiles';
import { runTool, tryTool } from './runTool';
import { sum, tallyOf, type Tally } from './testReport';

const say = (line: string) => console.log(line);
const abort = new AbortController();
const reports = join(stateFolder, 'reports');

/** What points a server at real services must never reach a test. */
const servicesOfTheCaller = [
  ...['DATABASE_URL', 'DATABASE_OWNER_URL', 'DATABASE_KEEPER_URL', 'HOST', 'PORT', 'PUBLIC_URL', 'TRUST_PROXY', 'SESSION_SECRET'],
  ...['SIGNING_KEY', 'SMTP_URL', 'MAIL_FROM', 'S3_BUCKET', 'S3_ENDPOINT', 'S3_REGION', 'S3_ACCESS_KEY', 'S3_SECRET_KEY', 'BCRYPT_COST', 'SIGN_IN_TRIES', 'WEB_ROOT', 'LOG_LEVEL', 'NODE_ENV'],
];

const env: NodeJS.ProcessEnv = { ...process.env, NO_COLOR: '1', FORCE_COLOR: '0' };
for (const name of servicesOfTheCaller) Reflect.deleteProperty(env, name);

type Claim = { says: string; tool: string; args: string[]; report?: string };

const tool = (name: string) => inProject('node_modules', name);
const tsc = tool('typescript/bin/tsc');
const vitest = (project: string, says: string): Claim => {
  const report = join(reports, `${project}.json`);
  return { says, tool: tool('vitest/vitest.mjs'), args: ['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`], report };
};

const together: Claim[] = [
  { says: 'Lint finds nothing', tool: tool('eslint/bin/eslint.js'), args: ['.', '--max-warnings', '0'] },
  { says: 'Server and tests type-check', tool: tsc, args: ['-p', 'tsconfig.server.json'] },
  { says: 'Pure rooms type-check without node or browser', tool: tsc, args: ['-p', 'tsconfig.pure.json'] },
  { says: 'Client type-checks, routes included', tool: tsc, args: ['-p', 'tsconfig.json'] },
  {
    says: 'Rooms import only what they may, without cycles',
    tool: tool('dependency-cruiser/bin/dependency-cruise.mjs'),
    args: ['app', 'flows', 'server', 'db', 'shared', 'tests'],
  },
  vitest('unit', 'Engine, quantities, workings, record and architecture hold'),
  vitest('ui', 'Parts of the interface do what they say'),
];
const alone: Claim[] = [
  vitest('api', 'Database and every route hold, denials included'),
  {
    says: 'People reach their goals in a browser',
    tool: tool('@playwright/test/cli.js'),
    args: ['test', '--reporter=list,json'],
    report: join(reports, 'e2e.json'),
  },
];

async function check(claim: Claim): Promise<Tally> {
  const begun = performance.now();
  if (claim.report !== undefined) rmSync(claim.report, { force: true });
  const { code, output } = await tryTool(process.execPath, [claim.tool, ...claim.args], {
    cwd: projectRoot,
    env: { ...env, ...(claim.report === undefined ? {} : { PLAYWRIGHT_JSON_OUTPUT_NAME: claim.report }) },
    signal: abort.signal,
  });
  // A check without a report of its own counts as one test.
  const report = claim.report !== undefined && existsSync(claim.report) ? readFileSync(claim.report, 'utf8') : undefined;
  const tally = claim.report === undefined ? { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 } : tallyOf(code, report);
  const numbers = claim.report === undefined ? '' : `, ${String(tally.passed)} passed${tally.failed === 0 ? '' : `, ${String(tally.failed)} failed`}`;
  say(`${tally.failed === 0 ? '✓' : '✗'} ${claim.says} (${seconds(begun)}${numbers})`);
  if (tally.failed > 0) say(output.trimEnd().replaceAll(/^/gm, '    '));
  return tally;
}

async function buildClient(): Promise<Tally> {
  try {
    await step(say, (done) => (done === 'built' ? 'Web client builds' : 'Web client is up to date'), () => buildWeb(() => undefined, abort.signal));
    return { passed: 1, failed: 0 };
  } catch (error) {
    say(`✗ Web client builds\n${error instanceof Error ? error.message : String(error)}`);
    return { passed: 0, failed: 1 };
  }
}

/** Works through the jobs in order, `lanes` of them at a time. */
async function inLanes<T>(lanes: number, jobs: (() => Promise<T>)[]): Promise<T[]> {
  const waiting = [...jobs];
  const results: T[] = [];
  const lane = async () => {
    for (let job = waiting.shift(); job !== undefined; job = waiting.shift()) results.push(await job());
  };
  await Promise.all(Array.from({ length: lanes }, lane));
  return results;
}

async function test(): Promise<Tally> {
  const begun = performance.now();
  mkdirSync(reports, { recursive: true });
  await ensurePostgres(say);
  await ensureChromium(say);
  await ensureNgspice(say);
  // Makes the types of the routes, so that a link to a screen that is not there fails the type check.
  await runTool(process.execPath, [tool('expo/bin/cli'), 'customize', 'tsconfig.json'], {
    cwd: projectRoot,
    env: { ...env, CI: '1', EXPO_NO_TELEMETRY: '1', EXPO_OFFLINE: '1' },
    signal: abort.signal,
  });
  // Two at a time; what a busy machine could push over a time limit comes afterwards, alone.
  const tallies = await inLanes(Math.min(2, availableParallelism()), [buildClient, ...together.map((claim) => () => check(claim))]);
  for (const claim of alone) tallies.push(await check(claim));
  say(`All in ${seconds(begun)}.`);
  return sum(tallies);
}

for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.once(signal, () => {
    abort.abort();
    say('Stopped before the end.');
    process.exit(130);
  });
}

try {
  const { passed, failed } = await test();
  say(`${String(passed)} passed, ${String(failed)} failed`);
  process.exitCode = failed === 0 ? 0 : 1;
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  say('0 passed, 1 failed');
  process.exitCode = 1;
}
