/** Turns the rows of the lost-return sheet into a network, or says which row cannot be. */
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { LostReturnInputs } from '@/shared/workings/lostReturnInputs';
import { diodeCard, wireOhms, ZERO_NODE } from '@/shared/workings/lostReturnInputs';
import { Joined } from '@/shared/workings/network/joined';
import type { Network, Resistor } from '@/shared/workings/network/network';
import type { SheetRefusal } from '@/shared/workings/sheet';

/** A load as the network has it. */
export interface ModelLoad {
  readonly name: string;
  readonly from: number;
  readonly to: number;
  /** Nominal volts across it, `from` against `to`; null where an end is neither fed nor returned. */
  readonly nominalVolts: number | null;
  /** Rails that it hangs on, by place. */
  readonly rails: readonly number[];
  readonly tolerance: number;
}

/** A return or a feed and where it stands among the resistors. */
export interface ModelWire {
  readonly name: string;
  readonly resistor: number;
}

/** The network with the names that people know it by. */
export interface LostReturnModel {
  readonly nodeNames: readonly string[];
  readonly network: Network;
  readonly rails: LostReturnInputs['rails'];
  readonly returns: readonly ModelWire[];
  /** The rows of the returns, in the same order. */
  readonly returnRows: LostReturnInputs['returns'];
  readonly feeds: readonly ModelWire[];
  readonly loads: readonly ModelLoad[];
  readonly diodes: LostReturnInputs['diodes'];
  /** For each rail what it gives once it is in limit, which is less where it folds back. */
  readonly shortedAmps: readonly number[];
  /** For each rail what makes it limit: its heaviest load all but shorted; null for a rail without load. */
  readonly overloads: readonly (Resistor | null)[];
}

/** In limit a rail is taken as held down to this share of its volts by its heaviest load. */
export const LIMIT_VOLTS_SHARE = 0.1;

const refuse = (field: string, say: string): SheetRefusal => ({ ok: false, field, say });

function twice(list: 'rails' | 'returns' | 'feeds' | 'diodes', given: LostReturnInputs): SheetRefusal | null {
  const seen = new Set<string>();
  for (const [k, { name }] of given[list].entries()) {
    if (seen.has(name)) return refuse(`${list}.${String(k)}.name`, `“${name}” is there twice; give each its own name.`);
    seen.add(name);
  }
  return null;
}

const terminalOf = (rail: LostReturnInputs['rails'][number]): string => rail.terminal ?? rail.name;

/** Every node that the rows name, with the field that names it first; 0 V comes last. */
function nodesOf(given: LostReturnInputs): Map<string, string> {
  const named = new Map<string, string>();
  const add = (node: string, field: string): void => {
    if (node !== ZERO_NODE && !named.has(node)) named.set(node, field);
  };
  given.rails.forEach((rail, k) => add(terminalOf(rail), `rails.${String(k)}.${rail.terminal === null ? 'name' : 'terminal'}`));
  for (const list of ['returns', 'feeds', 'loads'] as const) {
    given[list].forEach(({ from, to }, k) => {
      add(from, `${list}.${String(k)}.from`);
      add(to, `${list}.${String(k)}.to`);
    });
  }
  given.diodes.forEach(({ anode, cathode }, k) => {
    add(anode, `diodes.${String(k)}.anode`);
    add(cathode, `diodes.${String(k)}.cathode`);
  });
  return named;
}

/** A row that joins a node to itself, a wire without ohms, a load without amps and ohms. */
function badRow(given: LostReturnInputs): SheetRefusal | null {
  for (const [k, rail] of given.rails.entries()) {
    if (rail.volts === 0)
      return refuse(`rails.${String(k)}.volts`, `${rail.name} must be more or less than 0 V: a rail at 0 V is a return.`);
    if (rail.shortedAmps !== null && rail.shortedAmps > rail.limitAmps)
      return refuse(`rails.${String(k)}.shortedAmps`, `${rail.name}: amps when shorted must be the limit or less.`);
    if (terminalOf(rail) === ZERO_NODE)
      return refuse(`rails.${String(k)}.terminal`, `${rail.name} cannot have ${ZERO_NODE} for its terminal: it would be shorted.`);
  }
  for (const list of ['returns', 'feeds', 'loads'] as const) {
    for (const [k, row] of given[list].entries()) {
      if (row.from === row.to) return refuse(`${list}.${String(k)}.to`, `${row.name} starts and ends at “${row.from}”.`);
    }
  }
  for (const list of ['returns', 'feeds'] as const) {
    for (const [k, row] of given[list].entries()) {
      const ohms = wireOhms(row);
      if (ohms === null) return refuse(`${list}.${String(k)}.ohms`, `${row.name}: give its ohms, or its cross-section and length.`);
      if (ohms < 1e-5)
        return refuse(`${list}.${String(k)}.metres`, `${row.name} comes to less than 10 μΩ: check its cross-section and length.`);
    }
  }
  for (const [k, row] of given.diodes.entries()) {
    if (row.anode === row.cathode) return refuse(`diodes.${String(k)}.cathode`, `${row.name} has both ends at “${row.anode}”.`);
  }
  return null;
}

/** What wires alone join: two different rails, or a rail and 0 V, is a loop of sources. */
function sourceLoop(given: LostReturnInputs): SheetRefusal | null {
  const joined = new Joined();
  const railAt = (node: string) => given.rails.find((rail) => joined.same(terminalOf(rail), node));
  for (const [k, rail] of given.rails.entries()) {
    const other = given.rails.slice(0, k).find((before) => terminalOf(before) === terminalOf(rail));
    if (other !== undefined)
      return refuse(`rails.${String(k)}.terminal`, `${rail.name} and ${other.name} sit on one terminal and would fight each other.`);
  }
  for (const list of ['returns', 'feeds'] as const) {
    for (const [k, { name, from, to }] of given[list].entries()) {
      const [a, b] = [railAt(from), railAt(to)];
      const at = `${list}.${String(k)}.to`;
      const zeroAt = (node: string) => joined.same(ZERO_NODE, node);
      if (a !== undefined && b !== undefined && a !== b && a.volts !== b.volts)
        return refuse(at, `${name} joins ${a.name} and ${b.name} with nothing but wire: a loop of sources.`);
      const shorted = a !== undefined && zeroAt(to) ? a : b !== undefined && zeroAt(from) ? b : undefined;
      if (shorted !== undefined) return refuse(at, `${name} shorts ${shorted.name} to ${ZERO_NODE}: a loop of a source on itself.`);
      joined.join(from, to);
    }
  }
  return null;
}

function floating(given: LostReturnInputs, named: ReadonlyMap<string, string>): SheetRefusal | null {
  const joined = new Joined();
  for (const list of ['returns', 'feeds', 'loads'] as const) for (const { from, to } of given[list]) joined.join(from, to);
  for (const rail of given.rails) joined.join(terminalOf(rail), ZERO_NODE);
  const ends = [...given.returns, ...given.feeds, ...given.loads].flatMap(({ from, to }) => [from, to]);
  for (const [k, row] of given.loads.entries()) {
    for (const end of ['from', 'to'] as const) {
      const node = row[end];
      if (node === ZERO_NODE || given.rails.some((rail) => terminalOf(rail) === node) || ends.filter((other) => other === node).length > 1)
        continue;
      return refuse(`loads.${String(k)}.${end}`, `“${node}” floats: nothing else leads to it. Is it spelled the same in every row?`);
    }
  }
  for (const [node, field] of named) {
    if (!joined.same(node, ZERO_NODE))
      return refuse(
        field,
        `“${node}” floats: no rail, return, feed or load leads from it to ${ZERO_NODE}. Is it spelled the same in every row?`,
      );
  }
  return null;
}

/**
 * Builds the network of the sheet.
 * @returns the model, or the first row that cannot be with a sentence
 */
export function lostReturnModel(given: LostReturnInputs): LostReturnModel | SheetRefusal {
  const named = nodesOf(given);
  const wrong =
    twice('rails', given) ??
    twice('returns', given) ??
    twice('feeds', given) ??
    twice('diodes', given) ??
    badRow(given) ??
    sourceLoop(given) ??
    floating(given, named);
  if (wrong !== null) return wrong;
  const nodeNames = [...named.keys(), ZERO_NODE];
  const places = new Map(nodeNames.map((name, k) => [name, k]));
  const zero = nodeNames.length - 1;
  const place = (name: string): number => places.get(name) ?? zero;

  // What feeds and returns lead to, for the nominal volts between two nodes.
  const fed = new Joined();
  for (const { from, to } of [...given.feeds, ...given.returns]) fed.join(from, to);
  const railOf = (node: string): number => given.rails.findIndex((rail) => fed.same(terminalOf(rail), node));
  const nominalOf = (node: string): number | null => (fed.same(node, ZERO_NODE) ? 0 : (given.rails[railOf(node)]?.volts ?? null));

  const resistors: Resistor[] = [];
  const wires = (rows: LostReturnInputs['returns']): readonly ModelWire[] =>
    rows.map((row) => {
      resistors.push({ from: place(row.from), to: place(row.to), ohms: wireOhms(row) ?? 1 });
      return { name: row.name, resistor: resistors.length - 1 };
    });
  const returns = wires(given.returns);
  const feeds = wires(given.feeds);

  const loads: ModelLoad[] = [];
  const loadOhms: number[] = [];
  for (const [k, { name, from, to, amps, ohms }] of given.loads.entries()) {
    const [a, b] = [nominalOf(from), nominalOf(to)];
    const nominalVolts = a === null || b === null ? null : a - b;
    if (amps === null && ohms === null) return refuse(`loads.${String(k)}.amps`, `${name}: give its amps or its ohms.`);
    if (ohms === null && (nominalVolts === null || nominalVolts === 0))
      return refuse(
        `loads.${String(k)}.ohms`,
        `${name}: give its ohms; between “${from}” and “${to}” there are no nominal volts to take amps at.`,
      );
    const value = ohms ?? Math.abs(nominalVolts ?? 0) / (amps ?? 1);
    const rails = [railOf(from), railOf(to)].filter((rail) => rail >= 0);
    const tolerance = Math.max(0, ...rails.map((rail) => (given.rails[rail]?.tolerancePercent ?? 0) / 100));
    resistors.push({ from: place(from), to: place(to), ohms: value });
    loads.push({ name, from: place(from), to: place(to), nominalVolts, rails, tolerance });
    loadOhms.push(value);
  }
  const shortedAmps = given.rails.map(({ limitAmps, shortedAmps: shorted }) => shorted ?? limitAmps);
  const overloads = given.rails.map(({ volts }, rail): Resistor | null => {
    const own = loads.map((load, k) => ({ load, ohms: loadOhms[k] ?? Infinity })).filter(({ load }) => load.rails.includes(rail));
    const heaviest = own.sort((x, y) => x.ohms - y.ohms)[0];
    if (heaviest === undefined) return null;
    return { from: heaviest.load.from, to: heaviest.load.to, ohms: (LIMIT_VOLTS_SHARE * Math.abs(volts)) / (shortedAmps[rail] ?? 1) };
  });
  const network: Network = {
    nodes: nodeNames.length,
    resistors,
    diodes: given.diodes.map((row) => ({ ...diodeCard(row), anode: place(row.anode), cathode: place(row.cathode) })),
    outputs: given.rails.map((rail) => ({
      terminal: place(terminalOf(rail)),
      zero,
      volts: rail.volts,
      limitAmps: rail.limitAmps,
      takes: rail.takes === 'yes',
      outputOhms: rail.outputOhms,
    })),
  };
  return {
    nodeNames,
    network,
    rails: given.rails,
    returns,
    returnRows: given.returns,
    feeds,
    loads,
    diodes: given.diodes,
    shortedAmps,
    overloads,
  };
}

/** Printed volts, two figures and no milli: `−0.74 V` reads at a bench, `−740 mV` does not. */
export const shortVolts = (value: number): string => `${formatNumber(Math.abs(value) < 0.005 ? 0 : value, 2)} V`;
/** Printed amps. */
export const shortAmps = (value: number): string => formatQuantity(value, 'A', { digits: 2 });
/** Printed ohms. */
export const shortOhms = (value: number): string => formatQuantity(value, 'Ω', { digits: 2 });
