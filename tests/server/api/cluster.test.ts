import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, type AddressInfo, type Server } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { openCluster, type Cluster } from '@/server/cli/cluster';
import { isRoot } from '@/server/cli/packages';

// One cluster goes through all that can happen to it; the tests stand in that order.
describe('openCluster', () => {
  const top = mkdtempSync(join(tmpdir(), 'lampstep-cluster-'));
  const dir = join(top, 'cluster');
  const data = join(dir, 'data');
  const lock = join(data, 'postmaster.pid');
  const said: string[] = [];
  let cluster: Cluster;

  const open = (port = 0) => openCluster({ dir, port, durable: true, say: (line) => said.push(line) });
  const ask = async (url: string, sql: string): Promise<unknown[]> => {
    const client = new Client({ connectionString: url });
    await client.connect();
    try {
      return (await client.query<Record<string, unknown>>(sql)).rows;
    } finally {
      await client.end();
    }
  };
  const marks = () => ask(cluster.ownerUrl, 'SELECT word FROM mark ORDER BY word');

  beforeAll(async () => {
    // The cluster's user must get through to it.
    chmodSync(top, 0o755);
    cluster = await open();
    await ask(cluster.ownerUrl, `CREATE TABLE mark (word text); INSERT INTO mark VALUES ('kept')`);
  });

  afterAll(async () => {
    await cluster.stop();
    rmSync(top, { recursive: true, force: true });
  });

  it('keeps every durability setting on and listens on the loopback address alone', async () => {
    const names = ['fsync', 'synchronous_commit', 'full_page_writes', 'listen_addresses', 'unix_socket_directories'];
    const rows = await ask(cluster.adminUrl, `SELECT ${names.map((name) => `current_setting('${name}') AS ${name}`).join(', ')}`);
    expect(rows).toEqual([{ fsync: 'on', synchronous_commit: 'on', full_page_writes: 'on', listen_addresses: '127.0.0.1', unix_socket_directories: '' }]);
  });

  it('does not run as root', () => {
    const pid = Number(readFileSync(lock, 'utf8').split('\n')[0]);
    expect(/^Uid:\s+(\d+)/m.exec(readFileSync(`/proc/${String(pid)}/status`, 'utf8'))?.[1]).not.toBe('0');
  });

  it('finds its content again after a stop and a start', async () => {
    await cluster.stop();
    expect(existsSync(lock)).toBe(false);
    cluster = await open();
    expect(await marks()).toEqual([{ word: 'kept' }]);
  });

  it('takes over a server that a killed start has left running', async () => {
    said.length = 0;
    const again = await open();
    expect(again.port).toBe(cluster.port);
    expect(said.join('\n')).toContain('still running from before');
    cluster = again;
  });

  it('recovers what was committed after the server was killed', async () => {
    await ask(cluster.serverUrl, 'SELECT 1');
    await ask(cluster.ownerUrl, `INSERT INTO mark VALUES ('at the last moment')`);
    process.kill(Number(readFileSync(lock, 'utf8').split('\n')[0]), 'SIGKILL');
    expect(existsSync(lock)).toBe(true);
    cluster = await open();
    expect(await marks()).toEqual([{ word: 'at the last moment' }, { word: 'kept' }]);
  });

  it('is not kept off by a lock whose number belongs to another program now', async () => {
    const text = readFileSync(lock, 'utf8');
    await cluster.stop();
    writeFileSync(lock, text.replace(/^\d+/, String(process.pid)));
    cluster = await open();
    expect(await marks()).toHaveLength(2);
  });

  it('moves to the next port when one is taken, and says so', async () => {
    await cluster.stop();
    const guest = await listen();
    const taken = (guest.address() as AddressInfo).port;
    said.length = 0;
    cluster = await open(taken);
    guest.close();
    expect(cluster.port).toBeGreaterThan(taken);
    expect(said).toContain(`Port ${String(taken)} is taken: the database uses ${String(cluster.port)}.`);
  });

  it('refuses to open a lasting cluster with the settings of a throw-away one', async () => {
    await expect(openCluster({ dir, port: 0, durable: false, say: () => undefined })).rejects.toThrow('was made to last');
  });

  it('makes a half-made one anew', async () => {
    const half = join(top, 'half');
    mkdirSync(join(half, 'data', 'base'), { recursive: true });
    writeFileSync(join(half, 'data', 'PG_VERSION'), '15\n');
    said.length = 0;
    const made = await openCluster({ dir: half, port: 0, durable: true, say: (line) => said.push(line) });
    try {
      expect(said.join('\n')).toContain('half-made');
      expect(await ask(made.serverUrl, 'SELECT current_database() AS name')).toEqual([{ name: 'lampstep' }]);
    } finally {
      await made.stop();
    }
  });

  it('never throws away a cluster whose passwords cannot be read', async () => {
    await cluster.stop();
    const made = join(dir, 'made.json');
    const text = readFileSync(made, 'utf8');
    writeFileSync(made, text.slice(0, 20));
    await expect(open()).rejects.toThrow('cannot be read');
    writeFileSync(made, text);
    cluster = await open();
    expect(await marks()).toHaveLength(2);
  });

  it('finds another place, and says so, where the user that runs it cannot go', async () => {
    const closed = join(top, 'closed');
    mkdirSync(closed, { mode: 0o700 });
    said.length = 0;
    const moved = await openCluster({ dir: join(closed, 'cluster'), port: 0, durable: true, say: (line) => said.push(line) });
    try {
      expect(await ask(moved.serverUrl, 'SELECT current_database() AS name')).toEqual([{ name: 'lampstep' }]);
      // Only root has another user run the database; anybody else reaches the own folder.
      expect(said.some((line) => line.includes('cannot reach'))).toBe(isRoot());
    } finally {
      await moved.stop();
      rmSync(moved.dir, { recursive: true });
    }
  });
});

function listen(): Promise<Server> {
  const server = createServer();
  return new Promise((resolve) => server.listen(0, '127.0.0.1', () => resolve(server)));
}
