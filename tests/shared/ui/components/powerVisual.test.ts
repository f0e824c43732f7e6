import { describe, expect, it } from 'vitest';

import { powerTotals, powerVisual, spanWords } from '@/shared/ui/components/powerVisual';

const states = ['proved-dead', 'off', 'lamp', 'bench', 'mains', 'unknown'] as const;

describe('powerVisual', () => {
  it.each(['word', 'ground', 'pattern', 'symbol'] as const)('gives each state a %s of its own', (key) => {
    expect(new Set(states.map((state) => powerVisual(state)[key])).size).toBe(states.length);
  });
});

describe('powerTotals', () => {
  it('adds up what comes back, in order of first appearance', () => {
    const totals = powerTotals([
      { state: 'off', seconds: 10 },
      { state: 'lamp', seconds: 30 },
      { state: 'off', seconds: 5 },
    ]);
    expect(totals).toEqual([
      { state: 'off', seconds: 15 },
      { state: 'lamp', seconds: 30 },
    ]);
  });
});

describe('spanWords', () => {
  it('prints seconds, then minutes', () => {
    expect([spanWords(0), spanWords(119), spanWords(120), spanWords(1240)]).toEqual(['0 s', '119 s', '2 min', '21 min']);
  });
});
