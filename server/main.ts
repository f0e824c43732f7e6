/** Starting the server, as a function for others and as a process of its own. */
import { realpathSync } from 'node:fs';
import { createServer } from 'node:http';
import type { Server } from 'node:http';
import { pathToFileURL } from 'node:url';

import { pino } from 'pino';
import type { Logger } from 'pino';

import { createDb } from '@/db/createDb';

import { startJobs } from './adapters/jobs';
import { createMailer } from './adapters/mail';
import { createObjectStore } from './adapters/objectStore';
import { readConfig } from './config';
import type { Config } from './config';
import { createApp } from './createApp';
import { mailTasks } from './mail/mailTasks';
import type { Parts } from './parts';
import { createProgramCache } from './program/programCache';
import { sessionTasks, sweepNightly } from './session/sweepSessions';

/** Requests under way get this long to finish when the server stops. */
const STOP_MS = 8_000;

/** Starts server and job worker; resolves when it listens. `stop` ends both and closes the database pool. */
export async function startServer(config: Config, log: Logger = pino({ level: config.logLevel })): Promise<{ port: number; stop: () => Promise<void> }> {
  const db = createDb(config.databaseUrl, { onBroken: (error) => log.warn({ err: error }, 'a database connection broke') });
  const parts: Parts = { db, config, clock: () => Date.now(), log, programs: createProgramCache(), objects: createObjectStore(config) };
  const server = createServer(createApp(parts));
  try {
    const port = await listen(server, config.host, config.port);
    const publicUrl = config.publicUrl ?? `http://localhost:${String(port)}`;
    const mailer = createMailer(config, log);
    const jobs = await startJobs(config.databaseUrl, { ...mailTasks({ db, mailer, publicUrl }), ...sessionTasks(parts) }, log, [sweepNightly]);
    log.info({ port, host: config.host }, 'listening');
    let stopping: Promise<void> | undefined;
    const stop = async () => {
      const closed = new Promise<void>((resolve) => server.close(() => resolve()));
      server.closeIdleConnections();
      const late = setTimeout(() => server.closeAllConnections(), STOP_MS);
      await closed;
      clearTimeout(late);
      await jobs.stop();
      mailer.close();
      parts.objects.close();
      await db.destroy();
    };
    return { port, stop: () => (stopping ??= stop()) };
  } catch (error) {
    server.close();
    await db.destroy();
    throw error;
  }
}

function listen(server: Server, host: string, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      const address = server.address();
      resolve(typeof address === 'object' && address !== null ? address.port : port);
    });
  });
}

// A path that is a link is followed, as Node follows it for the module itself.
if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(realpathSync(process.argv[1])).href) {
  try {
    const { stop } = await startServer(readConfig(process.env));
    for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => void stop().then(() => process.exit(0)));
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exitCode = 1;
  }
}
