/** Going on to a step: whether its needs hold, whether a lapse has to be mended first, and the close-out before an end. */
import { holds, holdsButForLapse } from '../facts/atoms';
import type { StepOf } from '../document/steps';
import { entered } from '../facts/effects';
import { isLive, isProvedDead } from '../facts/facts';
import type { Facts } from '../facts/facts';
import { needs } from '../facts/needs';
import type { Need, RuleId } from '../facts/needs';
import { applyOps } from '../facts/ops';
import { fitVoids } from '../facts/voids';
import type { RunContext } from './context';
import { follow, SAFE } from './program';
import type { Layout, ProgramStep } from './program';

/** An event that the machine will not take: the house rule (null where none is at stake), a code, and a sentence for the person at the bench. */
export interface Refusal {
  rule: RuleId | null;
  code: 'house-rule' | 'not-now' | 'unknown-row' | 'too-early' | 'bad-answer' | 'instrument' | 'closed' | 'restarted' | 'overdue' | 'not-allowed';
  say: string;
}

export type Judged = { ok: true; next: RunContext } | { ok: false; refusal: Refusal };

/** The event is taken, and this is where it leads. */
export const accept = (next: RunContext): Judged => ({ ok: true, next });
/** The event is not taken: the run stays as it was. */
export const refuse = (code: Refusal['code'], say: string, rule: RuleId | null = null): Judged => ({ ok: false, refusal: { rule, code, say } });

/** Classes of temporary things that the machine's close-out takes out; lifted leads may stay where the end allows it. */
const TAKEN_OUT: readonly string[] = ['link', 'bypass', 'series', 'clip'];

/** Things that close-out will ask to take out. */
export function toTakeOut(fitted: Facts['fitted']): Facts['fitted'] {
  return fitted.filter((f) => TAKEN_OUT.includes(f.class));
}

/** The needs of a step that the facts do not meet. */
export function unmetNeeds(placed: ProgramStep, facts: Facts): Need[] {
  return needs(placed.step, placed.scope).filter((need) => !holds(facts, need.atom));
}

/** Goes on to a step of the tree, or to what must come before it. */
export function arriveAt(layout: Layout, context: RunContext, key: string): Judged {
  const placed = layout.steps.get(key);
  if (placed === undefined) return refuse('not-now', 'This tree leads to a step that it does not have.');
  if (placed.step.kind === 'call') {
    const landing = follow(layout, key, () => false);
    return landing.key === key ? refuse('not-now', 'This tree calls one that it does not have.') : arriveAt(layout, activate(context, landing.entered), landing.key);
  }
  if (placed.step.kind === 'end') return arriveAtEnd(layout, context, key, placed.step);
  const unmet = unmetNeeds(placed, context.facts);
  if (unmet.length === 0) return accept({ ...context, goto: key, purpose: { is: 'none' } });
  if (unmet.every((need) => holdsButForLapse(context.facts, need.atom))) return accept({ ...context, goto: SAFE.isolate, purpose: { is: 'mend', to: key } });
  return barred(placed, unmet);
}

/** A15: counters of a called tree start at 0 with each activation of it, and so do those of the trees below it. */
export function activate(context: RunContext, entered: readonly string[]): RunContext {
  if (entered.length === 0) return context;
  return { ...context, counters: context.counters.filter((c) => !entered.some((call) => c.key.startsWith(`${call}/`))) };
}

/** Every end but `in service` goes through close-out first; what it claims must hold once that is done. */
function arriveAtEnd(layout: Layout, context: RunContext, key: string, step: StepOf<'end'>): Judged {
  const placed = layout.steps.get(key);
  if (placed === undefined) return refuse('not-now', 'This tree leads to an end that it does not have.');
  if (step.says === 'in-service') {
    const unmet = unmetNeeds(placed, context.facts);
    return unmet.length > 0 ? barred(placed, unmet) : accept({ ...context, goto: SAFE.ended, end: { says: step.says, key }, purpose: { is: 'none' } });
  }
  const unmet = unmetNeeds(placed, closedOut(context.facts));
  if (unmet.length > 0) return barred(placed, unmet);
  return closeOut({ ...context, purpose: { is: 'end', key } }, layout);
}

/** The facts as close-out will leave them, with what taking things out voids. */
function closedOut(facts: Facts): Facts {
  const out = toTakeOut(facts.fitted);
  return applyOps(facts, [...out.flatMap((f) => fitVoids(f.area)), ...out.map((f) => ({ op: 'unfit', id: f.id }) as const)]);
}

/** The next part of close-out that is still owed: make dead, take out, or the end itself. */
export function closeOut(context: RunContext, layout: Layout): Judged {
  if (context.purpose.is !== 'end') return refuse('not-now', 'Nothing is being closed.');
  if (!isProvedDead(context.facts)) return accept({ ...context, goto: SAFE.isolate });
  if (toTakeOut(context.facts.fitted).length > 0) return accept({ ...context, goto: SAFE.takeOut });
  const { key } = context.purpose;
  const step = key === null ? null : layout.steps.get(key)?.step;
  return accept({ ...context, goto: SAFE.ended, end: step?.kind === 'end' ? { says: step.says, key } : { says: 'stopped', key: null } });
}

/** Straight to make-safe; nothing that is true now is asked for. */
export function makeSafe(context: RunContext): RunContext {
  return { ...context, goto: SAFE.isolate, purpose: { is: 'stop' }, grant: null };
}

/**
 * Opens the bench anew for whoever leads now, then makes dead, proves and reads back; the way comes back to where the run stood, or goes on
 * with what the machine was doing.
 */
export function openAnew(layout: Layout, context: RunContext): Judged {
  const at = context.goto ?? context.key;
  if (at === SAFE.ended) return accept(context);
  const own = at === SAFE.opening || layout.steps.get(at)?.builtIn === true;
  return accept({ ...context, purpose: own ? context.purpose : { is: 'mend', to: at }, goto: context.facts.opened ? SAFE.isolate : SAFE.opening });
}

/** After a lapse: back to the step if its needs still hold, through mending if they would, to make-safe if the bench may be live. */
export function comeBack(layout: Layout, context: RunContext, wasLive: boolean): Judged {
  if (context.key === SAFE.opening) return accept({ ...context, goto: SAFE.opening });
  if (context.key === SAFE.ended) return accept({ ...context, goto: SAFE.ended });
  // who knows what has been done to cover and fan meanwhile: what follows stood on them
  if (context.facts.conditions.length > 0) return comeBack(layout, { ...context, facts: { ...context.facts, conditions: [] } }, true);
  if (context.readBack && !wasLive) return openAnew(layout, context);
  if (wasLive || layout.steps.get(context.key)?.builtIn === true) return accept(context.purpose.is === 'none' || wasLive ? makeSafe(context) : { ...context, goto: SAFE.isolate });
  const arrived = arriveAt(layout, context, context.key);
  return arrived.ok ? arrived : accept(makeSafe(context));
}

/** Applies what a step makes worse at the moment at which its action is shown. */
export function enter(context: RunContext, placed: ProgramStep): RunContext {
  return { ...context, facts: applyOps(context.facts, entered(placed.step, placed.scope)) };
}

/** True while the bench may be live: some source in, or not known while an energise is in force. */
export function mayBeLive(context: RunContext): boolean {
  return isLive(context.facts) || context.live !== null;
}

function barred(placed: ProgramStep, unmet: readonly Need[]): Judged {
  // shown once each, worst rule first in document order of the needs
  const first = unmet[0];
  const why = [...new Set(unmet.map((n) => n.say))].join('; ');
  return refuse('house-rule', `“${placed.step.title}” may not be entered: ${why}.`, first?.rule ?? null);
}
