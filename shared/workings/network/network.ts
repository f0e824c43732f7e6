/** A direct-current network of wires, loads, supply outputs and diodes, and its volts and amps. */
import type { DiodeCard } from '@/shared/workings/network/diode';
import { diodeCurrent } from '@/shared/workings/network/diode';
import type { Mesh, TakenOut } from '@/shared/workings/network/mesh';
import { couple, emptyMesh, putBack, takeOut } from '@/shared/workings/network/mesh';
import type { Branch } from '@/shared/workings/network/newton';
import { settle } from '@/shared/workings/network/newton';
import type { LimitedSource } from '@/shared/workings/network/source';
import { sourceCurrent } from '@/shared/workings/network/source';

/** Nodes are numbers from 0; the one called `zero` is 0 V. */
export interface Resistor {
  readonly from: number;
  readonly to: number;
  readonly ohms: number;
}

/** A diode between two nodes. */
export interface Diode extends DiodeCard {
  readonly anode: number;
  readonly cathode: number;
}

/** A supply output between its terminal and its own 0 V. */
export interface Output extends LimitedSource {
  readonly terminal: number;
  readonly zero: number;
}

/** The whole network; `nodes` counts all of them, 0 V included and last. */
export interface Network {
  readonly nodes: number;
  readonly resistors: readonly Resistor[];
  readonly diodes: readonly Diode[];
  readonly outputs: readonly Output[];
}

/** What is different in one case: outputs that are off, resistors that are open, resistors added. */
export interface Variation {
  readonly off: readonly number[];
  readonly open: readonly number[];
  readonly added: readonly Resistor[];
}

/** Volts of every node, and amps of every branch in the order of the network. */
export interface Solution {
  readonly converged: boolean;
  readonly steps: number;
  readonly volts: Float64Array;
  /** Given out of each terminal, signed. */
  readonly outputAmps: readonly number[];
  /** From anode to cathode. */
  readonly diodeAmps: readonly number[];
}

/** What an output that is off, or on, lets through from its terminal to its 0 V: its own divider. Common practice, no source. */
export const OUTPUT_BLEED_OHMS = 10e3;
/** From every node to 0 V, so that a node which hangs on nothing is at 0 V and not nowhere. */
export const STRAY_SIEMENS = 1e-12;

/** A network made ready for many cases that open some of the same few resistors and add others between the same few nodes. */
export interface Prepared {
  readonly network: Network;
  readonly mesh: Mesh;
  readonly taken: TakenOut;
  /** Nodes of outputs and diodes: those that the search is over. */
  readonly active: readonly number[];
  /** Nodes that openings and additions touch and no output or diode does. */
  readonly touched: readonly number[];
  readonly mayOpen: readonly number[];
}

/**
 * Takes out once what no case changes.
 * @param mayOpen resistors that a case may open
 * @param mayAdd ends of resistors that a case may add
 */
export function prepare(network: Network, mayOpen: readonly number[], mayAdd: readonly Pick<Resistor, 'from' | 'to'>[]): Prepared {
  const zero = network.nodes - 1;
  const mesh = emptyMesh(network.nodes);
  for (let node = 0; node < zero; node += 1) couple(mesh, node, zero, STRAY_SIEMENS);
  const opening = new Set(mayOpen);
  network.resistors.forEach(({ from, to, ohms }, k) => {
    if (!opening.has(k)) couple(mesh, from, to, 1 / ohms);
  });
  for (const { terminal, zero: own } of network.outputs) couple(mesh, terminal, own, 1 / OUTPUT_BLEED_OHMS);
  const active = new Set([
    ...network.outputs.flatMap((output) => [output.terminal, output.zero]),
    ...network.diodes.flatMap((diode) => [diode.anode, diode.cathode]),
  ]);
  const touched = new Set([
    ...mayOpen.flatMap((k) => network.resistors[k] ?? []).flatMap(({ from, to }) => [from, to]),
    ...mayAdd.flatMap(({ from, to }) => [from, to]),
  ]);
  active.delete(zero);
  touched.delete(zero);
  for (const node of active) touched.delete(node);
  const rest = Array.from({ length: zero }, (_, node) => node).filter((node) => !active.has(node) && !touched.has(node));
  const { mesh: reduced, taken } = takeOut(mesh, rest);
  return { network, mesh: reduced, taken, active: [...active], touched: [...touched], mayOpen };
}

/** The resistors of one opening laid in and all but the active nodes taken out; it serves every set of outputs that are off. */
export interface Laid {
  readonly prepared: Prepared;
  readonly mesh: Mesh;
  readonly taken: TakenOut;
}

/** Lays one set of openings and additions into a prepared network. */
export function lay(prepared: Prepared, { open, added }: Omit<Variation, 'off'>): Laid {
  const mesh = { size: prepared.mesh.size, siemens: prepared.mesh.siemens.slice() };
  const opened = new Set(open);
  for (const k of prepared.mayOpen) {
    const resistor = prepared.network.resistors[k];
    if (resistor !== undefined && !opened.has(k)) couple(mesh, resistor.from, resistor.to, 1 / resistor.ohms);
  }
  for (const { from, to, ohms } of added) couple(mesh, from, to, 1 / ohms);
  const reduced = takeOut(mesh, prepared.touched);
  return { prepared, ...reduced };
}

/**
 * Solves one case.
 * @param off outputs, by their place in the network, that are off
 * @param start volts of an earlier solution to begin from
 */
export function solveLaid(laid: Laid, off: readonly number[], start?: Float64Array): Solution {
  const { network, active, taken } = laid.prepared;
  const isOff = new Set(off);
  const volts = start === undefined ? new Float64Array(network.nodes) : start.slice();
  const branches: Branch[] = network.diodes.map((diode) => ({
    from: diode.anode,
    to: diode.cathode,
    current: (across) => diodeCurrent(diode, across),
  }));
  network.outputs.forEach((output, k) => {
    if (isOff.has(k)) return;
    const current = (across: number) => {
      const { amps, siemens } = sourceCurrent(output, across);
      return { amps: -amps, siemens };
    };
    branches.push({ from: output.terminal, to: output.zero, current });
  });
  const { converged, steps } = settle(laid.mesh, active, branches, volts);
  putBack(laid.taken, volts);
  putBack(taken, volts);
  const between = (from: number, to: number): number => (volts[from] ?? 0) - (volts[to] ?? 0);
  return {
    converged,
    steps,
    volts,
    outputAmps: network.outputs.map((output, k) => (isOff.has(k) ? 0 : sourceCurrent(output, between(output.terminal, output.zero)).amps)),
    diodeAmps: network.diodes.map((diode) => diodeCurrent(diode, between(diode.anode, diode.cathode)).amps),
  };
}

/** Solves a network as it stands, with what a variation changes. */
export function solve(network: Network, { off, open, added }: Partial<Variation> = {}): Solution {
  return solveLaid(lay(prepare(network, open ?? [], added ?? []), { open: open ?? [], added: added ?? [] }), off ?? []);
}
