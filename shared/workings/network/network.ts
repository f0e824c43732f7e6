/** A direct-current network of wires, loads, supply outputs and diodes, and its volts and amps. */
import type { DiodeCard } from '@/shared/workings/network/diode';
import { diodeCurrent } from '@/shared/workings/network/diode';
import type { Mesh, TakenNode } from '@/shared/workings/network/mesh';
import { compact, couple, emptyMesh, putBack, takeOut } from '@/shared/workings/network/mesh';
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
  /** Couplings between what is left: first the active nodes, then the touched ones, then 0 V. */
  readonly mesh: Mesh;
  /** The nodes left, by their numbers in the network. */
  readonly kept: readonly number[];
  /** Where each node of the network stands among those left; −1 for one taken out. */
  readonly places: Int32Array;
  readonly taken: readonly TakenNode[];
  /** Nodes of outputs and diodes, as counted among those left: those that the search is over. */
  readonly active: readonly number[];
  /** Nodes that openings and additions touch and no output or diode does, counted likewise. */
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
  const taken = takeOut(mesh, rest);
  const kept = [...active, ...touched, zero];
  const places = new Int32Array(network.nodes).fill(-1);
  kept.forEach((node, place) => (places[node] = place));
  const countFrom = (first: number, count: number): readonly number[] => Array.from({ length: count }, (_, k) => first + k);
  return {
    network,
    mesh: compact(mesh, kept),
    kept,
    places,
    taken,
    active: countFrom(0, active.size),
    touched: countFrom(active.size, touched.size),
    mayOpen,
  };
}

/** The resistors of one opening laid in and all but the active nodes taken out; it serves every set of outputs that are off. */
export interface Laid {
  readonly prepared: Prepared;
  readonly mesh: Mesh;
  readonly taken: readonly TakenNode[];
  readonly diodes: readonly Branch[];
  readonly outputs: readonly Branch[];
}

/** Lays one set of openings and additions into a prepared network. */
export function lay(prepared: Prepared, { open, added }: Omit<Variation, 'off'>): Laid {
  const { network, places } = prepared;
  const place = (node: number): number => places[node] ?? 0;
  const mesh = { size: prepared.mesh.size, siemens: prepared.mesh.siemens.slice() };
  for (const k of prepared.mayOpen) {
    const resistor = network.resistors[k];
    if (resistor !== undefined && !open.includes(k)) couple(mesh, place(resistor.from), place(resistor.to), 1 / resistor.ohms);
  }
  for (const { from, to, ohms } of added) couple(mesh, place(from), place(to), 1 / ohms);
  const diodes = network.diodes.map((diode): Branch => ({
    from: place(diode.anode),
    to: place(diode.cathode),
    current: (across) => diodeCurrent(diode, across),
  }));
  const outputs = network.outputs.map((output): Branch => ({
    from: place(output.terminal),
    to: place(output.zero),
    current: (across) => {
      const { amps, siemens } = sourceCurrent(output, across);
      return { amps: -amps, siemens };
    },
  }));
  return { prepared, mesh, taken: takeOut(mesh, prepared.touched), diodes, outputs };
}

/**
 * Solves one case.
 * @param off outputs, by their place in the network, that are off
 * @param start volts of an earlier solution to begin from
 */
export function solveLaid(laid: Laid, off: readonly number[], start?: Float64Array): Solution {
  const { network, active, kept } = laid.prepared;
  const left = new Float64Array(kept.length);
  if (start !== undefined) for (const place of active) left[place] = start[kept[place] ?? 0] ?? 0;
  const on = laid.outputs.filter((_, k) => !off.includes(k));
  const { converged, steps } = settle(laid.mesh, active, [...laid.diodes, ...on], left);
  putBack(laid.taken, left);
  const volts = new Float64Array(network.nodes);
  kept.forEach((node, place) => (volts[node] = left[place] ?? 0));
  putBack(laid.prepared.taken, volts);
  const amps = ({ from, to, current }: Branch): number => current((left[from] ?? 0) - (left[to] ?? 0)).amps;
  return {
    converged,
    steps,
    volts,
    outputAmps: laid.outputs.map((branch, k) => (off.includes(k) ? 0 : -amps(branch))),
    diodeAmps: laid.diodes.map(amps),
  };
}

/** Solves a network as it stands, with what a variation changes. */
export function solve(network: Network, { off, open, added }: Partial<Variation> = {}): Solution {
  return solveLaid(lay(prepare(network, open ?? [], added ?? []), { open: open ?? [], added: added ?? [] }), off ?? []);
}
