/** Every case of the lost-return sheet: which returns are open, and which rails are on, off or in limit. */
import type { LostReturnModel } from '@/shared/workings/lostReturnModel';
import type { Laid, Resistor, Solution } from '@/shared/workings/network/network';
import { lay, prepare, solveLaid } from '@/shared/workings/network/network';

/** What a rail does in a case. In limit it gives all it can into a load that is all but shorted. */
export type RailState = 'on' | 'off' | 'limit';

/** Rails up to which every mixture of their states is worked out; with more, each state of each rail and of each pair. */
export const MIXED_RAILS = 3;

/** Nothing open, each return, each pair of returns, by their places. */
export function openingsOf(returns: number): readonly (readonly number[])[] {
  const all = Array.from({ length: returns }, (_, k) => k);
  return [[], ...all.map((k) => [k]), ...all.flatMap((k) => all.slice(k + 1).map((m) => [k, m]))];
}

/** States of all rails for each case, all on first. A rail without a load has no limit to be in. */
export function statesOf(model: Pick<LostReturnModel, 'rails' | 'overloads'>): readonly (readonly RailState[])[] {
  const count = model.rails.length;
  const choices = model.overloads.map((overload): readonly RailState[] => (overload === null ? ['on', 'off'] : ['on', 'off', 'limit']));
  if (count <= MIXED_RAILS) {
    return choices.reduce<readonly (readonly RailState[])[]>(
      (cases, own) => cases.flatMap((states) => own.map((state) => [...states, state])),
      [[]],
    );
  }
  const allOn = choices.map((): RailState => 'on');
  const others = (rail: number): readonly RailState[] => (choices[rail] ?? []).filter((state) => state !== 'on');
  const changed = (states: readonly RailState[], rail: number, state: RailState) => states.map((own, k) => (k === rail ? state : own));
  const singles = allOn.flatMap((_, rail) => others(rail).map((state) => ({ rail, states: changed(allOn, rail, state) })));
  const pairs = singles.flatMap(({ rail, states }) =>
    allOn.flatMap((_, other) => (other > rail ? others(other).map((state) => changed(states, other, state)) : [])),
  );
  return [allOn, ...singles.map(({ states }) => states), ...pairs];
}

/** One case, solved. */
export interface SolvedCase {
  readonly opens: readonly number[];
  readonly states: readonly RailState[];
  readonly added: readonly Resistor[];
  readonly solution: Solution;
}

/**
 * Solves every case and hands each over as it is done, opening by opening, nothing open first.
 * @returns how many there were
 */
export function solveCases(model: LostReturnModel, take: (one: SolvedCase) => void): number {
  const overloads = model.overloads.flatMap((overload) => overload ?? []);
  const prepared = prepare(
    model.network,
    model.returns.map(({ resistor }) => resistor),
    overloads,
  );
  // Cases that differ only in what is off share the laying in.
  const limitsOf = (states: readonly RailState[]): string => states.map((state) => (state === 'limit' ? 'x' : '-')).join('');
  const groups = new Map<string, (readonly RailState[])[]>();
  for (const states of statesOf(model)) {
    const group = groups.get(limitsOf(states)) ?? [];
    groups.set(limitsOf(states), [...group, states]);
  }
  let solved = 0;
  for (const opens of openingsOf(model.returns.length)) {
    const open = opens.flatMap((k) => model.returns[k]?.resistor ?? []);
    for (const group of groups.values()) {
      const outputs = model.network.outputs.map((output, rail) =>
        group[0]?.[rail] === 'limit' ? { ...output, limitAmps: model.shortedAmps[rail] ?? output.limitAmps } : output,
      );
      const held = { ...prepared, network: { ...model.network, outputs } };
      const added = (group[0] ?? []).flatMap((state, rail) => (state === 'limit' ? (model.overloads[rail] ?? []) : []));
      const laid: Laid = lay(held, { open, added });
      let start: Float64Array | undefined;
      for (const states of group) {
        const off = states.flatMap((state, rail) => (state === 'off' ? [rail] : []));
        const solution = solveLaid(laid, off, start);
        if (solution.converged) start = solution.volts;
        solved += 1;
        take({ opens, states, added, solution });
      }
    }
  }
  return solved;
}
