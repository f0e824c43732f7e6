/** The whole product for a browser test: durable database, demo workshops, mail fake, object store, built client, server process. */
import { spawn, type ChildProcess } from 'node:child_process';
import { generateKeyPairSync, randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { startMailFake } from '@/server/adapters/fakes/mailFake';
import { startObjectStoreFake } from '@/server/adapters/fakes/objectStoreFake';
import type { Letter } from '@/server/adapters/fakes/readLetter';
import { buildWeb, webRoot } from '@/server/cli/buildWeb';
import type { DatabaseUrls } from '@/server/cli/cluster';
import { findFreePort } from '@/server/cli/freePort';
import { inProject, projectRoot } from '@/server/cli/projectFiles';
import { lastLines, runTool } from '@/server/cli/runTool';
import { openThrowAwayCluster } from '@/server/cli/throwAwayCluster';

export type Stack = DatabaseUrls & {
  /** Where the server answers; the same after every restart. */
  url: string;
  /** Kills the server process outright (SIGKILL), as a power cut would. */
  killServer(): Promise<void>;
  /** Starts it again on the same port; resolves when it is ready. */
  startServer(): Promise<void>;
  /** What the mail fake has received, oldest first. */
  letters(): Letter[];
  stop(): Promise<void>;
};

const readyWithinMs = 30_000;

/** Opens everything. The database keeps its durability settings: these tests kill what runs on it. */
export async function startStack(): Promise<Stack> {
  await buildWeb(() => undefined);
  const cluster = await openThrowAwayCluster({ durable: true });
  const letterFolder = mkdtempSync(join(tmpdir(), 'lampstep-letters-'));
  const mail = await startMailFake({ dir: letterFolder });
  const objectFolder = mkdtempSync(join(tmpdir(), 'lampstep-objects-'));
  const objects = await startObjectStoreFake({ dir: objectFolder });
  const port = await findFreePort(0);
  const url = `http://localhost:${String(port)}`;
  const env: NodeJS.ProcessEnv = {
    PATH: process.env['PATH'],
    HOME: process.env['HOME'],
    NODE_ENV: 'test',
    DATABASE_URL: cluster.serverUrl,
    DATABASE_OWNER_URL: cluster.ownerUrl,
    DATABASE_KEEPER_URL: cluster.keeperUrl,
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_URL: url,
    // One for all starts of this stack: a restart must not sign anybody out.
    SESSION_SECRET: randomBytes(32).toString('base64url'),
    SIGNING_KEY: JSON.stringify(generateKeyPairSync('ed25519').privateKey.export({ format: 'jwk' })),
    SMTP_URL: mail.smtpUrl,
    MAIL_FROM: 'Lampstep <lampstep@example.org>',
    BCRYPT_COST: '4',
    SIGN_IN_TRIES: '1000',
    ...objects.env,
    WEB_ROOT: webRoot,
    LOG_LEVEL: 'warn',
  };
  let server: ServerProcess | undefined;
  const stop = async () => {
    await server?.end('SIGTERM');
    await mail.stop();
    await objects.stop();
    await cluster.stop();
    rmSync(letterFolder, { recursive: true, force: true });
    rmSync(objectFolder, { recursive: true, force: true });
  };
  try {
    await runTool(process.execPath, ['--import', 'tsx', inProject('tests/e2e/prepare.ts')], { cwd: projectRoot, env });
    server = await openServer(env, url);
  } catch (error) {
    await stop();
    throw error;
  }
  return {
    url,
    ownerUrl: cluster.ownerUrl,
    serverUrl: cluster.serverUrl,
    keeperUrl: cluster.keeperUrl,
    killServer: async () => {
      await server?.end('SIGKILL');
      server = undefined;
    },
    startServer: async () => {
      if (server !== undefined) throw new Error('The server runs already.');
      server = await openServer(env, url);
    },
    letters: () => mail.letters(),
    stop,
  };
}

type ServerProcess = { end(signal: NodeJS.Signals): Promise<void> };

async function openServer(env: NodeJS.ProcessEnv, url: string): Promise<ServerProcess> {
  const child: ChildProcess = spawn(process.execPath, ['--import', 'tsx', inProject('server/main.ts')], { cwd: projectRoot, env, stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  const keep = (chunk: Buffer) => {
    output = (output + chunk.toString('utf8')).slice(-20_000);
  };
  child.stdout?.on('data', keep);
  child.stderr?.on('data', keep);
  const ended = new Promise<void>((resolve) => child.once('close', () => resolve()));
  const end = async (signal: NodeJS.Signals) => {
    child.kill(signal);
    await ended;
  };
  const givesUpAt = performance.now() + readyWithinMs;
  while (!(await isReady(url))) {
    if (child.exitCode !== null || performance.now() > givesUpAt) {
      await end('SIGKILL');
      throw new Error(`The server did not become ready. Its last words:\n${lastLines(output, 30)}`);
    }
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  return { end };
}

async function isReady(url: string): Promise<boolean> {
  try {
    return (await fetch(`${url}/readyz`)).ok;
  } catch {
    return false;
  }
}
