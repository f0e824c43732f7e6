/** Runs one transient in ngspice and reads its measures: an opinion from outside on our own solvers. */
import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';

const run = promisify(execFile);

/**
 * Runs a deck in batch.
 * @param deck lines of the circuit with its own `.tran` or `.op`, without title and `.end`
 * @param measures lines for the control block, such as `meas tran low min v(out) from=0.4 to=0.5` or `print v(out)`
 * @returns every `name = number` that ngspice printed
 */
export async function spiceMeasures(deck: readonly string[], measures: readonly string[]): Promise<ReadonlyMap<string, number>> {
  const folder = await mkdtemp(join(tmpdir(), 'spice-'));
  try {
    const file = join(folder, 'deck.cir');
    await writeFile(file, ['a check from outside', ...deck, '.control', 'run', ...measures, 'quit 0', '.endc', '.end', ''].join('\n'));
    const { stdout } = await run('ngspice', ['-b', file], { timeout: 60_000, maxBuffer: 64 * 1024 * 1024 });
    const found = [...stdout.matchAll(/^\s*([\w.#()]+)\s*=\s*([-+]?\d[\d.]*(?:e[-+]?\d+)?)/gim)];
    return new Map(found.map(([, name = '', value = '']) => [name.toLowerCase(), Number(value)]));
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
