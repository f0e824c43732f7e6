/** The review of a record: submitted, remarked on, returned, answered, accepted. */
import { v7 as uuidv7 } from 'uuid';

import type { Tx } from '@/db/createDb';
import type { RunHeadRow, RunRow } from '@/db/tables';
import type { BodyOf } from '@/shared/contract/defineRoute';
import type { routes } from '@/shared/contract/routes';

import { appendEntries } from '../entries/appendEntries';
import { findEntries, findEntriesById } from '../entries/queries';
import { ProblemError } from '../problems';
import { wantRestorer } from '../runs/access';
import type { SignedIn } from '../session/access';
import { tookPart, wantReviewer } from './access';
import { recordAct } from './recordAct';
import type { Acted } from './recordAct';

type Who = Pick<SignedIn, 'person'>;
const UNDER_REVIEW = ['submitted'] as const;

/** Hands a closed run in for review; its restorer alone does that. */
export function submitRecord(tx: Tx, now: number, who: Who, run: string, body: BodyOf<typeof routes.submit>): Promise<Acted> {
  const act = { id: body.id, kind: 'submitted', body: body.remark === undefined ? {} : { remark: body.remark }, from: ['closed'], to: 'submitted', otherwise: 'Only a run that has just been closed can be submitted.' } as const;
  return recordAct(tx, now, who.person, run, act, (row) => wantRestorer(who, row));
}

/** Remarks on one entry of a record under review. */
export function addFinding(tx: Tx, now: number, who: Who, run: string, body: BodyOf<typeof routes.addFinding>): Promise<Acted> {
  const act = { id: body.id, kind: 'finding', body: { entry: body.entry, grade: body.grade, text: body.text }, from: UNDER_REVIEW, to: 'submitted', otherwise: 'Findings are made while the record is under review.' } as const;
  return recordAct(tx, now, who.person, run, act, async (row) => {
    wantReviewer(who, row);
    if ((await findEntriesById(tx, run, [body.entry])).length === 0) {
      throw new ProblemError('bad-input', 'The finding is about an entry that this record does not have.', { faults: [{ path: 'entry', message: 'is not in this record' }] });
    }
  });
}

/** Sends a record back to its restorer with questions. */
export function returnRecord(tx: Tx, now: number, who: Who, run: string, body: BodyOf<typeof routes.returnRecord>): Promise<Acted> {
  const act = { id: body.id, kind: 'returned', body: { questions: body.questions }, from: UNDER_REVIEW, to: 'returned', otherwise: 'Only a record under review can be returned.' } as const;
  return recordAct(tx, now, who.person, run, act, (row) => wantReviewer(who, row));
}

/** Answers the questions; the record is under review again. */
export function replyToReview(tx: Tx, now: number, who: Who, run: string, body: BodyOf<typeof routes.reply>): Promise<Acted> {
  const act = { id: body.id, kind: 'reply', body: { text: body.text }, from: ['returned'], to: 'submitted', otherwise: 'Only a returned record has questions to answer.' } as const;
  return recordAct(tx, now, who.person, run, act, (row) => wantRestorer(who, row));
}

/** Accepts a record, once and for all, and gives the release where that is asked for. The password has been checked. */
export function acceptRecord(tx: Tx, now: number, who: Who, run: string, body: Omit<BodyOf<typeof routes.accept>, 'password'>): Promise<Acted> {
  const act = { id: body.id, kind: 'accepted', body: { meaning: body.meaning, release: body.release }, from: UNDER_REVIEW, to: 'accepted', otherwise: 'Only a record under review can be accepted, and only once.' } as const;
  return recordAct(
    tx, now, who.person, run, act,
    async (row) => {
      wantReviewer(who, row);
      if (tookPart(who.person, row, await findEntries(tx, run))) throw new ProblemError('countersigned-run');
      if (body.release) await wantReleasable(tx, row);
    },
    async (row, head) => {
      if (body.release) await giveRelease(tx, row, head, who.person, now);
    },
  );
}

async function wantReleasable(tx: Tx, run: RunRow): Promise<void> {
  if (run.ended !== 'supply-proven') {
    throw new ProblemError('bad-input', 'A release rests on a run that ended with the supply proven; this one did not.', { faults: [{ path: 'release', message: 'this run did not end with the supply proven' }] });
  }
  const later = await tx.selectFrom('runs').select('id').where('machine', '=', run.machine).where('started_at', '>=', run.closed_at ?? run.started_at).where('id', '!=', run.id).executeTakeFirst();
  if (later !== undefined) throw new ProblemError('wrong-state', 'There was another run on this machine since. The supply has to be proven again before it is released.', { run: later.id });
}

async function giveRelease(tx: Tx, run: RunRow, head: RunHeadRow, person: string, now: number): Promise<void> {
  const release = uuidv7();
  await tx.insertInto('releases').values({ id: release, workshop: run.workshop, machine: run.machine, run: run.id, given_by: person, given_at: new Date(now) }).execute();
  const body = { release, machine: run.machine, says: 'Supply proven, may be refitted.' };
  await appendEntries(tx, head, [{ id: uuidv7(), actor: person, kind: 'released', at: new Date(now).toISOString(), monotonic: 0, body }], now);
}
