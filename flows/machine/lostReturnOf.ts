/** The network of the lost-return sheet as a machine's profile has it. */
import type { z } from 'zod';

import type { lostReturnInputs } from '@/shared/workings/lostReturnInputs';
import { ZERO_NODE } from '@/shared/workings/lostReturnInputs';

import type { Conductor, Profile, Rail } from '../document/profile';

type Inputs = z.input<typeof lostReturnInputs>;
type Board = Profile['boards']['fitted'][number];

/** The sheet's own bounds on how many rails and returns it works out. */
const MOST_RAILS = 8;
const MOST_RETURNS = 16;

/** Kinds of device that let current through the wrong way when a rail is pulled past its 0 V. */
const CONDUCTS_REVERSED = ['diode', 'schottky', 'rectifier'];

/**
 * Rails, wires, boards and diodes of a machine as rows of the lost-return sheet. Where the profile does not say at which return a
 * board hangs, it is the one that serves most of the board's rails; where it names no diode at a rail, the current takes the way
 * through the rail's own rectifier, two junctions of unknown rating. Common practice, no source.
 * @returns inputs in SI, or null for a machine without returns, or with more rails or returns than the sheet works out
 */
export function lostReturnOf(profile: Profile): Inputs | null {
  const returns = profile.conductors.filter((c) => c.kind === 'return');
  const feeds = profile.conductors.filter((c) => c.kind === 'feed');
  if (returns.length === 0 || returns.length > MOST_RETURNS || profile.rails.length > MOST_RAILS) return null;
  const node = nodeNamer(profile, returns);
  const terminal = terminalsOf(profile);
  const fedNode = (feed: Conductor, rail: Rail): string => `${terminal(rail)}, ${node(feed.to)}`;
  const railOf = (id: string | null | undefined): Rail | undefined => profile.rails.find((r) => r.id === id);

  const feedRows = feeds.flatMap((feed) => {
    const rail = railOf(feed.rails[0]);
    return rail === undefined ? [] : [{ ...wireRow(feed), from: terminal(rail), to: fedNode(feed, rail) }];
  });
  const returnRows = returns.flatMap((conductor) => {
    const before = returns.find((other) => other !== conductor && node(other.to) === node(conductor.from));
    const [from, to] = [before === undefined ? ZERO_NODE : node(conductor.from), node(conductor.to)];
    return from === to ? [] : [{ ...wireRow(conductor), from, to }];
  });
  const loadNode = (rail: Rail, at: string): string => {
    const own = feeds.filter((f) => f.rails[0] === rail.id);
    const feed = own.find((f) => node(f.to) === at) ?? own[0];
    return feed === undefined ? terminal(rail) : fedNode(feed, rail);
  };
  const loads = loadsOf(profile, returns).flatMap(({ name, zero, draws }) => {
    const at = node(zero);
    return draws.flatMap((draw) => {
      const rail = railOf(draw.rail);
      return rail === undefined || draw.amps < 1e-6 ? [] : [{ name, from: loadNode(rail, at), to: at, amps: draw.amps }];
    });
  });
  if (returnRows.length === 0 || loads.length === 0) return null;
  return {
    rails: profile.rails.map((rail) => ({
      name: terminal(rail),
      volts: rail.nominal,
      tolerancePercent: Number((rail.tolerance * 100).toPrecision(12)),
      limitAmps: rail.limitAmps,
      takes: rail.takes ? 'yes' : 'no',
    })),
    returns: unlike(returnRows),
    feeds: unlike(feedRows),
    loads,
    diodes: unlike(profile.rails.flatMap((rail) => diodesOf(profile, rail, terminal(rail)))),
  };
}

/** Conductor ends that the profile joins are one node; one that is called like 0 V is another name for a far end, not the supply's. */
function nodeNamer(profile: Profile, returns: readonly Conductor[]): (end: string) => string {
  const near = new Set(returns.map((c) => c.from));
  return (end) => {
    const group = profile.joined?.find((ends) => ends.includes(end));
    const name = (group?.[0] ?? end).slice(0, 50);
    return name === ZERO_NODE && !near.has(end) ? `${name}, far end` : name;
  };
}

/** Rails are known by their names; two alike get their ids behind them. */
function terminalsOf(profile: Profile): (rail: Rail) => string {
  return (rail) => {
    const plain = rail.name.slice(0, 25);
    const twice = plain === ZERO_NODE || profile.rails.some((other) => other !== rail && other.name.slice(0, 25) === plain);
    return twice ? `${plain} (${rail.id.slice(0, 20)})` : plain;
  };
}

const wireRow = ({ name, squareMillimetres, metres }: Conductor) => ({
  name: name.slice(0, 50),
  squareMillimetres: Math.min(1000, Math.max(0.01, squareMillimetres)),
  metres: Math.min(1000, Math.max(0.001, metres)),
});

/** Gives rows of one name a number behind it. */
function unlike<Row extends { name: string }>(rows: readonly Row[]): Row[] {
  return rows.map((row, i) => {
    const before = rows.slice(0, i).filter((other) => other.name === row.name).length;
    return before === 0 ? row : { ...row, name: `${row.name} (${String(before + 1)})` };
  });
}

/** Boards with the conductor end at which each returns; without boards, a dummy load at the rating of each rail. */
function loadsOf(profile: Profile, returns: readonly Conductor[]): { name: string; zero: string; draws: Board['draws'] }[] {
  const serving = (rails: readonly string[]): string => {
    const score = (c: Conductor): number => rails.filter((rail) => c.rails.includes(rail)).length;
    const [first, ...others] = returns;
    return others.reduce((best, c) => (best === undefined || score(c) > score(best) ? c : best), first)?.to ?? ZERO_NODE;
  };
  const boards = profile.boards.fitted.filter((b) => b.draws.some((d) => d.amps >= 1e-6));
  if (boards.length === 0)
    return profile.rails.map((r) => ({ name: `Dummy load ${r.name}`.slice(0, 60), zero: serving([r.id]), draws: [{ rail: r.id, amps: r.maxAmps }] }));
  return boards.map((b) => ({ name: b.name.slice(0, 60), zero: b.zero ?? serving(b.draws.map((d) => d.rail)), draws: b.draws }));
}

function diodesOf(profile: Profile, rail: Rail, terminal: string): NonNullable<Inputs['diodes']> {
  const ends = rail.nominal > 0 ? { anode: ZERO_NODE, cathode: terminal } : { anode: terminal, cathode: ZERO_NODE };
  const own = profile.devices.filter((d) => d.rail === rail.id && CONDUCTS_REVERSED.includes(d.kind));
  if (own.length === 0) return [{ name: `(${terminal}, not in the profile)`, part: 'rectifier', ...ends }];
  return own.map((d) => ({
    name: d.name.slice(0, 50),
    part: d.part ?? (d.kind === 'rectifier' ? 'rectifier' : 'freewheel'),
    junction: d.kind === 'schottky' ? 'schottky' : 'silicon',
    ...ends,
    ratedAmps: d.ratedAmps === null ? null : Math.min(10_000, Math.max(1e-3, d.ratedAmps)),
    saturationAmps: d.saturationAmps ?? null,
    emission: d.emission ?? null,
    ...(d.seriesOhms === undefined ? {} : { seriesOhms: d.seriesOhms }),
  }));
}
