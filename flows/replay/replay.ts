/** A past run's answers on another version of its tree: where it would have gone elsewhere, or been refused. */
import { advance, startRun, unmetAtStart } from '../machine/advance';
import type { RunStart, RunState } from '../machine/advance';
import type { Program } from '../machine/compile';
import type { RunEnd } from '../machine/context';
import type { MachineEvent } from '../machine/events';
import { SAFE } from '../machine/program';

export interface Divergence {
  /** place of the event among those given, from 0 */
  index: number;
  /** `elsewhere`: this version stands at another step than the run did; `refused`: same step, but it does not take the answer */
  is: 'elsewhere' | 'refused';
  /** where the run stood, by the ids of this version; null for an event that names no step */
  was: string | null;
  /** where this version stands */
  now: string;
  rule: string | null;
  say: string;
  /** the event with which both stand at one step again, or null */
  rejoined: number | null;
}

export interface Replayed {
  /** true where every answer was taken at the step at which it was given */
  same: boolean;
  taken: number;
  given: number;
  divergences: Divergence[];
  /** where this version stands at the end of the answers */
  at: string;
  end: RunEnd | null;
}

/**
 * Plays events in order. Where this version stands elsewhere, what was answered away from it is passed over until both stand at one step again; so is an answer that
 * it refuses. `renamed` gives the new id of steps that only changed their name.
 */
export function replay(program: Program, start: RunStart, events: readonly MachineEvent[], renamed: ReadonlyMap<string, string> = new Map()): Replayed {
  const unmet = unmetAtStart(program, start);
  let state: RunState = startRun(program, start);
  const result: Replayed = { same: true, taken: 0, given: events.length, divergences: [], at: state.context.key, end: null };
  if (unmet.length > 0) result.divergences.push({ index: 0, is: 'refused', was: null, now: state.context.key, rule: null, say: `This version needs at its start: ${unmet.join(', ')}.`, rejoined: null });
  let apart: Divergence | null = null;
  for (const [index, given] of events.entries()) {
    if (unmet.length > 0) break;
    const event = withNewId(given, renamed);
    const opened = openLike(program, state, event);
    if (opened.rows.length > 0) {
      note(result, { index, is: 'elsewhere', was: 'step' in event ? event.step : null, now: SAFE.opening, rule: null, say: `The bench opening of this version also asks: ${opened.rows.join('; ')}. It is taken as answered.`, rejoined: index });
      state = opened.state;
    }
    const { key } = state.context;
    const was = 'step' in event && event.type !== 'REENTER' ? event.step : null;
    if (was !== null && was !== key) {
      apart ??= note(result, { index, is: 'elsewhere', was, now: key, rule: null, say: `The run stood at ${nameOf(program, was)}; this version stands at ${nameOf(program, key)}.`, rejoined: null });
      continue;
    }
    // what names no step belongs to the place where the run stood
    if (was === null && apart !== null && event.type !== 'STOP' && event.type !== 'RESTART') continue;
    const advanced = advance(program, state, event);
    if (!advanced.ok) {
      apart ??= note(result, { index, is: 'refused', was, now: key, rule: advanced.refusal.rule, say: advanced.refusal.say, rejoined: null });
      continue;
    }
    if (apart !== null) apart.rejoined = index;
    apart = null;
    state = advanced.state;
    result.taken += 1;
  }
  return { ...result, same: result.divergences.length === 0, at: state.context.key, end: state.context.end };
}

/** Opening rows that the run was not asked before this event, answered well: what is on an opening list changes no way through the tree. */
function openLike(program: Program, given: RunState, event: MachineEvent): { state: RunState; rows: string[] } {
  const rows: string[] = [];
  let state = given;
  const { at, monotonic, boot } = event;
  while (state.context.key === SAFE.opening && 'step' in event) {
    const next = program.layout.opening.find((row) => !state.context.rows.some((done) => done.id === row.id));
    const inOpening = event.step === SAFE.opening;
    if (next === undefined || (inOpening && 'row' in event && (event.row === next.id || !program.layout.opening.some((row) => row.id === event.row)))) break;
    const taken = advance(program, state, { type: 'ROW', step: SAFE.opening, row: next.id, word: next.words[0]?.word ?? '', at, monotonic, boot });
    if (!taken.ok) break;
    state = taken.state;
    rows.push(next.label);
  }
  return { state, rows };
}

function note(result: Replayed, divergence: Divergence): Divergence {
  result.divergences.push(divergence);
  return divergence;
}

function nameOf(program: Program, key: string): string {
  if (key === SAFE.opening) return 'the opening of the bench';
  const title = program.layout.steps.get(key)?.step.title;
  return title === undefined ? key : `“${title}” (${key})`;
}

/** The event with its step named as this version names it; a step under a call keeps its own part of the name. */
function withNewId(event: MachineEvent, renamed: ReadonlyMap<string, string>): MachineEvent {
  if (!('step' in event)) return event;
  const [head = '', ...rest] = event.step.split('/');
  return { ...event, step: [renamed.get(head) ?? head, ...rest].join('/') };
}
