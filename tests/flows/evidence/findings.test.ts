import { describe, expect, it } from 'vitest';

import { findingsOf } from '@/flows/evidence/findings';

import { Bench, lampTree, program } from '../support/bench';

describe('findingsOf', () => {
  it('reads the evidence of the answer that was given', () => {
    const lamp = program(lampTree);
    expect(findingsOf(lamp.layout, { key: 'see', outcome: 'bright', exit: 'bright', verdict: 'fail' })).toContainEqual({
      check: 'see',
      evidence: [{ suspect: 'short', says: 'points-to' }],
    });
  });

  it('says nothing where no step was left', () => {
    const bench = new Bench(program(lampTree));
    bench.row();
    expect(findingsOf(bench.program.layout, bench.state.context.outcome)).toEqual([]);
  });

  it('names a call that was passed through', () => {
    const bench = new Bench(program(lampTree));
    bench.pass();
    bench.answer('sound').pass().pass();
    bench.pass();
    expect(findingsOf(bench.program.layout, bench.state.context.outcome).map((f) => f.check)).toEqual(['dead1/prove', 'dead1']);
  });
});
