import { describe, expect, it } from 'vitest';

import { groupsOf } from '@/flows/evidence/groups';
import { misreads } from '@/flows/evidence/misreads';

import { end, look, observe, treeOf } from '../support/steps';

const suspects = ['a', 'b', 'c', 'd'].map((id) => ({ id, part: id, mode: 'open', prior: 1, killedBy: [] }));
const words = (given: Record<string, string>) => Object.entries(given).map(([suspect, says]) => ({ suspect, says }));
const check = (id: string, good: string, bad: string, onGood: Record<string, string>, onBad: Record<string, string>) =>
  observe(id, good, {
    exits: [
      { id: 'good', label: 'Good', on: ['answer'], to: good, evidence: words(onGood) },
      { id: 'bad', label: 'Bad', on: ['answer'], to: bad, verdict: 'fail', evidence: words(onBad) },
      { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' },
    ],
  });
const found = (id: string, suspect: string) => end(id, 'fault-found', { suspect, retest: 'The rails.' });

describe('groupsOf', () => {
  it('names the suspects of which every reachable exit says the same', () => {
    const tree = treeOf(
      [
        look('one'),
        check('one', 'two', 'refer', { a: 'rules-out', b: 'rules-out' }, { a: 'points-to', b: 'points-to' }),
        check('two', 'done', 'refer', {}, { c: 'points-to', d: 'says-nothing' }),
      ],
      { suspects },
    );
    expect(groupsOf(tree).map((g) => g.map((s) => s.id))).toEqual([['a', 'b']]);
  });

  it('does not count what only a step says that no way leads to', () => {
    const tree = treeOf([look('done'), check('lost', 'done', 'refer', {}, { a: 'all-but-proves' })], { suspects });
    expect(groupsOf(tree).map((g) => g.map((s) => s.id))).toEqual([['a', 'b', 'c', 'd']]);
  });
});

describe('misreads', () => {
  it('finds the one answer on which a verdict hangs', () => {
    const tree = treeOf([look('one'), check('one', 'done', 'is-a', { a: 'points-away' }, { a: 'all-but-proves' }), found('is-a', 'a')], {
      suspects,
    });
    expect(misreads(tree)).toEqual([{ end: 'is-a', suspect: 'a', check: 'one', read: 'bad', truly: 'good', instead: 'b' }]);
  });

  it('finds none where two checks bear the verdict out, and either alone would do', () => {
    const tree = treeOf(
      [
        look('one'),
        check('one', 'done', 'two', {}, { a: 'all-but-proves' }),
        check('two', 'done', 'is-a', { a: 'points-away' }, { a: 'all-but-proves' }),
        found('is-a', 'a'),
      ],
      { suspects },
    );
    expect(misreads(tree)).toEqual([]);
  });

  it('says so where the end names a suspect whom the way to it does not make the likeliest', () => {
    const tree = treeOf([look('one'), check('one', 'done', 'is-a', {}, { b: 'points-to' }), found('is-a', 'a')], { suspects });
    expect(misreads(tree)).toMatchObject([{ end: 'is-a', check: 'is-a', instead: 'b' }]);
  });
});
