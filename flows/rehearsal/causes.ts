/** Which way a suspect, if it were the cause, would send a run at each step. */
import type { Exit, Step } from '../document/steps';
import type { Layout, ProgramStep } from '../machine/program';
import { passes, ratioOn, sureExits, sureOutcomes } from '../evidence/sureExits';
import { canGive } from './drive';
import type { Program } from '../machine/compile';

/**
 * The exit that a suspect would cause: the sure one that speaks most for it; among equals the passing one, then the first. A suspect of null is a sound
 * machine: the passing exits.
 */
export function causedExit(step: Step, suspect: string | null, possible: (exit: Exit) => boolean): Exit | null {
  const exits = sureExits(step).filter(possible);
  const candidates = exits.length > 0 ? exits : step.exits.filter(possible);
  const rank = (exit: Exit) => (suspect === null ? 1 : ratioOn(exit, suspect));
  return candidates.reduce<Exit | null>((best, exit) => (best === null || rank(exit) > rank(best) || (rank(exit) === rank(best) && passes(exit) && !passes(best)) ? exit : best), null);
}

/** The answers of a cause, worked out once a step: the outcome to drive each step of a program to. Null where no outcome can be given. */
export function answersOf(program: Program, suspect: string | null): (placed: ProgramStep) => string | null {
  const { layout } = program;
  const known = new Map<string, string | null>();
  const steered = new Map<string, Map<string, Exit>>();
  return (placed) => {
    const found = known.get(placed.key);
    if (found !== undefined) return found;
    const outcomes = (exit: Exit) => [...sureOutcomes(exit), ...(exit.on as string[])].map((on) => (on === 'answer' ? exit.id : on)).filter((on) => canGive(program, placed, on));
    const possible = (exit: Exit) => outcomes(exit).length > 0;
    const exit = placed.caller === null ? causedExit(placed.step, suspect, possible) : (steer(layout, placed.caller, suspect, steered).get(placed.step.id) ?? causedExit(placed.step, null, possible));
    const outcome = exit === null ? null : (outcomes(exit).find((on) => placed.step.kind !== 'hold' || on === 'given') ?? outcomes(exit)[0] ?? null);
    known.set(placed.key, outcome);
    return outcome;
  };
}

/**
 * Inside a called tree: the exits on a shortest way to the end that the caller's exit for this suspect names, and below a further call those on the
 * way to the exit that the calling tree is steered to. None where the good way will do.
 */
function steer(layout: Layout, caller: string, suspect: string | null, steered: Map<string, Map<string, Exit>>): Map<string, Exit> {
  const known = steered.get(caller);
  if (known !== undefined) return known;
  const towards = new Map<string, Exit>();
  steered.set(caller, towards);
  const call = layout.steps.get(caller);
  if (call === undefined || suspect === null) return towards;
  const own = call.caller === null ? causedExit(call.step, suspect, () => true) : (steer(layout, call.caller, suspect, steered).get(call.step.id) ?? null);
  // evidence of a call speaks of the suspects of the tree that calls: only those of the run's own tree are the ones rehearsed
  const wanted = own === null || (call.caller === null && ratioOn(own, suspect) <= 1) ? null : own;
  if (wanted === null) return towards;
  const inside = [...layout.steps.values()].filter((p) => p.caller === caller).map((p) => p.step);
  const reached = new Set(wanted.on as string[]);
  for (let grown = true; grown; ) {
    grown = false;
    for (const step of inside) {
      const exit = reached.has(step.id) ? undefined : step.exits.find((e: Exit) => reached.has(e.to));
      if (exit === undefined) continue;
      towards.set(step.id, exit);
      reached.add(step.id);
      grown = true;
    }
  }
  return towards;
}
