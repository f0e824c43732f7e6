/** The state of a run: from its snapshot where that still fits, otherwise from its entries, which are the truth. */
import type { Tx } from '@/db/createDb';
import type { RunHeadRow, RunRow } from '@/db/tables';
import { advance, startRun } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import type { Program } from '@/flows/machine/compile';
import { machineEventSchema } from '@/flows/machine/events';
import type { MachineEvent } from '@/flows/machine/events';
import { startSchema } from '@/shared/contract/runs';
import type { RunStart } from '@/shared/contract/runs';
import type { RecordEntry } from '@/shared/record/recordEntry';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { getProgram, programKey } from '../program/runDocuments';
import { wantThisEngine } from '../runs/stranded';
import { findEntries } from './queries';

export interface Standing {
  program: Program;
  state: RunState;
}

/** Program and state of a run at its head. Throws `other-engine` for a run of another engine. */
export async function getStanding(tx: Tx, parts: Parts, run: RunRow, head: Pick<RunHeadRow, 'seq'>): Promise<Standing> {
  wantThisEngine(run);
  const program = await getProgram(tx, parts.programs, run);
  const key = snapshotKey(run, program);
  const kept = await tx.selectFrom('snapshots').select(['program', 'seq', 'state']).where('run', '=', run.id).executeTakeFirst();
  if (kept !== undefined && kept.program === key && kept.seq === head.seq) return { program, state: kept.state as RunState };
  return { program, state: replay(program, await findEntries(tx, run.id)) };
}

/** Keeps the state for the next time; it is thrown away when anything that it was made from has changed. */
export async function keepSnapshot(tx: Tx, run: RunRow, { program, state }: Standing, seq: number): Promise<void> {
  const row = { program: snapshotKey(run, program), seq, state: JSON.stringify(state) };
  await tx
    .insertInto('snapshots')
    .values({ run: run.id, workshop: run.workshop, ...row })
    .onConflict((conflict) => conflict.column('run').doUpdateSet(row))
    .execute();
}

/** Plays all entries from the first. Throws when this engine no longer takes what another one took. */
export function replay(program: Program, entries: readonly RecordEntry[]): RunState {
  const first = entries[0];
  if (first === undefined) throw new Error('a record without an entry');
  let state = startRun(program, startOf(first));
  for (const entry of entries) {
    const event = eventOf(entry);
    if (event === null) continue;
    const step = advance(program, state, event);
    if (!step.ok) {
      throw new ProblemError('wrong-state', `This run was made under older rules: entry ${entry.seq} is not taken any more (${step.refusal.say}). Make the bench safe, and start anew.`, { rule: step.refusal.rule });
    }
    state = step.state;
  }
  return state;
}

/** What the run started from, out of its `opened` entry. */
export function startOf(opened: RecordEntry): RunStart {
  return startSchema.parse(opened.body['start']);
}

/** The machine's event in an entry, or null in one that is about something else. */
export function eventOf(entry: RecordEntry): MachineEvent | null {
  const event = entry.body['event'];
  return event === undefined || event === null ? null : machineEventSchema.parse(event);
}

function snapshotKey(run: RunRow, program: Program): string {
  return `${program.engine}:${programKey(run)}`;
}
