/** Plays the events of a run through its program: where it stands, its account so far, what suspects have been heard of. Pure. */
import { findingsOf } from '@/flows/evidence/findings';
import type { Finding } from '@/flows/evidence/posterior';
import { bandOf } from '@/flows/facts/band';
import type { PowerBandState } from '@/flows/facts/band';
import { advance, startRun } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import type { Refusal } from '@/flows/machine/arrive';
import type { Program } from '@/flows/machine/compile';
import type { MachineEvent } from '@/flows/machine/events';
import type { RunStart } from '@/shared/contract/runs';
import { lineOf } from '@/shared/ui/hooks/runLines';
import type { RunLine } from '@/shared/ui/hooks/runLines';

export interface Account {
  lines: readonly RunLine[];
  findings: readonly Finding[];
  /** the worst power state in which each visited step was left or stands */
  bands: ReadonlyMap<string, PowerBandState>;
}

export interface Played {
  state: RunState;
  account: Account;
  /** the first event that the engine does not take; what follows it was not played */
  refused: { at: number; refusal: Refusal } | null;
}

/** Plays a run from its start. */
export function play(program: Program, start: RunStart, events: readonly MachineEvent[]): Played {
  let state = startRun(program, start);
  let account: Account = { lines: [], findings: [], bands: new Map() };
  for (const [at, event] of events.entries()) {
    const taken = advance(program, state, event);
    if (!taken.ok) return { state, account, refused: { at, refusal: taken.refusal } };
    account = noted(program, account, state, event, taken.state);
    state = taken.state;
  }
  return { state, account, refused: null };
}

/** The account with one more event that was taken. */
export function noted(program: Program, account: Account, before: RunState, event: MachineEvent, after: RunState): Account {
  const { key } = after.context;
  return {
    lines: [...account.lines, lineOf(program, before.context, event, after.context)],
    findings: [...account.findings, ...findingsOf(program.layout, after.context.outcome)],
    bands: new Map([...account.bands, [before.context.key, bandOf(before.context.facts)], [key, bandOf(after.context.facts)]]),
  };
}
