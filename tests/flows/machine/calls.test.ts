/** Trees that call trees that call trees: laid out, led through, and refused where they go round or grow without bound. */
import { describe, expect, it } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { machineEventSchema } from '@/flows/machine/events';
import { layOut, MOST_DEPTH, MOST_STEPS } from '@/flows/machine/program';
import { prove } from '@/flows/proof/prove';

import { Bench, benchProfile, makeDeadTree, program } from '../support/bench';
import { dead, end, hands, look, observe, step, treeJson, treeOf } from '../support/steps';

type Json = Record<string, unknown>;
const call = (id: string, tree: string, to: string, extra: Json = {}) => ({ ...dead(id, to), tree, exits: [{ id: 'done', on: ['done'], to }], ...extra });
const pairOf = (tree: Tree, callees: readonly Tree[]) => ({ tree, callees, profile: benchProfile, settings: defaultSettings });
const faultsOf = (tree: Tree, callees: readonly Tree[]) => layOut(pairOf(tree, callees)).faults.map((f) => `${f.step ?? 'head'}|${f.key}|${f.message}`);

const both = (to: string) => ({ exits: [{ id: 'both', on: ['done', 'refer'], to }] });

const inner = treeOf([dead('safe', 'touch'), hands('touch', 'done')], { id: 'inner' });
const middle = treeOf([call('first', 'inner', 'second', both('second')), call('second', 'inner', 'done', both('done'))], { id: 'middle' });
const outer = treeOf([look('deep'), call('deep', 'middle', 'after'), hands('after', 'done')], { id: 'outer' });
const below = [makeDeadTree, inner, middle];

describe('calls below calls', () => {
  it('have a key and a stud for each step, however deep', () => {
    const { layout, faults } = layOut(pairOf(outer, below));
    expect(faults).toEqual([]);
    expect(layout.steps.get('deep/second/safe/prove')).toMatchObject({ caller: 'deep/second/safe', top: 'deep', stud: '2b.1c' });
  });
  it('are proved and led through to the end', () => {
    expect(prove(pairOf(outer, below)).rules.filter((r) => !r.holds)).toEqual([]);
    const bench = new Bench(program(outer, benchProfile, below));
    bench.pass().answer('good');
    const walked: string[] = [];
    for (let i = 0; i < 40 && bench.view.phase !== 'ended'; i += 1) {
      walked.push(bench.view.key);
      bench.pass();
      if (bench.view.key === walked.at(-1)) bench.do({ type: 'ANSWER', step: bench.view.key, answer: 'done' });
    }
    expect(walked.filter((key) => key.endsWith('touch'))).toEqual(['deep/first/touch', 'deep/second/touch']);
    expect(bench.view.end?.says).toBe('cleared');
  });
  it('take Stop at the deepest step', () => {
    const bench = new Bench(program(outer, benchProfile, below));
    bench.pass().answer('good').pass();
    expect(bench.view.key).toBe('deep/first/safe/discharge');
    expect(bench.do({ type: 'STOP' }).view.key).toBe('~isolate');
  });
  it('tell a story by all the calls that its place stands under', () => {
    const bare = treeOf([hands('touch', 'done', { title: 'Touch it' })], { id: 'inner' });
    const h1 = prove(pairOf(outer, [makeDeadTree, bare, middle])).rules.find((r) => r.id === 'H1');
    expect(h1?.holds).toBe(false);
    expect(h1?.path.at(-1)).toBe('deep/first/touch');
    expect(h1?.story).toMatch(/could reach “Touch it” in “first” in “deep” although/);
  });
  it('count an exit anew at each activation, and the exit of a call in the tree that calls', () => {
    const unsure = (id: string, to: string) => observe(id, to, { exits: [{ id: 'good', label: 'Good', on: ['answer'], to }, { id: 'again', label: 'Again', on: ['answer'], to: id, atMost: 2, then: 'refer' }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' }] });
    const low = treeOf([unsure('see', 'done')], { id: 'low' });
    const mid = treeOf([{ ...call('one', 'low', 'two'), exits: [{ id: 'done', on: ['done'], to: 'two' }, { id: 'refer', on: ['refer'], to: 'one', atMost: 1, then: 'done' }] }, call('two', 'low', 'done', both('done'))], { id: 'mid' });
    const tree = treeOf([look('go'), call('go', 'mid', 'done')], {});
    const bench = new Bench(program(tree, benchProfile, [low, mid]));
    bench.pass().answer('good');
    const say = (answer: string) => {
      bench.answer(answer);
      return bench.view.key;
    };
    expect(['again', 'again', 'again'].map(say)).toEqual(['go/one/see', 'go/one/see', 'go/one/see']);
    // the counted exit of the call has been taken once; a new activation counts its own exits from nought
    expect(['again', 'again'].map(say)).toEqual(['go/one/see', 'go/one/see']);
    // and the second time the call itself is over
    expect(say('again')).toBe('~isolate');
  });
  it('fit the form of an entry at their deepest', () => {
    const key = Array.from({ length: MOST_DEPTH + 1 }, () => 'a'.repeat(40)).join('/');
    expect(machineEventSchema.safeParse({ type: 'WARNING_READ', step: key, at: 1, monotonic: 1, boot: 'b' }).success).toBe(true);
    expect(machineEventSchema.safeParse({ type: 'WARNING_READ', step: `${key}/`, at: 1, monotonic: 1, boot: 'b' }).success).toBe(false);
  });
});

describe('calls that are refused', () => {
  it('go round, and the round is named', () => {
    const a = treeOf([look('b'), call('b', 'b', 'done')], { id: 'a' });
    const b = treeOf([observe('see', 'c'), call('c', 'c', 'done')], { id: 'b' });
    const c = treeOf([observe('see', 'again'), call('again', 'b', 'done')], { id: 'c' });
    expect(faultsOf(a, [a, b, c])).toContain('b/c/again|tree|H19: the calls go round: b → c → b');
    expect(faultsOf(treeOf([look('me'), call('me', 'a', 'done')], { id: 'a' }), [a])).toContain('me|tree|H19: the calls go round: a → a');
    const proof = prove(pairOf(a, [a, b, c]));
    expect(proof.holds).toBe(false);
    expect(proof.rules.find((r) => r.id === 'H19')?.story).toMatch(/b → c → b/);
  });
  it('name a tree that is not there, wherever it is called', () => {
    const mid = treeOf([observe('see', 'gone'), call('gone', 'ghost', 'done')], { id: 'mid' });
    expect(faultsOf(treeOf([look('go'), call('go', 'mid', 'done')]), [mid])).toContain('go/gone|tree|no issued tree "ghost"');
  });
  it('name two versions of one tree', () => {
    const mid = treeOf([{ ...dead('safe', 'done'), version: 2 }], { id: 'mid' });
    expect(faultsOf(treeOf([look('safe'), dead('safe', 'go'), call('go', 'mid', 'done')]), [makeDeadTree, mid])).toEqual(['go/safe|version|H19: calls version 2 of "make-dead", and “safe” calls version 1: a run is led by one version of it']);
  });
  it('go deeper than a key can say', () => {
    const chain = Array.from({ length: MOST_DEPTH + 2 }, (_, i) => treeOf([observe('see', 'next'), i > MOST_DEPTH ? hands('next', 'done') : call('next', `t${i + 1}`, 'done')], { id: `t${i}` }));
    expect(faultsOf(chain[0]!, chain).join('\n')).toMatch(/calls go more than 8 deep: t0 → t1/);
    // one less is laid out
    expect(faultsOf(chain[1]!, chain).join('\n')).not.toMatch(/deep/);
  });
  it('come to more steps than can be proved, and that is a finding in bounded time, never a pass', { timeout: 20_000 }, () => {
    // each level calls the next twelve times: 12 × 12 × 12 × 12 × 12 of them
    const wide = (level: number) => treeOf(Array.from({ length: 12 }, (_, i) => call(`c${i}`, `w${level + 1}`, i === 11 ? 'done' : `c${i + 1}`)), { id: `w${level}` });
    const trees = [0, 1, 2, 3, 4].map(wide);
    const last = treeOf([dead('safe', 'done')], { id: 'w5' });
    const proof = prove(pairOf(trees[0]!, [...trees, last, makeDeadTree]));
    expect(proof.holds).toBe(false);
    expect(proof.faults).toEqual([expect.objectContaining({ message: `H19: with all that it calls this tree comes to more than ${MOST_STEPS} steps` })]);
  });
  it('begin with an end', () => {
    const json = treeJson([]);
    expect(() => treeOf([], { ...json, steps: undefined })).toThrow();
    expect(() => treeOf([end('nothing', 'cleared'), observe('see', 'nothing')])).toThrow(/does not begin with an end/);
  });
  it('leave a source in that was out, at any depth', () => {
    const on = treeOf([step('energise', 'on', 'done', { source: 'mains', through: 'lamp', node: 'inlet', load: 'none', lampWatts: 60, mostVolts: 230, mostAmps: 0.5, longestMinutes: 10, abort: 'abort' }, 'abort')], { id: 'on' });
    const mid = treeOf([call('go', 'on', 'done', both('done'))], { id: 'mid' });
    const h19 = prove(pairOf(treeOf([look('go'), call('go', 'mid', 'done')]), [makeDeadTree, on, mid])).rules.find((r) => r.id === 'H19');
    expect(h19?.story).toMatch(/may be in when it comes back/);
  });
});
