/** Runs Debian's ngspice on many small decks in one process and reads the node volts back. */
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';

import type { Network, Variation } from '@/shared/workings/network/network';
import { OUTPUT_BLEED_OHMS } from '@/shared/workings/network/network';

import { runBatch } from './batch';

const TIGHT = '.options reltol=1e-7 abstol=1e-13 vntol=1e-9 gmin=1e-12 itl1=500';

/**
 * The network of a case as a deck: the same diode card, outputs as a voltage behind a current that ramps up to the limit.
 * Nodes are n0, n1 …; the last one is ground.
 */
export function networkDeck(network: Network, { off, open, added }: Variation): string {
  const zero = network.nodes - 1;
  const name = (node: number): string => (node === zero ? '0' : `n${String(node)}`);
  const lines = ['* supply, wires, loads'];
  const opened = new Set(open);
  [...network.resistors.filter((_, k) => !opened.has(k)), ...added].forEach(({ from, to, ohms }, k) => {
    if (from !== to) lines.push(`R${String(k)} ${name(from)} ${name(to)} ${String(ohms)}`);
  });
  for (let node = 0; node < zero; node += 1) lines.push(`Rstray${String(node)} n${String(node)} 0 1e12`);
  network.diodes.forEach(({ anode, cathode, saturationAmps, emission, seriesOhms }, k) => {
    lines.push(`D${String(k)} ${name(anode)} ${name(cathode)} d${String(k)}`);
    lines.push(`.model d${String(k)} D(IS=${String(saturationAmps)} N=${String(emission)} RS=${String(seriesOhms)})`);
  });
  network.outputs.forEach(({ terminal, zero: own, volts, limitAmps, takes, outputOhms }, k) => {
    lines.push(`Rbleed${String(k)} ${name(terminal)} ${name(own)} ${String(OUTPUT_BLEED_OHMS)}`);
    if (off.includes(k)) return;
    const [least, most] = volts > 0 ? [takes ? -limitAmps : 0, limitAmps] : [-limitAmps, takes ? limitAmps : 0];
    // Where to begin: at the volts that it is set to. The answer must not depend on it.
    lines.push(`.nodeset V(${name(terminal)})=${String(volts)}`);
    lines.push(`Vset${String(k)} s${String(k)} ${name(own)} ${String(volts)}`);
    const across = `V(s${String(k)},${name(terminal)})`;
    lines.push(
      `Bout${String(k)} s${String(k)} ${name(terminal)} I=min(max(${across}/${String(outputOhms)},${String(least)}),${String(most)})`,
    );
  });
  return [...lines, TIGHT, '.end', ''].join('\n');
}

/**
 * Solves the operating point of each deck, all in one process.
 * @returns volts by node name of each; a deck that ngspice did not settle has no entry
 */
export function operatingPoints(decks: readonly string[], timeoutMs = 120_000): ReadonlyMap<number, ReadonlyMap<string, number>> {
  return runBatch(
    (folder) => {
      const control = ['* every deck in turn', '.control', 'set numdgt=12', 'set noaskquit'];
      decks.forEach((deck, k) => {
        const file = join(folder, `${String(k)}.cir`);
        writeFileSync(file, deck);
        control.push(`source ${file}`, 'op', `echo deck ${String(k)}`, 'print all', 'destroy all', 'remcirc');
      });
      return [...control, 'quit', '.endc', '.end', ''].join('\n');
    },
    readPoints,
    timeoutMs,
  );
}

function readPoints(output: string): ReadonlyMap<number, ReadonlyMap<string, number>> {
  const points = new Map<number, Map<string, number>>();
  let now = new Map<string, number>();
  for (const line of output.split('\n')) {
    const deck = /^deck (\d+)/.exec(line)?.[1];
    if (deck !== undefined) {
      now = new Map();
      points.set(Number(deck), now);
    }
    const [, name, value] = /^(\S+) = (\S+)/.exec(line) ?? [];
    if (name !== undefined && value !== undefined) now.set(name, Number(value));
  }
  return points;
}
