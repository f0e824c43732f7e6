/** Runs a transient analysis in ngspice and reads one curve back. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

import { runBatch } from './batch';

/** One curve: seconds and volts, as many of each. */
export interface Curve {
  readonly seconds: readonly number[];
  readonly volts: readonly number[];
}

/**
 * Works out a transient from the given first volts.
 * @param deck lines of the circuit, title first, without analysis and `.end`
 * @param node whose volts are read
 */
export function transient(
  deck: readonly string[],
  node: string,
  step: { stepSeconds: number; endSeconds: number; fromSeconds?: number },
): Curve {
  const { stepSeconds, endSeconds, fromSeconds = 0 } = step;
  const file = (folder: string): string => join(folder, 'curve.txt');
  return runBatch(
    (folder) => {
      const control = [
        '.control',
        'set wr_singlescale',
        'set numdgt=10',
        `tran ${String(stepSeconds)} ${String(endSeconds)} ${String(fromSeconds)} ${String(stepSeconds)} uic`,
        `wrdata ${file(folder)} V(${node})`,
        'quit',
        '.endc',
        '.end',
        '',
      ];
      return [...deck, '.options reltol=1e-5', ...control].join('\n');
    },
    (_, folder) => {
      const rows = readFileSync(file(folder), 'utf8')
        .trim()
        .split('\n')
        .map((line) => line.trim().split(/\s+/).map(Number));
      return { seconds: rows.map(([at]) => at ?? Number.NaN), volts: rows.map(([, value]) => value ?? Number.NaN) };
    },
  );
}

/** When a falling curve first reaches some volts, between its points by a straight line; NaN when it never does. */
export function secondsToReach({ seconds, volts }: Curve, wanted: number): number {
  const k = volts.findIndex((value) => value <= wanted);
  const [t0, t1, v0, v1] = [seconds[k - 1], seconds[k], volts[k - 1], volts[k]];
  if (t0 === undefined || t1 === undefined || v0 === undefined || v1 === undefined) return Number.NaN;
  return t0 + ((t1 - t0) * (v0 - wanted)) / (v0 - v1);
}
