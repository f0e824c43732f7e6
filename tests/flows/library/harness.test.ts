/** The harness as found, connector by connector. */
import { describe, expect, it } from 'vitest';

import { posterior } from '@/flows/evidence/posterior';
import { findingsOf } from '@/flows/evidence/findings';
import { Bench } from '../support/bench';
import { libraryTree, programOf, walk } from './walk';

const tree = libraryTree('as-found-harness');
const at = () => walk(new Bench(programOf(tree, 'ostrel-16')), {}, (b) => b.view.key === 'seen' && b.view.phase === 'act');

describe('the as-found harness', () => {
  it('asks for each connector of the profile, with its pins, and names the boards that it serves', () => {
    const rows = at().view.rows.map(({ row }) => row);
    expect(rows.map((r) => r.label)).toEqual(['J4, pins 1, 2, 8: Return 1, Return 2, Sense return', expect.stringMatching(/^J5, pin 4/), expect.stringMatching(/^J6, pin 4/)]);
    const boards = libraryBoards('p5');
    expect(boards.length).toBeGreaterThan(0);
    for (const board of boards) expect(rows[0]?.note).toContain(board);
  });

  it('raises a lost return when one of them is found off, whichever', () => {
    const bench = at();
    for (const word of ['on', 'off', 'on']) bench.row({ [bench.view.current!.row.id]: word });
    const ranked = posterior(tree.suspects, findingsOf(bench.program.layout, bench.state.context.outcome));
    expect(ranked[0]?.suspect.id).toBe('return-lost');
    expect(bench.view.key).toBe('carries');
  });

  it('moves nothing: no step fits, takes out, trims or repairs', () => {
    expect(tree.steps.filter((s) => s.kind === 'work' || s.kind === 'connect-load' || s.kind === 'energise' || s.kind === 'raise' || (s.kind === 'do' && (s.fits ?? s.removes ?? s.trims) !== undefined))).toEqual([]);
  });
});

function libraryBoards(rail: string): string[] {
  return programOf(tree, 'ostrel-16').layout.profile.boards.fitted.filter((b) => b.draws.some((d) => d.rail === rail)).map((b) => b.name);
}
