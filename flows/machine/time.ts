/** What the passing of time takes back: the 30 minutes of "proved dead", jumps of the clock, a page loaded anew. */
import type { Settings } from '../document/settings';
import { partsToDischarge } from '../facts/stores';
import { lapseOps, LONG_GAP_MS } from '../facts/lapse';
import { applyOps } from '../facts/ops';
import type { RunContext } from './context';
import type { MachineEvent } from './events';
import { SAFE } from './program';
import type { Layout } from './program';

/** Why facts have lapsed at this event: nothing, time alone, a clock that can no longer be trusted, or nobody here for long. */
export type Lapse = 'none' | 'time' | 'clock' | 'long-gap';

/** Takes the event's time: facts that have lapsed fall, and the clocks are kept. */
export function passTime(layout: Layout, context: RunContext, event: MachineEvent): { context: RunContext; lapse: Lapse } {
  const last = { at: event.at, monotonic: event.monotonic, boot: event.boot };
  if (isLongGap(context, event.at)) return { context: { ...afterLongGap(context), last }, lapse: 'long-gap' };
  if (clockJumped(context, event, layout.settings)) {
    const facts = applyOps(context.facts, lapseOps('gap'));
    return { context: { ...context, facts, last, grant: null, provedAt: null }, lapse: 'clock' };
  }
  const minutes = context.provedAt === null ? 0 : (event.at - context.provedAt) / 60_000;
  if (context.facts.stored === 'proved' && minutes > layout.settings.deadLapseMinutes && !everyPartLinked(layout, context)) {
    return { context: { ...context, facts: applyOps(context.facts, lapseOps('time')), last, provedAt: null }, lapse: 'time' };
  }
  return { context: { ...context, last }, lapse: 'none' };
}

/** More than 8 hours since the last event of a run that is under way. */
export function isLongGap(context: RunContext, at: number): boolean {
  return context.last.boot !== '' && at - context.last.at > LONG_GAP_MS;
}

/** What is left of a run that nobody has heard of for so long: the bench is opened anew, and what is there is read back. */
export function afterLongGap(context: RunContext): RunContext {
  return { ...context, facts: applyOps(context.facts, lapseOps('long-gap')), grant: null, provedAt: null, second: null, readBack: context.readBack || context.key !== SAFE.opening };
}

/** Wall time that goes back, or differs from monotonic time by more than the workshop allows, within one load of the page. */
function clockJumped(context: RunContext, event: MachineEvent, settings: Settings): boolean {
  if (event.boot !== context.last.boot) return false; // a load of its own: RESTART deals with it
  const wall = event.at - context.last.at;
  const steady = event.monotonic - context.last.monotonic;
  return wall < 0 || steady < 0 || Math.abs(wall - steady) > settings.clockJumpSeconds * 1000;
}

/** The time lapse waits only where each part that needs a discharge has its own link fitted. */
function everyPartLinked(layout: Layout, context: RunContext): boolean {
  const parts = partsToDischarge(layout.profile, layout.settings);
  return parts.length > 0 && parts.every((part) => context.facts.fitted.some((f) => f.class === 'link' && f.point === part.point));
}
