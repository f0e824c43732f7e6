import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { takeStartLock } from '@/server/cli/startLock';

describe('takeStartLock', () => {
  let dir: string;
  let path: string;

  beforeEach(() => {
    dir = mkdtempSync(join(tmpdir(), 'lampstep-lock-'));
    path = join(dir, 'deep', 'start.json');
  });

  afterEach(() => rmSync(dir, { recursive: true }));

  it('refuses while another start lives, and says where it answers', async () => {
    const other = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)', 'bootstrap.mjs']);
    await new Promise((resolve) => other.once('spawn', resolve));
    takeStartLock(path);
    writeFileSync(path, JSON.stringify({ pid: other.pid, url: 'http://localhost:8080' }));
    expect(() => takeStartLock(path)).toThrow(`already runs from this folder (process ${String(other.pid)}, http://localhost:8080)`);

    const ended = new Promise((resolve) => other.once('close', resolve));
    other.kill('SIGKILL');
    await ended;
    expect(() => takeStartLock(path)).not.toThrow();
  });

  it('takes over what a crash has left: a number now of another program, or half a file', () => {
    takeStartLock(path);
    writeFileSync(path, JSON.stringify({ pid: 1 }));
    expect(() => takeStartLock(path)).not.toThrow();
    writeFileSync(path, '{"pid":');
    expect(() => takeStartLock(path)).not.toThrow();
  });

  it('is free again after release', () => {
    takeStartLock(path).release();
    expect(() => takeStartLock(path)).not.toThrow();
  });
});
