import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';

import { describe, expect, it } from 'vitest';

import { projectRoot } from '@/server/cli/projectFiles';

/** A program of two parts; the second can hang while it closes, or fail while it opens. */
function program(second: string): { child: ChildProcess; lines: string[]; saw: (line: string) => Promise<void> } {
  const source = `
    import { untilStopped } from '@/server/cli/untilStopped';
    untilStopped(async (parts) => {
      parts.closeWith(() => console.log('first closed'));
      ${second}
      console.log('open');
      setInterval(() => undefined, 1000);
    }, console.log).then(() => process.exit(0), (error) => { console.log('failed: ' + error.message); process.exit(1); });`;
  const child = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', source], { cwd: projectRoot, stdio: ['ignore', 'pipe', 'inherit'] });
  const lines: string[] = [];
  const reader = createInterface({ input: child.stdout });
  reader.on('line', (line) => lines.push(line));
  const saw = async (wanted: string) => {
    while (!lines.some((line) => line.includes(wanted))) await once(reader, 'line');
  };
  return { child, lines, saw };
}

// Each test starts a process.
describe('untilStopped', { timeout: 30_000 }, () => {
  it.each(['SIGINT', 'SIGTERM'] as const)('closes what is open, last first, on %s', async (signal) => {
    const { child, lines, saw } = program(`parts.closeWith(() => console.log('second closed'));`);
    await saw('open');
    child.kill(signal);
    const [code] = (await once(child, 'close')) as [number];
    expect(lines.slice(-2)).toEqual(['second closed', 'first closed']);
    expect(code).toBe(0);
  });

  it('closes what is open when a part fails to open', async () => {
    const { child, lines } = program(`throw new Error('no room');`);
    const [code] = (await once(child, 'close')) as [number];
    expect(lines).toEqual(['first closed', 'failed: no room']);
    expect(code).toBe(1);
  });

  it('goes on closing when one part does not close cleanly', async () => {
    const { child, lines, saw } = program(`parts.closeWith(() => { throw new Error('stuck'); });`);
    await saw('open');
    child.kill('SIGTERM');
    await once(child, 'close');
    expect(lines.slice(-2)).toEqual(['A part did not stop cleanly: stuck', 'first closed']);
  });

  it('takes the same press twice for one, and a later one for an order to end at once', async () => {
    const { child, lines, saw } = program(`parts.closeWith(() => new Promise((r) => { console.log('hangs'); setTimeout(() => console.log('ripe'), 700); }));`);
    await saw('open');
    child.kill('SIGINT');
    child.kill('SIGINT');
    await saw('hangs');
    await saw('ripe');
    child.kill('SIGINT');
    const [code] = (await once(child, 'close')) as [number];
    expect(code).toBe(130);
    expect(lines).not.toContain('first closed');
  });
});
