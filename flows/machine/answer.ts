/** Answers: a row at a time or in one word, to the outcome of the step and the exit that it takes. */
import { OUTCOMES_OF, ROW_ORDER } from '../document/outcomes';
import type { Exit, Step } from '../document/steps';
import { after, verdictOf } from '../facts/effects';
import { allOut } from '../facts/facts';
import { applyOps } from '../facts/ops';
import type { Op } from '../facts/ops';
import { fitVoids } from '../facts/voids';
import { accept, activate, arriveAt, closeOut, refuse, toTakeOut } from './arrive';
import type { Judged } from './arrive';
import { classifyReading, worstOf } from './classify';
import type { RowAnswer, RunContext } from './context';
import type { MachineEvent } from './events';
import { readBack, readBackRows } from './handOver';
import { follow, SAFE } from './program';
import type { Layout, ProgramStep } from './program';
import { partsToDischarge } from '../facts/stores';
import { liveAboveLimits } from './secondPerson';
import { likeTwin } from './rows';
import type { Row, WordRow } from './rows';

type Answering = Extract<MachineEvent, { type: 'ROW' | 'READING' }>;

/** Kinds in which the first bad row ends the step: there is no probing on in a circuit that has just been found live or charged. */
const STOP_AT_FIRST: readonly Step['kind'][] = ['isolate', 'discharge', 'prove-dead'];

/** The rows that stand now: those of the step, of the bench opening, or one for each thing to take out. */
export function currentRows(layout: Layout, context: RunContext): readonly Row[] {
  if (context.key === SAFE.opening) return layout.opening;
  if (context.key === SAFE.takeOut) return toTakeOut(context.facts.fitted).map((f) => thingRow(f, 'taken out'));
  if (context.key === SAFE.readBack) return readBackRows(layout, context);
  if (context.key === SAFE.putBack) return context.facts.fitted.map((f) => thingRow(f, 'back as built'));
  const rows = layout.steps.get(context.key)?.rows ?? [];
  return rows.some((row) => row.ask === 'reading' && row.twin !== undefined) ? rows.map((row) => likeTwin(row, context.rows.find((r) => r.id === 'twin'))) : rows;
}

/** Wall time in milliseconds from which a row may be answered, or null when it waits for nothing that has begun. */
export function rowOpensAt(row: Row, context: RunContext): number | null {
  if (row.wait === null) return null;
  const { from, seconds } = row.wait;
  if (from === 'entry') return context.enteredAt + seconds * 1000;
  const answered = context.rows.find((r) => r.id === from.row);
  return answered === undefined ? null : answered.at + seconds * 1000;
}

/** One row answered. The rows are taken in their order; a step is done when all are, or at the first bad one where going on would be unsafe. */
export function answerRow(layout: Layout, context: RunContext, placed: ProgramStep | undefined, event: Answering): Judged {
  if (context.phase !== 'act' && context.phase !== 'opening') return refuse('not-now', 'This step is not ready for an answer yet.');
  const rows = currentRows(layout, context);
  const row = rows.find((r) => r.id === event.row);
  if (row === undefined) return refuse('unknown-row', 'This step has no such row.');
  if (context.rows.some((r) => r.id === event.row)) return refuse('not-now', 'This row has its answer already.');
  const next = rows.find((r) => !context.rows.some((done) => done.id === r.id));
  if (next !== row) return refuse('not-now', `First: ${next?.label ?? 'the step itself'}.`);
  const opens = rowOpensAt(row, context);
  if (opens !== null && event.at < opens) return refuse('too-early', `Not yet: wait another ${Math.ceil((opens - event.at) / 1000)} s.`, placed?.step.kind === 'soak' ? null : 'H3');
  if (context.second === null && placed !== undefined && liveAboveLimits(row, placed)) {
    return refuse('not-allowed', 'Live work above the limits: a second person has to be present and sign in first.', 'H20');
  }
  const judged = rowAnswer(row, placed, context, event);
  if (!judged.ok) return judged;
  const answered: RunContext = { ...context, rows: [...context.rows, judged.answer], proofInstrument: judged.instrument };
  return finish(layout, answered, placed, rows);
}

type RowJudged = { ok: true; answer: RowAnswer; instrument: string | null } | Extract<Judged, { ok: false }>;
const no = (code: 'bad-answer' | 'instrument', say: string, rule: 'H2' | null = null): RowJudged => ({ ok: false, refusal: { code, say, rule } });

function rowAnswer(row: Row, placed: ProgramStep | undefined, context: RunContext, event: Answering): RowJudged {
  const answer = (result: string, value: RowAnswer['value']): RowJudged => ({ ok: true, answer: { id: row.id, result, value, at: event.at }, instrument: context.proofInstrument });
  if (event.type === 'ROW') {
    if (row.ask === 'reading') {
      // a reading can always be declined, never replaced by a word that passes
      return event.word === 'not-sure' || event.word === 'cannot' ? answer(event.word, null) : no('bad-answer', 'This row asks for a reading.');
    }
    const word = row.words.find((w) => w.word === event.word);
    return word === undefined ? no('bad-answer', 'That is not one of the answers.') : answer(word.result, null);
  }
  if (row.ask === 'word') return no('bad-answer', 'This row asks for a word, not a reading.');
  if (event.instrument === null) return no('instrument', 'Say with which instrument.');
  if (event.value !== 'over' && !Number.isFinite(event.value)) return no('bad-answer', 'That is not a number.');
  const result = classifyReading(row, event.value, event.instrument.uncertainty, event.falling === true);
  if (row.twin?.is === 'twin') return { ok: true, answer: { id: row.id, result, value: event.value, uncertainty: event.instrument.uncertainty, at: event.at }, instrument: context.proofInstrument };
  if (placed?.step.kind !== 'prove-dead') return answer(result, event.value);
  if (!event.instrument.twoPole) return no('instrument', 'Proving dead takes a two-pole tester.', 'H2');
  if (context.proofInstrument !== null && context.proofInstrument !== event.instrument.id) return no('instrument', 'One instrument for the whole proof: this is another one.', 'H2');
  const judged = answer(result, event.value);
  return judged.ok ? { ...judged, instrument: event.instrument.id } : judged;
}

function finish(layout: Layout, context: RunContext, placed: ProgramStep | undefined, rows: readonly Row[]): Judged {
  const results = context.rows.map((r) => r.result);
  const last = results.at(-1) ?? '';
  const good = ['in', 'out', 'done'];
  const endsHere = context.key === SAFE.opening ? last === 'cannot' : placed !== undefined && STOP_AT_FIRST.includes(placed.step.kind) && !good.includes(last);
  // without the twin there is nothing to hold the other reading against
  const noTwin = rows.some((row) => row.ask === 'reading' && row.twin?.is === 'twin' && context.rows.some((r) => r.id === row.id && r.value === null));
  if (!endsHere && !noTwin && context.rows.length < rows.length) return accept(context);
  if (context.key === SAFE.opening) {
    if (results.includes('cannot')) return accept({ ...context, rows: [], goto: SAFE.opening });
    const opened: RunContext = { ...context, facts: applyOps(context.facts, [{ op: 'opened' }]) };
    // opened anew in mid-run: what was under way goes on only behind a bench that is made dead
    return opened.purpose.is === 'none' ? arriveAtFirst(layout, opened) : accept({ ...opened, goto: SAFE.isolate });
  }
  if (placed === undefined) return refuse('not-now', 'This step is not there.');
  const authored = placed.step.kind === 'observe' ? rankOfAnswers(placed.step.exits) : ROW_ORDER;
  const worst = worstOf(results, authored);
  return placed.builtIn ? leaveBuiltIn(layout, context, placed, toOutcome(placed.step, worst)) : leave(layout, context, placed, toOutcome(placed.step, worst));
}

/** Row words that a kind does not have as outcomes fold into the nearest worse one. */
function toOutcome(step: Step, worst: string): string {
  const outcomes: readonly string[] = OUTCOMES_OF[step.kind];
  if (outcomes.includes(worst) || step.kind === 'observe') return worst;
  if (worst === 'cannot') return 'not-sure';
  if (worst === 'reversed' || worst === 'falling') return 'high';
  return worst === 'low' ? 'high' : worst;
}

function rankOfAnswers(exits: readonly Exit[]): string[] {
  const order = ['unsure', 'fail', 'find', 'pass'];
  const answers = exits.filter((e) => e.on.includes('answer'));
  return ['cannot', 'not-sure', ...[...answers].sort((a, b) => order.indexOf(verdictOf(a, 'answer')) - order.indexOf(verdictOf(b, 'answer'))).map((e) => e.id)];
}

/** The answer of a step without rows. */
export function answerWord(layout: Layout, context: RunContext, placed: ProgramStep | undefined, event: Extract<MachineEvent, { type: 'ANSWER' | 'PHOTO' }>): Judged {
  if (placed === undefined || (context.phase !== 'act' && context.phase !== 'hold-wait')) return refuse('not-now', 'This step is not ready for an answer yet.');
  const { step } = placed;
  if (placed.rows.length > 0 || placed.builtIn) return refuse('bad-answer', 'This step is answered row by row.');
  const outcome = event.type === 'PHOTO' ? 'done' : event.answer;
  if (step.kind === 'photo' && event.type !== 'PHOTO' && outcome === 'done') return refuse('bad-answer', 'This step asks for a photo.');
  if (step.kind !== 'photo' && event.type === 'PHOTO') return refuse('bad-answer', 'This step asks for no photo.');
  if (step.kind === 'hold' && context.phase !== 'hold-wait') return refuse('not-allowed', 'A hold point is answered by a senior.', 'H20');
  return leave(layout, context, placed, outcome);
}

function exitFor(step: Step, outcome: string): Exit | undefined {
  return step.exits.find((e: Exit) => (step.kind === 'observe' && e.on.includes('answer') ? e.id === outcome : (e.on as string[]).includes(outcome)));
}

/** Leaves a step by the exit of its outcome: the facts that follow, the counters, and where the run goes on. */
function leave(layout: Layout, context: RunContext, placed: ProgramStep, outcome: string): Judged {
  const { step, scope, key } = placed;
  const exit = exitFor(step, outcome);
  if (exit === undefined) return refuse('bad-answer', 'That is not one of the answers of this step.');
  const word = exit.on.includes('answer') ? 'answer' : outcome;
  const proved = step.kind === 'prove-dead' ? (outcome === 'in' ? context.last.at : null) : context.provedAt;
  const counted = count(context, key, exit);
  let next: RunContext = { ...counted, facts: applyOps(context.facts, after(step, exit, word, scope)), provedAt: proved, outcome: { key, outcome, exit: exit.id, verdict: verdictOf(exit, word) } };
  const isOver = (k: string, e: Exit) => e.atMost !== undefined && timesTaken(next, k, e) >= e.atMost;
  const to = exit.then !== undefined && exit.atMost !== undefined && timesTaken(counted, key, exit) > exit.atMost ? exit.then : exit.to;
  const landing = follow(layout, scope.check(to), isOver);
  for (const passed of landing.through) {
    const call = layout.steps.get(passed.call);
    next = count(next, passed.call, passed.exit);
    if (call !== undefined) next = { ...next, facts: applyOps(next.facts, evidenceOps(passed.exit, call)) };
  }
  next = activate(next, landing.entered);
  if (allOut(next.facts)) next = { ...next, live: null };
  return arriveAt(layout, next, landing.key);
}

/** Exits of a call clear suspects of the calling tree. */
function evidenceOps(exit: Exit, call: ProgramStep): Op[] {
  return (exit.evidence ?? []).filter((e) => e.says === 'rules-out' || e.says === 'points-away').map((e) => ({ op: 'clear', suspect: call.scope.check(e.suspect) }));
}

function timesTaken(context: RunContext, key: string, exit: Exit): number {
  return context.counters.find((c) => c.key === `${key}>${exit.id}`)?.n ?? 0;
}

function count(context: RunContext, key: string, exit: Exit): RunContext {
  if (exit.atMost === undefined) return context;
  const name = `${key}>${exit.id}`;
  const n = timesTaken(context, key, exit) + 1;
  return { ...context, counters: [...context.counters.filter((c) => c.key !== name), { key: name, n }] };
}

/** The machine's own steps lead on by themselves. */
function leaveBuiltIn(layout: Layout, context: RunContext, placed: ProgramStep, outcome: string): Judged {
  const on: Exit = { id: 'on', on: [outcome as never], to: 'on' };
  const facts = placed.key === SAFE.takeOut || placed.key === SAFE.putBack ? takenOut(context) : applyOps(context.facts, after(placed.step, on, outcome, placed.scope));
  const provedAt = placed.key === SAFE.prove && outcome === 'in' ? context.last.at : context.provedAt;
  const next: RunContext = { ...context, facts, provedAt, live: allOut(facts) ? null : context.live, outcome: { key: placed.key, outcome, exit: null, verdict: null } };
  const go = (key: string) => accept({ ...next, goto: key });
  switch (placed.key) {
    case SAFE.isolate:
      if (outcome !== 'out') return go(SAFE.isolate);
      return go(partsToDischarge(layout.profile, layout.settings).length > 0 ? SAFE.discharge : SAFE.prove);
    case SAFE.discharge:
      if (outcome === 'in') return go(SAFE.prove);
      return go(outcome === 'cannot' ? SAFE.isolate : SAFE.discharge);
    case SAFE.prove:
      if (outcome === 'falling') return go(SAFE.discharge);
      return outcome === 'in' ? safeAgain(layout, next) : go(SAFE.isolate);
    case SAFE.readBack: {
      const told = readBack(context);
      const known: RunContext = { ...next, facts: told.facts, readBack: false };
      return told.so ? safeAgain(layout, known) : afterStop(known);
    }
    case SAFE.putBack:
      // what cannot be put back needs a person who decides, not a tree that does not know of it
      return next.facts.fitted.length > 0 ? accept({ ...next, goto: SAFE.ended, end: { says: 'stopped', key: null } }) : arriveAtFirst(layout, next);
    default:
      return afterTakeOut(layout, next);
  }
}

function safeAgain(layout: Layout, context: RunContext): Judged {
  if (context.readBack) return accept({ ...context, goto: SAFE.readBack });
  switch (context.purpose.is) {
    case 'end':
      return closeOut(context, layout);
    case 'mend': {
      const arrived = arriveAt(layout, context, context.purpose.to);
      return arrived.ok ? arrived : afterStop(context);
    }
    case 'begin':
      return accept({ ...context, goto: SAFE.putBack });
    case 'stop':
    case 'none':
      return afterStop(context);
  }
}

/** A place to go on from stands on nothing temporary: what comes out is led out first. */
function afterStop(context: RunContext): Judged {
  return accept({ ...context, purpose: { is: 'stop' }, goto: toTakeOut(context.facts.fitted).length > 0 ? SAFE.takeOut : SAFE.choose });
}

/** Taking a thing out voids its area as taking it out in a step would; what cannot come out stays fitted. */
function takenOut(context: RunContext): RunContext['facts'] {
  const out = context.facts.fitted.filter((f) => context.rows.find((r) => r.id === f.id)?.result === 'done');
  return applyOps(context.facts, [...out.flatMap((f) => fitVoids(f.area)), ...out.map((f): Op => ({ op: 'unfit', id: f.id }))]);
}

/** What could not be taken out at an end closes the run as stopped, with the thing named on the machine; after Stop it bars going on. */
function afterTakeOut(layout: Layout, context: RunContext): Judged {
  if (context.purpose.is === 'stop') return accept({ ...context, goto: SAFE.choose });
  if (toTakeOut(context.facts.fitted).length > 0) return accept({ ...context, goto: SAFE.ended, end: { says: 'stopped', key: null } });
  return closeOut(context, layout);
}

/** The bench is open: the tree's start is checked and its first step entered. */
function arriveAtFirst(layout: Layout, context: RunContext): Judged {
  if (context.facts.fitted.length > 0) return accept({ ...context, goto: SAFE.isolate, purpose: { is: 'begin' } });
  const landing = follow(layout, layout.first, () => false);
  return arriveAt(layout, activate(context, landing.entered), landing.key);
}

function thingRow(f: { id: string; name: string }, done: string): WordRow {
  return {
    id: f.id,
    label: `${f.name}: ${done}`,
    ask: 'word',
    wait: null,
    words: [
      { word: 'done', label: 'Yes', result: 'done' },
      { word: 'cannot', label: 'It stays as it is', result: 'cannot' },
    ],
  };
}
