import { describe, expect, it } from 'vitest';

import { armedForMs, holdReducer, holdShare, holdStart, holdWords } from '@/shared/ui/components/holdReducer';
import type { HoldEvent, HoldState } from '@/shared/ui/components/holdReducer';

const run = (...events: HoldEvent[]): HoldState => events.reduce((state, event) => holdReducer(state, event, 2000), holdStart);
const at = (type: HoldEvent['type'], atMs: number): HoldEvent => ({ type, atMs });

describe('holdReducer', () => {
  it.each([
    ['a press let go a moment too soon', [at('down', 0), at('up', 1999)], 'let-go'],
    ['a press of the full time, before any tick', [at('down', 0), at('up', 2000)], 'confirmed'],
    ['a tick at the full time', [at('down', 500), at('tick', 2500)], 'confirmed'],
    ['ticks before it', [at('down', 500), at('tick', 2499)], 'holding'],
    ['two short presses that add up', [at('down', 0), at('up', 1500), at('down', 1600), at('up', 3000)], 'let-go'],
    ['a key that repeats: the hold starts at its first', [at('down', 0), at('down', 1900), at('tick', 2000)], 'confirmed'],
    ['letting go of what was not pressed', [at('up', 5000)], 'idle'],
    ['a lone click of assistive technology', [at('bare-click', 0)], 'armed'],
    ['two such clicks in a hurry', [at('bare-click', 0), at('bare-click', 1999)], 'armed'],
    ['two such clicks with the wait between', [at('bare-click', 0), at('bare-click', 2000)], 'confirmed'],
    ['a second click that comes too late', [at('bare-click', 0), at('tick', armedForMs), at('bare-click', armedForMs + 1)], 'armed'],
  ] as const)('%s', (_what, events, phase) => {
    expect(run(...events).phase).toBe(phase);
  });

  it('never leaves confirmed', () => {
    const done = run(at('down', 0), at('tick', 2000));
    for (const type of ['down', 'up', 'tick', 'bare-click'] as const) expect(holdReducer(done, at(type, 9000), 2000)).toBe(done);
  });
});

describe('holdShare', () => {
  it('grows with the hold and ends at one', () => {
    const holding = run(at('down', 1000));
    expect(holdShare(holding, 1000, 2000)).toBe(0);
    expect(holdShare(holding, 1500, 2000)).toBe(0.25);
    expect(holdShare(holding, 9000, 2000)).toBe(1);
    expect(holdShare(run(at('down', 0), at('up', 1000)), 1000, 2000)).toBe(0);
  });
});

describe('holdWords', () => {
  it('says the time, and that letting go did nothing', () => {
    expect(holdWords('idle', 2000)).toBe('Press and hold for 2 s.');
    expect(holdWords('let-go', 2500)).toContain('nothing was done. Hold for 2.5 s');
  });
});
