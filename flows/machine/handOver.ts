/** Handing a run to another restorer: one offers, the other takes, and what is at the bench is read back before the run goes on (C11). */
import { lapseOps, LOAD_ROW, readBackOps } from '../facts/lapse';
import { applyOps } from '../facts/ops';
import type { Op } from '../facts/ops';
import type { Load } from '../document/steps';
import { accept, mayBeLive, openAnew, refuse } from './arrive';
import type { Judged } from './arrive';
import type { RunContext } from './context';
import type { MachineEvent } from './events';
import { SAFE } from './program';
import type { Layout } from './program';
import type { WordRow } from './rows';

type Offer = Extract<MachineEvent, { type: 'HANDED_OVER' }>;
type Taking = Extract<MachineEvent, { type: 'TAKEN_OVER' }>;

/** The restorer offers the run. Until it is taken it stays paused, and the restorer can take the offer back by going on. */
export function offer(context: RunContext, event: Offer): Judged {
  if (event.by !== context.restorer) return refuse('not-allowed', 'Only the restorer of this run can hand it over.');
  if (event.to === context.restorer) return refuse('not-allowed', 'A run is handed over to somebody else.');
  if (context.phase === 'ended') return refuse('not-now', 'The run has reached its end: close the record instead.');
  if (context.handing !== null) return refuse('not-now', 'This run is offered already. Take that offer back first.');
  if (mayBeLive(context)) return refuse('house-rule', 'The bench is live: press Stop and make it safe first. Nobody takes over a live bench.', 'H11');
  const facts = applyOps(context.facts, lapseOps('gap'));
  return accept({ ...context, facts, grant: null, provedAt: null, second: null, handing: { to: event.to, at: event.at }, goto: '~paused' });
}

/**
 * The one who was asked takes the run. Whoever leads next opens the bench, makes it dead and proves it, and reads load and fitted things
 * back; a step that was under way is begun again.
 */
export function takeOver(layout: Layout, context: RunContext, event: Taking): Judged {
  if (context.handing === null) return refuse('not-now', 'This run is not offered to anybody.');
  if (event.by !== context.handing.to) return refuse('not-allowed', 'This run is offered to somebody else.');
  const begun = context.key !== SAFE.opening || context.readBack;
  const changes: Op[] = [
    ...lapseOps('hand-over'),
    // nobody can say whether a load that was being connected is on
    ...(layout.steps.get(context.key)?.step.kind === 'connect-load' ? [{ op: 'load', to: 'boards' } satisfies Op] : []),
  ];
  return openAnew(layout, {
    ...context,
    facts: applyOps(context.facts, changes),
    grant: null,
    provedAt: null,
    second: null,
    handing: null,
    readBack: begun,
    restorer: event.by,
    restorerIsSenior: event.senior,
    restorers: [...context.restorers.filter((id) => id !== event.by), event.by],
    // the next device begins with clocks of its own
    last: { ...context.last, boot: '' },
  });
}

const LOADS: Readonly<Record<Load, string>> = {
  boards: 'the machine’s own boards are connected',
  none: 'nothing is connected to the rails',
  light: 'the light dummy load is on the rails',
  full: 'the full dummy load is on the rails',
};

/** What is read back: the load, each thing that is written as fitted or lifted, and that there is no other. What a step under way is about to do is left to that step. */
export function readBackRows(layout: Layout, context: RunContext): WordRow[] {
  const step = context.purpose.is === 'mend' ? layout.steps.get(context.purpose.to)?.step : undefined;
  const again = step?.kind === 'do' ? [...(step.fits ?? []).map((thing) => thing.id), ...(step.removes ?? [])] : [];
  const things = context.facts.fitted.filter((thing) => !again.includes(thing.id));
  return [
    ...(step?.kind === 'connect-load' ? [] : [row(LOAD_ROW, `Load: ${LOADS[context.facts.load]}`)]),
    ...things.map((thing) => row(thing.id, `${thing.name}: ${thing.class === 'lifted' ? 'is lifted' : 'is in'}`)),
    row('nothing-else', things.length === 0 ? 'Nothing temporary is in: no link, bypass, series part, clip or lifted lead' : 'Nothing else temporary is in'),
  ];
}

/** The facts after the read-back, and whether all of it was so. */
export function readBack(context: RunContext): { facts: RunContext['facts']; so: boolean } {
  const denied = context.rows.filter((answered) => answered.result !== 'done').map((answered) => answered.id);
  return denied.length === 0 ? { facts: context.facts, so: true } : { facts: applyOps(context.facts, readBackOps(context.facts, denied, SAFE.readBack)), so: false };
}

function row(id: string, label: string): WordRow {
  return {
    id,
    label,
    ask: 'word',
    wait: null,
    words: [
      { word: 'done', label: 'Yes, it is so', result: 'done' },
      { word: 'cannot', label: 'No, it is not', result: 'cannot' },
      { word: 'not-sure', label: 'Not sure', result: 'not-sure' },
    ],
  };
}
