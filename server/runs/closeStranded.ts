/** The end of a run that nobody can be led on with: a senior closes it as stopped, and nothing of it is taken for better than it is. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { Facts } from '@/flows/facts/facts';
import { advance, startRun } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import { machineEventSchema } from '@/flows/machine/events';
import type { BodyOf } from '@/shared/contract/defineRoute';
import type { routes } from '@/shared/contract/routes';
import { CLOSES } from '@/shared/contract/strandedRun';
import type { RecordEntry } from '@/shared/record/recordEntry';

import { appendEntries } from '../entries/appendEntries';
import { tagMachine } from '../entries/closeRun';
import { outOfSequence } from '../entries/postEntries';
import { findEntries, findEntriesById, lockHead, setHead } from '../entries/queries';
import { startOf } from '../entries/runState';
import type { Signed } from '../entries/signedEntry';
import { voidReleases } from '../entries/voidReleases';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { getRunDocuments } from '../program/runDocuments';
import type { SignedIn } from '../session/access';
import { getRunFor } from './access';
import { setRunState } from './queries';
import { isStranded } from './stranded';

/** Closes it. The senior's password has been checked. */
export async function closeStranded(tx: Tx, parts: Parts, who: Pick<SignedIn, 'person'>, runId: string, body: Omit<BodyOf<typeof routes.closeStranded>, 'password'>): Promise<Signed> {
  const head = await lockHead(tx, (await getRunFor(tx, runId)).id);
  const run = await getRunFor(tx, runId);
  const [before] = await findEntriesById(tx, run.id, [body.id]);
  if (before !== undefined) {
    if (before.kind !== 'closed' || before.actor !== who.person) throw new ProblemError('id-taken', 'The id of this entry was used before.', { entry: body.id });
    return { entry: before, head: { seq: head.seq, hash: head.hash } };
  }
  wantStranded(run);
  if (body.seq !== head.seq + 1) throw await outOfSequence(tx, head, body.seq);
  const now = parts.clock();
  const entries = await findEntries(tx, run.id);
  const [entry] = await appendEntries(
    tx, head,
    [{ id: body.id, actor: who.person, kind: 'closed', at: new Date(now).toISOString(), monotonic: 0, body: { by: 'senior', reason: body.reason, meaning: CLOSES, engine: run.engine } }],
    now,
  );
  if (entry === undefined) throw new Error('a run was closed without an entry');
  await setHead(tx, run.id, { band: 'unknown', step_key: null, step_title: null, step_stud: null, hold_entry: null, offered_to: null });
  await tagMachine(tx, run, await leftBehind(tx, run, entries), now, 'beside');
  await setRunState(tx, run.id, { state: 'closed', ended: 'stopped', closed_at: new Date(now) });
  // what was done after the last entry that reached the server is not known
  await voidReleases(tx, run, entry.id, now, 'a run on this machine was closed without its end being known');
  return { entry, head: { seq: head.seq, hash: head.hash } };
}

/** Throws `wrong-state` for a run that is over, or that its own restorer can end. */
export function wantStranded(run: RunRow): void {
  if (run.state !== 'open') throw new ProblemError('wrong-state', 'This run is closed already.');
  if (!isStranded(run)) throw new ProblemError('wrong-state', 'This run can be led on: its restorer ends it at the bench, with Stop where nothing else will do.');
}

/** What is fitted and which killers are owed, as far as the engine of now can follow the entries: at the least what the run began with. */
async function leftBehind(tx: Tx, run: RunRow, entries: readonly RecordEntry[]): Promise<Pick<Facts, 'fitted' | 'owed'>> {
  const [opened] = entries;
  if (opened === undefined) return { fitted: [], owed: { doubts: [], fails: [], killers: [] } };
  const start = startOf(opened);
  const compiled = compile(await getRunDocuments(tx, run));
  if (!compiled.ok) return { fitted: start.fitted, owed: { doubts: [], fails: [], killers: start.killers } };
  let state = startRun(compiled.program, start);
  for (const entry of entries) {
    const event = machineEventSchema.safeParse(entry.body['event']);
    if (!event.success) continue;
    const taken = advance(compiled.program, state, event.data);
    if (!taken.ok) break;
    state = taken.state;
  }
  return state.context.facts;
}
