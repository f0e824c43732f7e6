/** What a record says of a part that is not original, of test conditions, and of a connector that was found off. */
import { describe, expect, it } from 'vitest';

import { view } from '@/flows/machine/view';
import { entryWords } from '@/shared/ui/screens/records/entryWords';
import type { RecordEntry } from '@/shared/record/recordEntry';
import { parseProfile, parseTree } from '@/flows/document/parseTree';
import harness from '@/flows/library/as-found-harness.json';
import makeDead from '@/flows/library/make-dead.json';
import ostrel from '@/db/seeds/demo/profiles/ostrel-16.json';
import { Bench, must, program } from '@/tests/flows/support/bench';
import type { BareEvent } from '@/tests/flows/support/bench';
import { dead, hands, look, observe, step, treeOf } from '@/tests/flows/support/steps';

/** The words of the entry that this event leaves at this bench. */
function wordsOf(bench: Bench, kind: RecordEntry['kind'], event: BareEvent) {
  const entry = { id: 'e', seq: 1, kind, body: {}, at: '' } as unknown as RecordEntry;
  const before = view(bench.program, bench.state);
  return entryWords({ entry, event: bench.stamp(event), before, after: null }, { entries: [], readings: new Map(), instruments: [] });
}

/** The warning of the step, read. */
function read(bench: Bench): void {
  while (bench.view.phase === 'warning') bench.do({ type: 'WARNING_READ', step: bench.view.key });
}

describe('the words of a record', () => {
  it('say what an answer shows of a part', () => {
    const tree = treeOf([
      observe('make', 'done', {
        exits: [
          { id: 'other', label: 'The diode', on: ['answer'], to: 'done', shows: 'not-original', evidence: [{ suspect: 'diode', says: 'points-to' }] },
          { id: 'none', label: 'None', on: ['answer'], to: 'done' },
          { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' },
        ],
      }),
    ]);
    const bench = new Bench(program(tree)).pass();
    expect(wordsOf(bench, 'answer', { type: 'ANSWER', step: 'make', answer: 'other' })).toEqual({ what: 'The diode', detail: expect.stringMatching(/^Not original: /) as string });
    expect(wordsOf(bench, 'answer', { type: 'ANSWER', step: 'make', answer: 'none' })).toEqual({ what: 'None', detail: null });
  });

  it('say which test conditions were confirmed', () => {
    const bench = new Bench(program(treeOf([look('d1'), dead('d1', 'cover'), step('do', 'cover', 'touch', { contact: 'cover', confirms: ['cover-on', 'forced-air'] }), hands('touch', 'done')])));
    bench.answer('good').dead();
    expect(wordsOf(bench, 'answer', { type: 'ANSWER', step: 'cover', answer: 'done' }).detail).toBe('cover on, as in service\nforced air, as in service');
    expect(wordsOf(bench, 'answer', { type: 'ANSWER', step: 'cover', answer: 'not-sure' }).detail).toBeNull();
  });

  it('name the boards beside a connector that was found off, and only there', () => {
    const bench = new Bench(program(must(parseTree(harness)), must(parseProfile(ostrel)), [must(parseTree(makeDead))]));
    bench.pass().dead().answer('sound');
    read(bench);
    bench.do({ type: 'PHOTO', step: 'photo', photo: '0'.repeat(64) });
    read(bench);
    const row = bench.view.current!.row.id;
    expect(wordsOf(bench, 'answer', { type: 'ROW', step: 'seen', row, word: 'off' }).detail).toMatch(/^Serves \+5 V\. Boards on it: /);
    expect(wordsOf(bench, 'answer', { type: 'ROW', step: 'seen', row, word: 'on' }).detail).toBeNull();
  });
});
