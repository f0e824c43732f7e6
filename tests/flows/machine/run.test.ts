import { describe, expect, it } from 'vitest';

import { Bench, lampTree, program } from '../support/bench';

describe('a run of the machine', () => {
  it('starts at the bench opening with everything at its worst', () => {
    const bench = new Bench(program(lampTree));
    expect(bench.view.phase).toBe('opening');
    expect(bench.view.band).toBe('unknown');
    expect(bench.view.facts.stored).toBe('unknown');
  });

  it('leads from the look-over through make dead, earth, insulation and the lamp to its end', () => {
    const bench = new Bench(program(lampTree));
    bench.pass();
    expect(bench.view.key).toBe('look');
    bench.answer('sound').dead();
    expect(bench.view.band).toBe('proved-dead');
    expect(bench.view.key).toBe('earth');
    bench.pass().pass();
    expect(bench.view.facts.stored).toBe('unknown');
    bench.dead();
    expect(bench.view.key).toBe('lamp');
    bench.pass();
    expect(bench.view.phase).toBe('act');
    expect(bench.view.band).toBe('lamp');
    bench.answer('on').answer('dim').dead();
    expect(bench.view.phase).toBe('ended');
    expect(bench.view.end?.says).toBe('cleared');
    bench.do({ type: 'CLOSE' });
    expect(bench.view.phase).toBe('closed');
  });

  it('keeps the XState value and the context at the same place', () => {
    const bench = new Bench(program(lampTree));
    bench.pass().answer('sound');
    expect(bench.state.value).toEqual({ tree: { dead1: { isolate: 'act' } } });
    bench.do({ type: 'STOP' });
    expect(bench.state.value).toEqual({ safe: { '~isolate': 'act' } });
  });
});
