import { describe, expect, it } from 'vitest';

import { sum, tallyOf } from '@/server/cli/testReport';

describe('tallyOf', () => {
  it('counts tests of either runner', () => {
    expect(tallyOf(0, JSON.stringify({ numTotalTests: 7, numPassedTests: 7 }))).toEqual({ passed: 7, failed: 0 });
    expect(tallyOf(0, JSON.stringify({ stats: { expected: 3, unexpected: 0, flaky: 0, skipped: 0 } }))).toEqual({ passed: 3, failed: 0 });
  });

  it('counts as failed what failed, was skipped or passed only on a second try', () => {
    expect(tallyOf(1, JSON.stringify({ numTotalTests: 7, numPassedTests: 5 }))).toEqual({ passed: 5, failed: 2 });
    expect(tallyOf(1, JSON.stringify({ stats: { expected: 3, unexpected: 1, flaky: 1, skipped: 1 } }))).toEqual({ passed: 3, failed: 3 });
  });

  it('never calls a program good that ended badly', () => {
    expect(tallyOf(1, undefined)).toEqual({ passed: 0, failed: 1 });
    expect(tallyOf(1, JSON.stringify({ numTotalTests: 7, numPassedTests: 7 }))).toEqual({ passed: 7, failed: 1 });
  });
});

describe('sum', () => {
  it('adds up', () => {
    expect(sum([{ passed: 1, failed: 0 }, { passed: 20, failed: 3 }])).toEqual({ passed: 21, failed: 3 });
    expect(sum([])).toEqual({ passed: 0, failed: 0 });
  });
});
