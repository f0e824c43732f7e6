/** What a record's page offers to the person who reads it, and why it does not offer the rest. The server decides again. */
import type { Me } from '@/shared/contract/session';
import type { RecordView } from '@/shared/contract/records';

export interface ReviewOffers {
  find: boolean;
  return: boolean;
  accept: boolean;
  release: boolean;
  reply: boolean;
  submit: boolean;
  /** why something that one may look for is not here, a sentence each */
  why: string[];
}

/** From the server's word on what may be done, the state of the record and the person's part in it. */
export function reviewOffers(
  { may, run, entries }: Pick<RecordView, 'may' | 'run' | 'entries'>,
  { person, roles }: Pick<Me, 'person' | 'roles'>,
): ReviewOffers {
  return { ...may, why: whyNot({ may, run, entries }, person.id, roles) };
}

function whyNot({ may, run, entries }: Pick<RecordView, 'may' | 'run' | 'entries'>, me: string, roles: Me['roles']): string[] {
  if (run.state === 'accepted') return ['This record is accepted. Nothing in it can be changed.'];
  if (run.restorer === me) {
    if (run.state === 'submitted') return ['This is your own run: another person reviews it. It waits for a reviewer.'];
    return may.submit || may.reply
      ? ['This is your own run: another person reviews it.']
      : ['This is your own run, but your roles no longer let you submit it. Ask the keeper of the workshop.'];
  }
  if (!roles.includes('reviewer')) return ['Only a reviewer can remark on, return or accept a record.'];
  if (run.state === 'closed') return ['Not submitted for review yet: its restorer does that.'];
  if (run.state === 'returned') return ['Returned: it waits for the answer of its restorer.'];
  const tookPart = entries.some((entry) => entry.actor === me && entry.body['event'] !== undefined);
  if (!may.accept && tookPart) return ['You countersigned in this run, so another reviewer has to accept it.'];
  return may.accept && !may.release ? ['No release goes with it: that rests only on a run that ended with the supply proven.'] : [];
}
