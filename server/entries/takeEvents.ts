/** Taking events of the machine into a record: the engine judges each, and what it takes is sealed with all that follows from it. */
import type { Tx } from '@/db/createDb';
import type { RunHeadRow, RunRow } from '@/db/tables';
import { advance } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import { bandOf } from '@/flows/facts/band';
import type { MachineEvent } from '@/flows/machine/events';
import type { Json } from '@/shared/record/canonical';
import type { RecordEntry } from '@/shared/record/recordEntry';

import { askForCountersign } from '../mail/askForCountersign';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { headOf } from '../program/headOf';
import { setRestorer } from '../runs/queries';
import { appendEntries } from './appendEntries';
import type { NewEntry } from './appendEntries';
import { closeRun } from './closeRun';
import { setHead } from './queries';
import { getStanding, keepSnapshot } from './runState';
import { voidReleases } from './voidReleases';

export interface TakenEvent {
  id: string;
  actor: string;
  event: MachineEvent;
  /** of the one who takes the run over, as they stand now */
  roles?: readonly string[];
}

/**
 * Takes `events` in order, all or none. Throws `refused` with the house rule at the first that the engine does not take.
 * @param head locked in the same transaction
 */
export async function takeEvents(tx: Tx, parts: Parts, run: RunRow, head: RunHeadRow, events: readonly TakenEvent[]): Promise<RecordEntry[]> {
  const { program, state: before } = await getStanding(tx, parts, run, head);
  const now = parts.clock();
  let state = before;
  let hold = head.hold_entry;
  let voidedBy: string | null = null;
  const drafts: NewEntry[] = [];
  const asked: { entry: string; step: string }[] = [];
  let led: { restorer: string; roles: readonly string[] } | null = null;
  for (const { id, actor, event, roles } of events) {
    const from = state.context;
    const taken = advance(program, state, event);
    if (!taken.ok) {
      const { rule, code, say } = taken.refusal;
      throw new ProblemError('refused', say, { rule, refusal: code, entry: id, seq: head.seq + drafts.length + 1 });
    }
    state = taken.state;
    const title = program.layout.steps.get(from.key)?.step.title ?? null;
    drafts.push({ id, actor, kind: taken.kind, at: new Date(event.at).toISOString(), monotonic: Math.round(event.monotonic), body: bodyOf(event, from.key, title, state) });
    if (state.context.restorer !== from.restorer) led = { restorer: state.context.restorer, roles: roles ?? [] };
    if (event.type === 'HOLD_ASKED') {
      hold = id;
      asked.push({ entry: id, step: title ?? from.key });
    }
    if (state.context.phase !== 'hold-wait') hold = null;
    if (from.facts.release === 'valid' && state.context.facts.release === 'none') voidedBy = id;
  }
  const entries = await appendEntries(tx, head, drafts, now);
  await setHead(tx, run.id, { ...headOf(program, state), hold_entry: hold });
  await keepSnapshot(tx, run, { program, state }, head.seq);
  if (led !== null) await setRestorer(tx, run, led);
  for (const ask of asked) if (ask.entry === hold) await askForCountersign(tx, { workshop: run.workshop, run: run.id, ledBy: state.context.restorers, ...ask });
  if (voidedBy !== null) await voidReleases(tx, run, voidedBy, now);
  if (state.context.phase === 'closed') await closeRun(tx, run, state, now);
  return entries;
}

function bodyOf(event: MachineEvent, step: string, title: string | null, after: RunState): Record<string, Json> {
  const { outcome, key, phase, facts } = after.context;
  // Through JSON once, so that what is hashed is exactly what will be read back: no undefined members.
  return JSON.parse(JSON.stringify({ event, step, title, outcome, then: key, phase, band: bandOf(facts) })) as Record<string, Json>;
}
