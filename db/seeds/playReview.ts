/** Playing what happened to the record of a demo run after it was closed. */
import { inWorkshop } from '@/db/createDb';
import { findEntries } from '@/server/entries/queries';
import type { Parts } from '@/server/parts';
import { acceptRecord, addFinding, replyToReview, returnRecord, submitRecord } from '@/server/records/service';

import { demoPeople } from './demoPeople';
import type { DemoReview, DemoRun } from './DemoContent';

const BETWEEN_MS = 3 * 3_600_000;

/** Does every act in order, hours apart. */
export async function playReview(parts: Parts, time: { now: number }, workshop: string, runId: string, run: DemoRun, newId: () => string): Promise<void> {
  for (const act of run.review) {
    time.now += BETWEEN_MS;
    await playAct(parts, time.now, workshop, runId, demoPeople[run.restorer].id, act, newId());
  }
}

function playAct(parts: Parts, now: number, workshop: string, run: string, restorer: string, act: DemoReview, id: string): Promise<unknown> {
  return inWorkshop(parts.db, workshop, async (tx) => {
    const by = 'by' in act ? demoPeople[act.by].id : restorer;
    if ('submit' in act) return submitRecord(tx, now, { person: by }, run, { id, ...(act.submit === null ? {} : { remark: act.submit }) });
    if ('returned' in act) return returnRecord(tx, now, { person: by }, run, { id, questions: act.returned });
    if ('reply' in act) return replyToReview(tx, now, { person: by }, run, { id, text: act.reply });
    if ('accepted' in act) return acceptRecord(tx, now, { person: by }, run, { id, meaning: act.accepted, release: act.release === true });
    const about = (await findEntries(tx, run)).filter((entry) => entry.body['step'] === act.step && (act.kind === undefined || entry.kind === act.kind)).at(-1);
    if (about === undefined) throw new Error(`no entry of step ${act.step} to remark on`);
    return addFinding(tx, now, { person: by }, run, { id, entry: about.id, grade: act.grade, text: act.finding });
  });
}
