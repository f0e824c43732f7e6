/**
 * What an event does to a run, or why it is refused. The compiled machine asks this in its guards and actions; it is pure and keeps
 * no state of its own. An event that is refused leaves the run exactly as it was.
 */
import { powerKind } from '../facts/power';
import { holds } from '../facts/atoms';
import { needs } from '../facts/needs';
import { unmetClaims } from '../facts/claims';
import { lapseOps } from '../facts/lapse';
import { applyOps } from '../facts/ops';
import { accept, arriveAt, closeOut, comeBack, enter, makeSafe, mayBeLive, openAnew, refuse } from './arrive';
import type { Judged } from './arrive';
import { answerRow, answerWord } from './answer';
import type { RunContext } from './context';
import { SIGNED_EVENTS } from './events';
import type { MachineEvent } from './events';
import { offer, takeOver } from './handOver';
import { follow, SAFE } from './program';
import type { Layout, ProgramStep } from './program';
import { afterLongGap, isLongGap, passTime } from './time';

/** Judges one event. Stop is always taken, before anything else is asked. */
export function judge(layout: Layout, given: RunContext, event: MachineEvent): Judged {
  const before: RunContext = { ...given, goto: null, outcome: null };
  if (before.phase === 'closed') return refuse('closed', 'This run is closed.');
  // neither time nor a load of the page is read off a note: it says nothing about the bench
  if (event.type === 'NOTE') return accept(before);
  if (event.type === 'STOP') return accept(makeSafe({ ...before, handing: null, last: timeOf(event) }));
  if (event.type === 'RESTART') return restart(layout, before, event);
  if (before.last.boot !== '' && event.boot !== before.last.boot && !SIGNED_EVENTS.includes(event.type)) return refuse('restarted', 'The page was loaded anew: the run has to come back first.');
  const wasLive = mayBeLive(before);
  const { context, lapse } = SIGNED_EVENTS.includes(event.type) ? { context: before, lapse: 'none' as const } : passTime(layout, before, event);
  const judged = take(layout, context, event);
  if (!judged.ok || lapse === 'none') return judged;
  // the answer stands; what follows is led out of what has lapsed
  if (lapse !== 'time' && wasLive) return accept(makeSafe(judged.next));
  if (lapse === 'long-gap' && judged.next.readBack && judged.next.phase !== 'paused') return openAnew(layout, judged.next);
  return judged.next.goto === null && judged.next.phase !== 'paused' ? comeBack(layout, judged.next, false) : judged;
}

function take(layout: Layout, context: RunContext, event: MachineEvent): Judged {
  const placed = layout.steps.get(context.key);
  if ('step' in event && event.type !== 'REENTER' && event.step !== context.key) return refuse('not-now', 'That step is not the current one; the run has gone on.');
  switch (event.type) {
    case 'STOP':
    case 'RESTART':
    case 'NOTE':
      return refuse('not-now', 'Already done.'); // taken in `judge`
    case 'TICK':
      return accept(context);
    case 'PAUSE':
      return pause(context);
    case 'RESUME':
      return context.phase === 'paused' ? comeBack(layout, { ...context, handing: null }, false) : refuse('not-now', 'The run is not paused.');
    case 'ABORT':
      if (context.live === null) return refuse('not-now', 'Nothing is on.');
      // make-safe is not left half way, and what has ended does not go on
      if (placed === undefined || placed.builtIn) return refuse('not-now', 'The run is past that: it is being made safe, or it has ended.');
      return arriveAt(layout, { ...context, grant: null }, context.live.abort);
    case 'CLOSE':
      return close(layout, context);
    case 'REENTER':
      return reenter(layout, context, event.step);
    case 'SECOND_PRESENT':
      return event.by === context.restorer ? refuse('not-allowed', 'The second person is somebody else.', 'H20') : accept({ ...context, second: event.by });
    case 'HANDED_OVER':
      return offer(context, event);
    case 'TAKEN_OVER':
      return takeOver(layout, context, event);
    case 'WARNING_READ':
      return context.phase === 'warning' ? accept(context) : refuse('not-now', 'No warning is shown now.');
    case 'HOLD_ASKED':
      return askHold(context, placed);
    case 'HOLD_GIVEN':
    case 'HOLD_REFUSED':
      return answerHold(layout, context, placed, event);
    case 'GUARD_HELD':
      return overdue(context, placed, event.at) ?? confirmGuard(layout, context, placed, event.heldMs, event.at);
    case 'ROW':
    case 'READING':
      return overdue(context, placed, event.at) ?? answerRow(layout, context, placed, event);
    case 'ANSWER':
    case 'PHOTO':
      return overdue(context, placed, event.at) ?? answerWord(layout, context, placed, event);
  }
}

/** Role and time beside the facts: is a countersign needed before this step's guard? */
export function needsHold(layout: Layout, context: RunContext, placed: ProgramStep): boolean {
  const { step } = placed;
  if (step.kind !== 'energise' && step.kind !== 'raise') return false;
  if (context.restorerIsSenior) return false;
  const kind = powerKind(step, layout.profile, layout.settings);
  return !context.facts.powered.includes(kind) && !(context.grant?.kind === kind && context.grant.facts === JSON.stringify(context.facts));
}

function timeOf(event: MachineEvent): RunContext['last'] {
  return { at: event.at, monotonic: event.monotonic, boot: event.boot };
}

function restart(layout: Layout, context: RunContext, event: MachineEvent): Judged {
  const wasLive = mayBeLive(context);
  const last = timeOf(event);
  if (context.last.boot === '' || context.phase === 'ended') return accept({ ...context, last });
  const base = isLongGap(context, event.at) ? afterLongGap(context) : { ...context, facts: applyOps(context.facts, lapseOps('gap')), grant: null, provedAt: null, second: null };
  // an offer stands until it is taken or taken back
  if (base.handing !== null) return accept({ ...base, last });
  return comeBack(layout, { ...base, last }, wasLive);
}

function pause(context: RunContext): Judged {
  if (context.phase === 'ended' || context.phase === 'paused') return refuse('not-now', 'There is nothing to pause.');
  if (mayBeLive(context)) return refuse('house-rule', 'The bench is live: isolate first, or press Stop. Nothing waits for a person while live.', 'H11');
  const facts = applyOps(context.facts, lapseOps('gap'));
  return accept({ ...context, facts, grant: null, provedAt: null, second: null, goto: '~paused' });
}

function close(layout: Layout, context: RunContext): Judged {
  if (context.phase === 'ended') return accept(context);
  if (context.key !== SAFE.choose) return refuse('not-now', 'A run is closed at an end, or after Stop once the bench is proved dead.');
  return closeOut({ ...context, purpose: { is: 'end', key: null } }, layout);
}

/** H21: only places that the run has been to, whose stated facts hold, with nothing owed and nothing fitted. */
export function reentriesOpen(layout: Layout, context: RunContext): string[] {
  const { facts } = context;
  const clean = facts.fitted.length === 0 && facts.owed.doubts.length === 0 && facts.owed.fails.length === 0 && facts.owed.killers.length === 0;
  return layout.tree.reentries.flatMap((r) => {
    // a call is gone on from at the first step that it leads to
    const { key } = follow(layout, r.step, () => false);
    const placed = layout.steps.get(key);
    if (!clean || placed === undefined || !context.visited.includes(key) || unmetClaims(r.needs, facts, layout.profile).length > 0) return [];
    return needs(placed.step, placed.scope).every((n) => holds(facts, n.atom)) ? [r.step] : [];
  });
}

function reenter(layout: Layout, context: RunContext, key: string): Judged {
  if (context.key !== SAFE.choose) return refuse('not-now', 'Going on from another place is offered after Stop, once the bench is proved dead.', 'H21');
  if (!reentriesOpen(layout, context).includes(key)) return refuse('house-rule', 'The run cannot go on from there: what that place stands on does not hold now.', 'H21');
  if (!context.facts.opened) return accept({ ...context, goto: SAFE.opening, purpose: { is: 'mend', to: key } });
  return arriveAt(layout, { ...context, purpose: { is: 'none' } }, key);
}

function askHold(context: RunContext, placed: ProgramStep | undefined): Judged {
  const authored = placed?.step.kind === 'hold' && context.phase === 'act';
  if (context.phase === 'hold' || context.phase === 'guard' || authored) return accept(context);
  return refuse('not-now', 'No countersign is asked for here.');
}

function answerHold(layout: Layout, context: RunContext, placed: ProgramStep | undefined, event: Extract<MachineEvent, { type: 'HOLD_GIVEN' | 'HOLD_REFUSED' }>): Judged {
  if (context.phase !== 'hold-wait' || placed === undefined) return refuse('not-now', 'No countersign is awaited for this step.');
  if (context.restorers.includes(event.by)) return refuse('not-allowed', 'One who does the work of this run, or did, cannot countersign it.', 'H20');
  const given = event.type === 'HOLD_GIVEN';
  if (placed.step.kind === 'hold') {
    const answered = answerWord(layout, context, placed, { ...event, type: 'ANSWER', answer: given ? 'given' : 'refused' });
    if (!answered.ok || !given || placed.step.for === undefined) return answered;
    const { next } = answered;
    return accept({ ...next, grant: { kind: placed.step.for, key: placed.key, at: event.at, by: event.by, facts: JSON.stringify(next.facts) } });
  }
  if (!given) return accept(makeSafe({ ...context, facts: applyOps(context.facts, [{ op: 'doubt', check: placed.key }]) }));
  if (placed.step.kind !== 'energise' && placed.step.kind !== 'raise') return refuse('not-now', 'No countersign is awaited for this step.');
  const kind = powerKind(placed.step, layout.profile, layout.settings);
  const facts = applyOps(context.facts, [{ op: 'lift-doubt', check: placed.key }]);
  return accept({ ...context, facts, grant: { kind, key: placed.key, at: event.at, by: event.by, facts: JSON.stringify(facts) } });
}

function confirmGuard(layout: Layout, context: RunContext, placed: ProgramStep | undefined, heldMs: number, at: number): Judged {
  if (context.phase !== 'guard' || placed === undefined) return refuse('not-now', 'No guard is shown now.');
  const { step } = placed;
  if (step.kind !== 'energise' && step.kind !== 'raise') return refuse('not-now', 'No guard is shown now.');
  if (heldMs < layout.settings.guardHoldSeconds * 1000) return refuse('house-rule', `Hold it for ${layout.settings.guardHoldSeconds} s; letting go cancels.`, 'H5');
  const unmet = needs(step, placed.scope).filter((n) => !holds(context.facts, n.atom));
  if (unmet.length > 0) return refuse('house-rule', `No power: ${unmet.map((n) => n.say).join('; ')}.`, unmet[0]?.rule ?? 'H5');
  if (needsHold(layout, context, placed)) return refuse('house-rule', 'A senior has to countersign first.', 'H20');
  const stale = context.grant !== null && (at - context.grant.at) / 60_000 > layout.settings.holdMinutes;
  if (stale && !context.restorerIsSenior && context.grant?.kind === powerKind(step, layout.profile, layout.settings)) return refuse('house-rule', 'The countersign is too old: ask again.', 'H20');
  const until = at + step.longestMinutes * 60_000;
  const live = context.live === null ? { key: placed.key, since: at, until, abort: placed.scope.check(step.abort) } : { ...context.live, until: Math.min(context.live.until, until) };
  return accept(enter({ ...context, grant: null, live }, placed));
}

/** H11 at run time: when the time is up only isolate, abort and Stop are taken. */
function overdue(context: RunContext, placed: ProgramStep | undefined, at: number): Judged | null {
  if (context.live === null || at <= context.live.until || placed?.step.kind === 'isolate') return null;
  return refuse('overdue', 'The time for this power is up. Isolate now; nothing else is taken.', 'H11');
}
