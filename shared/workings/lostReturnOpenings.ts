/** What each opening of returns comes to over all states of the rails: its verdict, its worst case, the boards exposed. */
import type { RailState, SolvedCase } from '@/shared/workings/lostReturnCases';
import { solveCases } from '@/shared/workings/lostReturnCases';
import type { Harm, HarmKind } from '@/shared/workings/lostReturnHarm';
import { HARM_KINDS, harmsOf } from '@/shared/workings/lostReturnHarm';
import type { LostReturnModel } from '@/shared/workings/lostReturnModel';
import type { OpeningVerdict } from '@/shared/workings/lostReturnResult';
import { powerBalance } from '@/shared/workings/network/power';

/** One kind of harm to one thing, over all cases of an opening in which it comes up. */
export interface Occurrence {
  readonly kind: HarmKind;
  readonly at: number;
  readonly worst: Harm;
  readonly worstCase: SolvedCase;
  /** For each rail the states in which it comes up. */
  readonly states: readonly ReadonlySet<RailState>[];
  /** Most amps of each diode over those cases. */
  readonly diodeAmps: readonly number[];
  readonly destroys: boolean;
}

/** An opening, judged. */
export interface JudgedOpening {
  readonly opens: readonly number[];
  readonly verdict: OpeningVerdict;
  /** Worst kind first, and the worst of a kind first. */
  readonly occurrences: readonly Occurrence[];
  /** The case to show: that of the worst harm, else all rails on. */
  readonly shown: SolvedCase;
  /** Most amps of each diode over all states of the rails. */
  readonly diodeAmps: readonly number[];
  /** Rails that limit in the case shown, by place. */
  readonly limiting: readonly number[];
}

/** All openings, and how the solving went. */
export interface JudgedOpenings {
  readonly closed: JudgedOpening;
  readonly openings: readonly JudgedOpening[];
  readonly solved: number;
  readonly unsettled: readonly SolvedCase[];
  /** The largest share by which given and heat differ in a case. */
  readonly imbalance: number;
}

interface Gathering {
  readonly opens: readonly number[];
  readonly found: Map<
    string,
    { kind: HarmKind; at: number; worst: Harm; worstCase: SolvedCase; states: Set<RailState>[]; diodeAmps: number[]; destroys: boolean }
  >;
  allOn: SolvedCase;
  readonly diodeAmps: number[];
}

const keyOf = ({ kind, at }: Pick<Harm, 'kind' | 'at'>): string => `${kind} ${String(at)}`;
const isAllOn = (states: readonly RailState[]): boolean => states.every((state) => state === 'on');

function raise(most: number[], amps: readonly number[]): void {
  amps.forEach((value, k) => (most[k] = Math.max(most[k] ?? 0, value)));
}

function gather(into: Gathering, one: SolvedCase, harms: readonly Harm[]): void {
  if (isAllOn(one.states)) into.allOn = one;
  raise(into.diodeAmps, one.solution.diodeAmps);
  for (const harm of harms) {
    const known = into.found.get(keyOf(harm));
    const entry = known ?? {
      kind: harm.kind,
      at: harm.at,
      worst: harm,
      worstCase: one,
      states: one.states.map(() => new Set<RailState>()),
      diodeAmps: [],
      destroys: false,
    };
    one.states.forEach((state, rail) => entry.states[rail]?.add(state));
    raise(entry.diodeAmps, one.solution.diodeAmps);
    entry.destroys ||= harm.destroys;
    if (harm.size > entry.worst.size) {
      entry.worst = harm;
      entry.worstCase = one;
    }
    if (known === undefined) into.found.set(keyOf(harm), entry);
  }
}

/** How telling a reversed rail is: one that no diode holds first, then by the amps that its diodes carry. */
function weight(model: LostReturnModel, { kind, at, worst, diodeAmps }: Pick<Occurrence, 'kind' | 'at' | 'worst' | 'diodeAmps'>): number {
  if (kind !== 'rail-reversed') return worst.size;
  const terminal = model.network.outputs[at]?.terminal;
  const held = model.network.diodes.map(({ anode, cathode }, k) => (anode === terminal || cathode === terminal ? (diodeAmps[k] ?? 0) : 0));
  const amps = Math.max(0, ...held);
  return amps > 0 && worst.size < UNHELD_VOLTS ? amps : 1e6 * worst.size;
}

/** From here on a diode's drop no longer explains the volts of a reversed rail. */
const UNHELD_VOLTS = 2.5;

function judge(model: LostReturnModel, { opens, found, allOn, diodeAmps }: Gathering): JudgedOpening {
  const rank = (kind: HarmKind): number => HARM_KINDS.indexOf(kind);
  const occurrences = [...found.values()].sort(
    (a, b) => Number(b.destroys) - Number(a.destroys) || rank(a.kind) - rank(b.kind) || weight(model, b) - weight(model, a),
  );
  const [first] = occurrences;
  const verdict = first === undefined ? 'harmless' : first.destroys ? 'destructive' : 'out of tolerance';
  const shown = first?.worstCase ?? allOn;
  const limiting = model.network.outputs.flatMap(({ limitAmps }, rail) => {
    const most = shown.states[rail] === 'limit' ? (model.shortedAmps[rail] ?? limitAmps) : limitAmps;
    return Math.abs(shown.solution.outputAmps[rail] ?? 0) >= most ? [rail] : [];
  });
  return { opens, verdict, occurrences, shown, diodeAmps, limiting };
}

/** Solves and judges every opening; what is so with nothing open already, in the same states, is not laid to an opening. */
export function judgeOpenings(model: LostReturnModel): JudgedOpenings {
  const before = new Map<string, ReadonlySet<string>>();
  const gatherings: Gathering[] = [];
  const unsettled: SolvedCase[] = [];
  let imbalance = 0;
  const solved = solveCases(model, (one) => {
    if (!one.solution.converged) {
      unsettled.push(one);
      return;
    }
    const open = one.opens.flatMap((k) => model.returns[k]?.resistor ?? []);
    imbalance = Math.max(imbalance, powerBalance(model.network, { open, added: one.added }, one.solution).imbalance);
    let gathering = gatherings[gatherings.length - 1];
    if (gathering === undefined || gathering.opens !== one.opens) {
      gathering = { opens: one.opens, found: new Map(), allOn: one, diodeAmps: [] };
      gatherings.push(gathering);
    }
    const harms = harmsOf(model, one.states, one.solution);
    const states = one.states.join();
    if (one.opens.length === 0) before.set(states, new Set(harms.map(keyOf)));
    const known = before.get(states);
    gather(gathering, one, one.opens.length === 0 ? harms : harms.filter((harm) => known?.has(keyOf(harm)) !== true));
  });
  const [closed, ...openings] = gatherings.map((gathering) => judge(model, gathering));
  if (closed === undefined) throw new Error('the first case has nothing open');
  return { closed, openings, solved, unsettled, imbalance };
}
