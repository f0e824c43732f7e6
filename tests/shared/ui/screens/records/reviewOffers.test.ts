import { describe, expect, it } from 'vitest';

import type { Role } from '@/shared/contract/people';
import type { RecordView } from '@/shared/contract/records';
import type { RunState } from '@/shared/contract/runSummary';
import { reviewOffers } from '@/shared/ui/screens/records/reviewOffers';
import { goodRun, people } from '@/tests/shared/ui/screens/sampleRecord';

const none: RecordView['may'] = { submit: false, find: false, return: false, reply: false, accept: false, release: false };
const bench = goodRun();

function offers(who: keyof typeof people, roles: Role[], state: RunState, may: Partial<RecordView['may']> = {}) {
  const record = bench.record({ may: { ...none, ...may } }, state);
  return reviewOffers(record, { person: { id: people[who], code: 'X', name: 'X', mail: 'x@example.org' }, roles });
}

describe('reviewOffers', () => {
  it('offers a reviewer who took no part what the server allows, and says why no release goes with it', () => {
    const got = offers('rita', ['reviewer'], 'submitted', { find: true, return: true, accept: true });
    expect(got).toMatchObject({ find: true, return: true, accept: true, reply: false, submit: false });
    expect(got.why).toEqual([expect.stringContaining('No release goes with it')]);
  });

  it('tells the one who countersigned that another reviewer has to accept', () => {
    expect(offers('sam', ['senior', 'reviewer'], 'submitted', { find: true, return: true }).why).toEqual([
      expect.stringContaining('You countersigned in this run'),
    ]);
  });

  it('tells the restorer that another person reviews the own run, also one who is a reviewer', () => {
    expect(offers('ann', ['restorer', 'reviewer'], 'submitted').why).toEqual([expect.stringContaining('your own run')]);
  });

  it('tells a member without the role so', () => {
    expect(offers('rita', ['senior'], 'submitted').why).toEqual(['Only a reviewer can remark on, return or accept a record.']);
  });

  it.each([
    ['closed', 'Not submitted'],
    ['returned', 'waits for the answer'],
    ['accepted', 'is accepted'],
  ] as const)('says of a record that is %s why a reviewer can do nothing', (state, words) => {
    expect(offers('rita', ['reviewer'], state).why).toEqual([expect.stringContaining(words)]);
  });

  it('offers the restorer the answer to a returned record', () => {
    expect(offers('ann', ['restorer'], 'returned', { reply: true })).toMatchObject({ reply: true, accept: false });
  });
});
