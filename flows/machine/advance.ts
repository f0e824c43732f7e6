/** Stepping a run: pure, the same on server and client. Entries replayed through `advance` give the state again. */
import { initialTransition, transition } from 'xstate';

import { unmetClaims } from '../facts/claims';
import { worstFacts } from '../facts/facts';
import type { Carried } from '../facts/facts';
import type { Refusal } from './arrive';
import type { Program } from './compile';
import type { RunContext } from './context';
import { entryKindOf } from './entryKind';
import type { RunEntryKind } from './entryKind';
import type { MachineEvent } from './events';
import { judge } from './judge';
import { SAFE } from './program';

/** A run between two events: the machine's state value and context, plain data. */
export interface RunState {
  value: unknown;
  context: RunContext;
}

export interface RunStart extends Carried {
  restorer: string;
  restorerIsSenior: boolean;
  /** epoch milliseconds at which the run is opened */
  at: number;
}

export type Advanced = { ok: true; state: RunState; kind: RunEntryKind } | { ok: false; refusal: Refusal };

/** Facts that a tree needs at its start and that the machine does not bring. */
export function unmetAtStart(program: Program, start: RunStart): string[] {
  return unmetClaims(program.layout.tree.needsAtStart, worstFacts(program.layout.profile, start), program.layout.profile);
}

/** Opens a run: everything at its worst, and what the machine carries. */
export function startRun(program: Program, start: RunStart): RunState {
  const context: RunContext = {
    facts: worstFacts(program.layout.profile, { release: start.release, fitted: start.fitted, killers: start.killers }),
    key: SAFE.opening,
    phase: 'opening',
    rows: [],
    enteredAt: start.at,
    counters: [],
    grant: null,
    live: null,
    purpose: { is: 'none' },
    visited: [],
    restorer: start.restorer,
    restorerIsSenior: start.restorerIsSenior,
    restorers: [start.restorer],
    handing: null,
    readBack: false,
    second: null,
    provedAt: null,
    proofInstrument: null,
    last: { at: start.at, monotonic: 0, boot: '' },
    goto: null,
    end: null,
    outcome: null,
  };
  const [snapshot] = initialTransition(program.machine, context);
  return { value: snapshot.value, context: snapshot.context };
}

/** Takes one event. A refused event leaves the state as it was and says why, with the house rule where one is at stake. */
export function advance(program: Program, state: RunState, event: MachineEvent): Advanced {
  const judged = judge(program.layout, state.context, event);
  if (!judged.ok) return judged;
  const before = program.machine.resolveState({ value: state.value as never, context: state.context });
  if (!before.can(event)) return { ok: false, refusal: { rule: null, code: 'not-now', say: 'That cannot be done at this place.' } };
  const [after] = transition(program.machine, before, event);
  return { ok: true, state: { value: after.value, context: after.context }, kind: entryKindOf(event, after.context) };
}
