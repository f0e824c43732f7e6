import { describe, expect, it } from 'vitest';

import { machineEventSchema } from '@/flows/machine/events';

import { Bench, lampTree, program } from '../support/bench';

const note = { type: 'NOTE', sheet: 'rail-limits', inputs: { nominalVolts: 5, tolerancePercent: 5 }, headline: '4.75 V to 5.25 V.' } as const;

/** Facts, place and clocks, without the last outcome: it belongs to the event that made it. */
function standing(bench: Bench) {
  const { outcome: _, ...rest } = bench.state.context;
  return { value: bench.state.value, ...rest };
}

describe('workings noted in a run', () => {
  it('are an entry of their own and move nothing, at any place of the run', () => {
    const bench = new Bench(program(lampTree));
    const seen = new Set<string>();
    const noteHere = () => {
      const before = standing(bench);
      const taken = bench.try(note);
      expect(taken).toMatchObject({ ok: true, kind: 'addendum' });
      expect(standing(bench)).toEqual(before);
      expect(bench.state.context.outcome).toBeNull();
      seen.add(bench.view.phase);
    };
    noteHere();
    bench.pass();
    noteHere();
    bench.answer('sound').dead().pass().pass().dead();
    noteHere();
    bench.pass();
    noteHere();
    bench.answer('on').answer('dim').dead();
    noteHere();
    expect([...seen].sort()).toEqual(['act', 'ended', 'opening', 'warning']);
  });

  it('do not keep "proved dead" from lapsing, and do not let it lapse', () => {
    const bench = new Bench(program(lampTree));
    bench.pass().answer('sound').dead();
    bench.at += 31 * 60_000;
    bench.do(note);
    expect(bench.view.band).toBe('proved-dead');
    bench.do({ type: 'TICK' });
    expect(bench.view.key).toBe('~isolate');
  });

  it('come from another load of the page without taking the run from the one that leads it', () => {
    const bench = new Bench(program(lampTree));
    bench.pass();
    bench.boot = 'another-tab';
    bench.do(note);
    bench.boot = 'boot-1';
    expect(bench.answer('sound').view.key).toBe('dead1/isolate');
  });

  it('are refused once the run is closed', () => {
    const bench = new Bench(program(lampTree));
    bench.pass().do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' });
    expect(bench.try(note)).toMatchObject({ ok: false, refusal: { code: 'closed' } });
  });

  it('carry rows, and nothing that no sheet could take', () => {
    const stamped = { ...note, at: 0, monotonic: 0, boot: 'b' };
    expect(machineEventSchema.safeParse({ ...stamped, inputs: { rails: [{ name: '+5 V', volts: 5 }], guard: null } }).success).toBe(true);
    expect(machineEventSchema.safeParse({ ...stamped, inputs: { rails: [[1]] } }).success).toBe(false);
    expect(machineEventSchema.safeParse({ ...stamped, headline: ' ' }).success).toBe(false);
    expect(machineEventSchema.safeParse({ ...stamped, sheet: '../etc' }).success).toBe(false);
  });
});
