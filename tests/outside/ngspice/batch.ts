/** One run of Debian's ngspice, in a folder of its own that goes with it. */
import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/**
 * Runs a deck in batch mode and reads what it left.
 * @param main makes the deck; it may put further files into the folder
 * @param read what it printed, and its folder
 */
export function runBatch<T>(main: (folder: string) => string, read: (printed: string, folder: string) => T, timeoutMs = 60_000): T {
  const folder = mkdtempSync(join(tmpdir(), 'ngspice-'));
  try {
    const deck = join(folder, 'main.cir');
    writeFileSync(deck, main(folder));
    const printed = execFileSync('ngspice', ['-b', deck], { encoding: 'utf8', timeout: timeoutMs, maxBuffer: 1 << 28, stdio: ['ignore', 'pipe', 'ignore'] });
    return read(printed, folder);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
