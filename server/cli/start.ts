/** `npm start`: from a bare checkout to a running workshop, and cleanly down again on a signal. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';

import { migrateToLatest } from '@/db/migrate';
import { DEMO_PASSWORD, demoPeople, demoWorkshops } from '@/db/seeds/demoPeople';
import { loadDemo } from '@/db/seeds/loadDemo';
import { startMailFake } from '@/server/adapters/fakes/mailFake';
import { startObjectStoreFake } from '@/server/adapters/fakes/objectStoreFake';
import { readConfig } from '@/server/config';
import { startServer } from '@/server/main';

import { buildWeb, webRoot } from './buildWeb';
import { openCluster } from './cluster';
import { devKeys } from './devKeys';
import { findFreePort, isPortFree } from './freePort';
import { step } from './progress';
import { inProject, stateFolder } from './projectFiles';
import { planStart, type StartPlan } from './startPlan';
import { takeStartLock } from './startLock';
import { untilStopped, type Parts } from './untilStopped';

const say = (line: string) => console.log(line);

async function start(parts: Parts): Promise<void> {
  const begun = performance.now();
  if (existsSync(inProject('.env'))) process.loadEnvFile(inProject('.env'));
  const plan = planStart(process.env);
  const env: Record<string, string | undefined> = { ...process.env };
  // What production lacks is told before anything is touched.
  if (!plan.demo) readConfig(env);

  let note: (url: string) => void = () => undefined;
  if (plan.database === 'private') {
    const lock = takeStartLock(join(stateFolder, 'start.json'));
    parts.closeWith(() => lock.release());
    note = (url) => lock.note(url);
    const cluster = await step(say, (c) => `Database on 127.0.0.1:${String(c.port)}, kept in ${c.dir}`, () =>
      openCluster({ dir: join(stateFolder, 'cluster'), port: 55432, durable: true, say }),
    );
    parts.closeWith(() => cluster.stop());
    Object.assign(env, { DATABASE_URL: cluster.serverUrl, DATABASE_OWNER_URL: cluster.ownerUrl, DATABASE_KEEPER_URL: cluster.keeperUrl });
  }
  parts.goOn();
  const ownerUrl = env['DATABASE_OWNER_URL'] ?? '';
  await step(say, 'Database schema is up to date', () => migrateToLatest(ownerUrl));
  parts.goOn();
  if (plan.demo) await step(say, (done) => `Demo workshops ${done}`, () => loadDemo({ ownerUrl }));
  parts.goOn();
  if ((env['WEB_ROOT'] ?? '') === '') {
    await step(say, (done) => (done === 'built' ? 'Web client built' : 'Web client is up to date'), () => buildWeb(say, parts.signal));
    env['WEB_ROOT'] = webRoot;
  }
  parts.goOn();
  if (plan.mailFake) {
    const dir = join(stateFolder, 'mail');
    const fake = await startMailFake({ dir });
    parts.closeWith(() => fake.stop());
    env['SMTP_URL'] = fake.smtpUrl;
    say(`✓ Local mail fake: no letter leaves this machine, each is kept in ${dir}`);
  }
  if (plan.storeFake) {
    const dir = join(stateFolder, 'objects');
    const fake = await startObjectStoreFake({ dir });
    parts.closeWith(() => fake.stop());
    Object.assign(env, fake.env);
    say(`✓ Local object store: photos and papers are kept in ${dir}`);
  }
  if (plan.demo) completeForDevelopment(env);

  const config = readConfig({ ...env, PORT: String(await choosePort(env, plan)) });
  const server = await startServer(config);
  parts.closeWith(() => server.stop());
  const url = config.publicUrl ?? `http://localhost:${String(server.port)}`;
  note(url);
  say(`✓ Server started (${((performance.now() - begun) / 1000).toFixed(1)} s in all)\n`);
  say(`Lampstep is at ${url}`);
  if (plan.demo) {
    say(`Demo accounts, all with the password ${DEMO_PASSWORD}:`);
    for (const person of Object.values(demoPeople)) {
      if (person.account) say(`  ${person.mail.padEnd(24)}${person.roles.join(', ')} at ${demoWorkshops[person.workshop].name}`);
    }
  }
  say('Ctrl-C stops it.');
}

function completeForDevelopment(env: Record<string, string | undefined>): void {
  const keys = devKeys(join(stateFolder, 'keys.json'));
  for (const [name, value] of Object.entries({ ...keys, LOG_LEVEL: 'warn' })) {
    if ((env[name] ?? '') === '') env[name] = value;
  }
}

async function choosePort(env: Record<string, string | undefined>, plan: StartPlan): Promise<number> {
  // Read once for its check and its default; the secrets are not needed for that.
  const { host, port } = readConfig(env);
  if (port === 0 || (await isPortFree(port, host))) return port;
  if (!plan.mayMovePort) throw new Error(`Port ${String(port)} on ${host} is taken by another program.`);
  const other = await findFreePort(port + 1, host);
  say(`Port ${String(port)} is taken by another program: the server uses ${String(other)}.`);
  return other;
}

untilStopped(start, say).then(
  // Nothing must keep a stopped program alive: what still holds the event loop is a finished part's idle timer.
  () => process.exit(0),
  (error: unknown) => {
    console.error(error instanceof Error ? error.message : error);
    process.exit(1);
  },
);
