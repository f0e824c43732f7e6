import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import { rehearse } from '@/flows/rehearsal/rehearse';

import { libraryTree, programOf } from '../library/walk';
import { makeDeadTree, must, program } from '../support/bench';
import { bench, dead, end, look, observe, step, treeJson, treeOf, work } from '../support/steps';

const suspects = ['a', 'b', 'c'].map((id, i) => ({ id, part: id, mode: 'open', prior: [5, 3, 2][i], killedBy: [] }));
const words = (given: Record<string, string>) => Object.entries(given).map(([suspect, says]) => ({ suspect, says }));
const check = (id: string, good: string, bad: string, onBad: Record<string, string>, extra = {}) =>
  observe(id, good, {
    exits: [
      { id: 'good', label: 'Good', on: ['answer'], to: good },
      { id: 'bad', label: 'Bad', on: ['answer'], to: bad, verdict: 'fail', evidence: words(onBad) },
      { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' },
    ],
    ...extra,
  });
const found = (id: string, suspect: string) => end(id, 'fault-found', { suspect, retest: 'The rails.' });
const of = (steps: Parameters<typeof treeOf>[0], head = {}) => rehearse(program(treeOf(steps, { suspects, ...head })));
const reached = (r: ReturnType<typeof rehearse>) => Object.fromEntries(r.suspects.map((s) => [s.suspect, s.reached]));

describe('rehearse', () => {
  it('leads each suspect by the answers that it would cause, to its verdict, to a group or past it', () => {
    const r = of([look('one'), check('one', 'two', 'is-a', { a: 'all-but-proves' }), check('two', 'done', 'refer', { b: 'points-to' }), found('is-a', 'a')]);
    expect(reached(r)).toEqual({ a: 'verdict', b: 'group', c: 'missed' });
    expect(r.coverage).toEqual({ verdict: expect.closeTo(0.5, 9), group: expect.closeTo(0.3, 9), missed: expect.closeTo(0.2, 9) });
    expect(r.good).toBe(false);
    expect(r.suspects[2]?.end).toMatchObject({ says: 'cleared', key: 'done' });
    expect(r.sound.path).toEqual(['look', 'one', 'two']);
  });

  it('calls it a group where another suspect is named that the tree cannot tell from it', () => {
    const r = of([look('one'), check('one', 'done', 'is-a', { a: 'points-to', b: 'points-to' }), found('is-a', 'a')]);
    expect(reached(r)).toEqual({ a: 'verdict', b: 'group', c: 'missed' });
    expect(r.suspects[1]?.among).toEqual(['a']);
  });

  it('takes a suspect that is mended on the way for found, and its checks for good from then on', () => {
    const r = of([look('d'), dead('d', 'one'), check('one', 'done', 'mend', { a: 'points-to' }), work('mend', 'regulator', 'one', { for: ['one'], suspects: ['a'] })]);
    expect(r.suspects[0]).toMatchObject({ reached: 'verdict', mended: true, end: { says: 'cleared' } });
    expect(r.suspects[0]?.path).toEqual(['look', 'd/isolate', 'd/discharge', 'd/prove', 'one', 'mend', 'one']);
  });

  it('counts the stated minutes, and those with the supply on', () => {
    const r = of([look('d'), dead('d', 'feed'), bench('feed', 'one', { minutes: 2 }), check('one', 'off', 'off', { a: 'points-to' }, { minutes: 5, power: 'live' }), dead('off', 'done')]);
    expect(r.sound.stuck).toBeNull();
    expect(r.sound.minutesLive).toBeGreaterThanOrEqual(5);
    expect(r.sound.minutesLive).toBeLessThan(8);
    expect(r.sound.minutes).toBeGreaterThan(r.sound.minutesLive + 4);
    expect(r.minutes.worst).toBeGreaterThanOrEqual(r.minutes.expected);
  });

  it('finds that the stated minutes do not fit into the longest time of an energise', () => {
    const r = of([look('d'), dead('d', 'feed'), bench('feed', 'one', { longestMinutes: 3 }), check('one', 'off', 'off', { a: 'points-to' }, { minutes: 5, power: 'live' }), dead('off', 'done')]);
    expect(r.good).toBe(false);
    expect(r.sound.stuck).toMatchObject({ at: 'one', rule: 'H11' });
  });

  it('finds the house rule that bars the way of a suspect', () => {
    const r = of([look('one'), check('one', 'done', 'hands', { a: 'points-to' }), step('do', 'hands', 'done', { contact: 'hands' })]);
    expect(r.suspects[0]).toMatchObject({ reached: 'missed', stuck: { at: 'one', rule: 'H1' } });
  });

  it('names a tree that goes round for ever instead of going round with it', () => {
    const r = of([look('one'), check('one', 'done', 'two', { a: 'points-to' }), check('two', 'one', 'one', {})]);
    expect(r.suspects[0]?.stuck?.say).toMatch(/round for ever/);
    expect(r.suspects[0]?.reached).toBe('missed');
  });

  it('leads through a called tree to the end that the call reads as pointing to the suspect', () => {
    const callee = must(parseTree({ ...treeJson([check('deep', 'fine', 'foul', {}), end('fine', 'cleared'), end('foul', 'referred')]), id: 'called', suspects: [], steps: [check('deep', 'fine', 'foul', {}, { exits: [{ id: 'good', label: 'Good', on: ['answer'], to: 'fine' }, { id: 'bad', label: 'Bad', on: ['answer'], to: 'foul', verdict: 'fail' }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'foul' }] }), end('fine', 'cleared'), end('foul', 'referred')] }));
    const tree = treeOf([look('ask'), { ...dead('ask', 'done'), tree: 'called', exits: [{ id: 'fine', on: ['fine'], to: 'done' }, { id: 'foul', on: ['foul'], to: 'is-b', evidence: words({ b: 'points-to' }) }] }, found('is-b', 'b')], { suspects });
    const r = rehearse(program(tree, undefined, [makeDeadTree, callee]));
    expect(r.suspects.find((s) => s.suspect === 'b')).toMatchObject({ reached: 'verdict', path: ['look', 'ask/deep'] });
    expect(reached(r)['a']).toBe('missed');
  });

  it('says which steps nothing comes to, and which only doubt comes to', () => {
    const r = of([look('one'), check('one', 'done', 'is-a', { a: 'all-but-proves' }), found('is-a', 'a'), found('is-b', 'b')]);
    expect(r.neverUsed).toEqual(['is-b']);
    expect(r.onlyWhenUnsure).toEqual(['refer']);
  });

  it('always comes to an end, whatever the tree', () => {
    const target = fc.constantFrom('s0', 's1', 's2', 's3', 's4', 'done', 'refer', 'is-a');
    fc.assert(
      fc.property(fc.array(fc.tuple(target, target, fc.constantFrom('a', 'b', 'c'), fc.constantFrom('points-to', 'rules-out', 'all-but-proves')), { minLength: 5, maxLength: 5 }), (shape) => {
        const r = of([look('s0'), ...shape.map(([good, bad, who, says], i) => check(`s${i}`, good, bad, { [who]: says })), found('is-a', 'a')]);
        for (const s of [r.sound, ...r.suspects]) expect(s.stuck !== null || s.end !== null).toBe(true);
        expect(r.coverage.verdict + r.coverage.group + r.coverage.missed).toBeCloseTo(1, 9);
      }),
      { numRuns: 25 },
    );
  }, 60_000);

  it('of the first power of the library comes to an end with each of its faults, and names nearly all of them', () => {
    const r = rehearse(programOf(libraryTree('first-power'), 'corvane-12'));
    expect(r.sound).toMatchObject({ stuck: null, end: { says: 'supply-proven' } });
    expect(r.suspects.filter((s) => s.stuck !== null)).toEqual([]);
    expect(r.coverage.verdict).toBeGreaterThan(0.85);
  });
});
