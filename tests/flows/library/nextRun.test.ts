import { describe, expect, it } from 'vitest';

import { startRun } from '@/flows/machine/advance';
import { Bench } from '../support/bench';
import { LINEAR, libraryTree, programOf, walk } from './walk';

const tree = libraryTree('first-power');
const program = programOf(tree, 'corvane-12');

describe('the run after a fault was found', () => {
  it('takes back every lead that an earlier run may have left lifted', () => {
    const lifted = tree.steps.flatMap((s) => (s.kind === 'do' ? (s.fits ?? []) : [])).filter((f) => f.class === 'lifted');
    const all = [...new Map(lifted.map((f) => [f.id, f])).values()];
    const bench = new Bench(program);
    bench.state = startRun(program, { restorer: 'ann', restorerIsSenior: false, at: bench.at, release: false, fitted: all, killers: [] });
    walk(bench, LINEAR);
    expect(bench.view.end?.says).toBe('supply-proven');
  });

  it.each(tree.suspects.filter((s) => s.killedBy.length > 0))('rules out what killed the replaced part before power: $id', (suspect) => {
    const bench = new Bench(program);
    const killers = suspect.killedBy.map((killer) => ({ part: suspect.id, killer }));
    bench.state = startRun(program, { restorer: 'ann', restorerIsSenior: false, at: bench.at, release: false, fitted: [], killers });
    walk(bench, LINEAR);
    expect(bench.view.end?.says).toBe('supply-proven');
    expect(bench.view.facts.owed.killers).toEqual([]);
  });
});
