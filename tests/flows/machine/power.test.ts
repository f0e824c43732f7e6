/** Power that is on: when its time is up, when it is broken off, and when a run has stopped or ended. */
import { describe, expect, it } from 'vitest';

import { Bench, benchProfile, program } from '../support/bench';
import { bench as feed, connect, dead, earth, end, insulation, lamp, look, observe, returns, step, treeOf } from '../support/steps';

type Json = Record<string, unknown>;
const ready = (next: string): Json[] => [look('d1'), dead('d1', 'returns'), returns('earth'), earth('insulation'), insulation('d2'), dead('d2', next)];
/** Walks to the guard of a step of power, and past it. */
const on = (run: Bench, key: string): Bench => {
  for (let i = 0; i < 60 && run.view.key !== key; i += 1) {
    const before = run.view.key;
    run.pass();
    if (run.view.key === before) run.answer('good');
  }
  expect(run.view.key).toBe(key);
  return run.pass();
};

describe('power that is on', () => {
  const raise = step('raise', 'up', 'abort', { contact: 'none', source: 'bench', through: 'bench', node: 'raw', load: 'none', mostVolts: 12, mostAmps: 1, longestMinutes: 10, abort: 'abort' }, 'abort');
  const tree = treeOf([...ready('feed'), feed('feed', 'up'), raise]);
  it('is not raised once its time is up', () => {
    const run = on(new Bench(program(tree)), 'feed').do({ type: 'ANSWER', step: 'feed', answer: 'on' });
    if (run.view.phase === 'warning') run.do({ type: 'WARNING_READ', step: 'up' });
    expect(run.view.phase).toBe('guard');
    run.at += 11 * 60_000;
    expect(run.try({ type: 'GUARD_HELD', step: 'up', heldMs: 2100 })).toMatchObject({ ok: false, refusal: { rule: 'H11', code: 'overdue' } });
    expect(run.try({ type: 'ABORT' }).ok).toBe(true);
    expect(run.view.key).toBe('abort/isolate');
  });
  it('is broken off at its own step, and not while it is being made safe', () => {
    const run = on(new Bench(program(tree)), 'feed');
    expect(run.do({ type: 'STOP' }).view.key).toBe('~isolate');
    expect(run.try({ type: 'ABORT' })).toMatchObject({ ok: false, refusal: { code: 'not-now' } });
    expect(run.view.key).toBe('~isolate');
  });
});

describe('a place to go on from after Stop', () => {
  it('may be a call: the run goes on at the first step that it leads to', () => {
    const tree = treeOf([look('d1'), dead('d1', 'load'), connect('load', 'light', 'see'), observe('see', 'done')], { reentries: [{ step: 'd1', needs: ['looked'] }] });
    const run = new Bench(program(tree)).pass().answer('good').dead();
    run.do({ type: 'STOP' }).dead();
    expect(run.view.reentries.map((r) => r.key)).toEqual(['d1']);
    expect(run.do({ type: 'REENTER', step: 'd1' }).view.key).toBe('d1/isolate');
  });
});

describe('a run that has ended in service', () => {
  it('is not led back into its tree by breaking the power off', () => {
    const proved = { ...benchProfile, rails: benchProfile.rails.map((r) => ({ ...r, trip: null })) };
    const tree = treeOf([...ready('lamp'), lamp('lamp', 'on'), end('on', 'in-service')]);
    const run = on(new Bench(program(tree, proved), true, { release: true }), 'lamp');
    // what the end claims does not hold here, so the state after such an end is set by hand
    const state = run.state;
    run.state = { value: '~ended', context: { ...state.context, key: '~ended', phase: 'ended', end: { says: 'in-service', key: 'on' } } };
    expect(run.try({ type: 'ABORT' })).toMatchObject({ ok: false, refusal: { code: 'not-now' } });
  });
});
