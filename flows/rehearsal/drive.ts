/** A person at the bench who needs no bench: the next machine event for a wanted outcome, at every place that a run can stand at. */
import type { Exit, Step } from '../document/steps';
import { ROW_ORDER } from '../document/outcomes';
import { verdictOf } from '../facts/effects';
import { currentRows, rowOpensAt } from '../machine/answer';
import type { Program } from '../machine/compile';
import type { RunContext } from '../machine/context';
import type { MachineEvent } from '../machine/events';
import type { RunState } from '../machine/advance';
import { SAFE } from '../machine/program';
import type { ProgramStep } from '../machine/program';
import { liveAboveLimits } from '../machine/secondPerson';
import { likeTwin } from '../machine/rows';
import type { Row } from '../machine/rows';
import { readingGiving, TWIN } from './reading';

type Bare<E> = E extends MachineEvent ? Omit<E, 'at' | 'monotonic' | 'boot'> : never;
type BareEvent = Bare<MachineEvent>;

/** `quick` lets a second pass with each event, `stated` the minutes that the tree states for a step. Waits of rows are kept by both. */
export type Pace = 'quick' | 'stated';

const METER = { id: 'rehearsal-tester', twoPole: true };
const SENIOR = 'rehearsal-senior';
const SECOND = 'rehearsal-second';
const BOOT = 'rehearsal';
/** A photo is named by the hash of its content; that of a rehearsal has none. */
const NO_PHOTO = '0'.repeat(64);

/**
 * The next event of a run that is to leave its current step by `wanted` (an outcome, or the id of an authored answer; null for the good one).
 * Null when the run is closed, or when the step cannot be left that way on this machine.
 */
export function nextEvent(program: Program, state: RunState, wanted: string | null, pace: Pace = 'quick'): MachineEvent | null {
  const { context } = state;
  const bare = bareEvent(program, context, wanted);
  return bare === null ? null : stamp(program, context, bare, pace);
}

/** Whether the step at which the run stands can be left by this outcome on this machine. */
export function canGive(program: Program, placed: ProgramStep, wanted: string): boolean {
  if (placed.step.kind === 'hold') return wanted === 'given' || wanted === 'refused';
  if (placed.rows.length === 0) return placed.step.exits.some((e: Exit) => e.id === wanted || (e.on as string[]).includes(wanted));
  return placed.rows.some((row) => rowGives(placed.step, row, wanted));
}

/** The good outcome of a step: the answer that passes, or the first that is not unsure. */
export function goodOutcome(step: Step): string {
  if (step.kind === 'observe') {
    const answers = step.exits.filter((e: Exit) => e.on.includes('answer'));
    return (answers.find((e) => verdictOf(e, 'answer') === 'pass') ?? answers[0])?.id ?? 'not-sure';
  }
  const words = step.exits.flatMap((e: Exit) => e.on as string[]);
  return ['in', 'out', 'done', 'on', 'given'].find((w) => words.includes(w)) ?? words[0] ?? 'done';
}

function bareEvent(program: Program, context: RunContext, wanted: string | null): BareEvent | null {
  const { layout } = program;
  const step = context.key;
  const placed = layout.steps.get(step);
  switch (context.phase) {
    case 'closed':
      return null;
    case 'ended':
      return { type: 'CLOSE' };
    case 'paused':
      return { type: 'RESUME' };
    case 'warning':
      return { type: 'WARNING_READ', step };
    case 'hold':
      return { type: 'HOLD_ASKED', step };
    case 'hold-wait':
      return wanted === 'refused' ? { type: 'HOLD_REFUSED', step, by: SENIOR, reason: 'Refused in rehearsal' } : { type: 'HOLD_GIVEN', step, by: SENIOR };
    case 'guard':
      return { type: 'GUARD_HELD', step, heldMs: layout.settings.guardHoldSeconds * 1000 };
    case 'opening':
    case 'act':
      break;
  }
  if (step === SAFE.choose) return { type: 'CLOSE' };
  if (placed?.step.kind === 'hold') return { type: 'HOLD_ASKED', step };
  const rows = currentRows(layout, context);
  if (rows.length > 0) return rowEvent(context, placed, rows, wanted);
  if (placed === undefined) return null;
  const outcome = wanted ?? goodOutcome(placed.step);
  if (!canGive(program, placed, outcome)) return null;
  return placed.step.kind === 'photo' && outcome === 'done' ? { type: 'PHOTO', step, photo: NO_PHOTO } : { type: 'ANSWER', step, answer: outcome };
}

/** One row gives the wanted result and the others are good; in a row-wise observation every row gives the wanted answer, for the worst one counts. */
function rowEvent(context: RunContext, placed: ProgramStep | undefined, rows: readonly Row[], wanted: string | null): BareEvent | null {
  const row = rows.find((r) => !context.rows.some((done) => done.id === r.id));
  if (row === undefined) return null;
  if (placed !== undefined && context.second === null && liveAboveLimits(row, placed)) return { type: 'SECOND_PRESENT', by: SECOND };
  const outcome = wanted ?? (placed === undefined ? null : goodOutcome(placed.step));
  const observed = placed?.step.kind === 'observe';
  const giver = placed === undefined || outcome === null ? undefined : rows.find((r) => rowGives(placed.step, r, outcome));
  if (placed !== undefined && outcome !== null && giver === undefined) return null;
  const result = placed !== undefined && outcome !== null && (observed || row === giver) ? resultsFor(placed.step, outcome).find((r) => answerTo(context.key, row, r) !== null) : undefined;
  return answerTo(context.key, row, result ?? goodResult(row));
}

/** Row results that fold into an outcome of this kind of step (the machine folds what a kind has no exit for into the nearest worse one). */
function resultsFor(step: Step, outcome: string): string[] {
  if (step.kind === 'observe' || outcome !== 'high') return [outcome];
  const words = step.exits.flatMap((e: Exit) => e.on as string[]);
  return ['high', ...['low', 'reversed', 'falling'].filter((r) => !words.includes(r))];
}

function rowGives(step: Step, row: Row, outcome: string): boolean {
  // before its twin has been read, a row is asked as it will be then
  const asked = row.ask === 'reading' && row.twin?.is === 'like' && row.nominal === null ? likeTwin(row, { value: TWIN }) : row;
  return resultsFor(step, outcome).some((result) => answerTo('', asked, result) !== null);
}

function goodResult(row: Row): string {
  if (row.ask === 'reading') return 'in';
  return [...row.words].sort((a, b) => rank(b.result) - rank(a.result))[0]?.result ?? 'done';
}

function rank(result: string): number {
  const at = (ROW_ORDER as readonly string[]).indexOf(result);
  return at === -1 ? ROW_ORDER.length : at;
}

function answerTo(step: string, row: Row, result: string): BareEvent | null {
  if (row.ask === 'word') {
    const word = row.words.find((w) => w.result === result);
    return word === undefined ? null : { type: 'ROW', step, row: row.id, word: word.word };
  }
  if (result === 'not-sure' || result === 'cannot') return { type: 'ROW', step, row: row.id, word: result };
  const given = readingGiving(row, result);
  if (given === null) return null;
  const { value, uncertainty, falling } = given;
  return { type: 'READING', step, row: row.id, value, typed: String(value).slice(0, 40), instrument: { ...METER, uncertainty }, ...(falling ? { falling } : {}) };
}

/** Puts the event on the clock: a second on, the row's wait over, and at the stated pace the step's own minutes. */
function stamp(program: Program, context: RunContext, event: BareEvent, pace: Pace): MachineEvent {
  const { last } = context;
  const acting = event.type === 'ROW' || event.type === 'READING' || event.type === 'ANSWER' || event.type === 'PHOTO';
  const next = acting ? currentRows(program.layout, context).find((r) => !context.rows.some((done) => done.id === r.id)) : undefined;
  const opens = next === undefined ? null : rowOpensAt(next, context);
  const minutes = acting && pace === 'stated' ? (program.layout.steps.get(context.key)?.step.minutes ?? 0) : 0;
  const at = Math.round(Math.max(last.at + 1000, opens ?? 0, context.enteredAt + minutes * 60_000));
  return { ...event, at, monotonic: last.monotonic + (at - last.at), boot: BOOT } as MachineEvent;
}
