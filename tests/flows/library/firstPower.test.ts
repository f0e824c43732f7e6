import { describe, expect, it } from 'vitest';

import { Bench } from '../support/bench';
import { LINEAR, libraryTree, programOf, walk } from './walk';

const tree = libraryTree('first-power');

describe('first power of a dormant three-rail supply', () => {
  it('leads a good linear supply to "supply proven"', () => {
    const bench = walk(new Bench(programOf(tree, 'corvane-12')), LINEAR);
    expect(bench.view.end).toMatchObject({ says: 'supply-proven', key: 'proven' });
    expect(bench.view.facts).toMatchObject({ proving: 'full', earth: 'proved', insulation: 'proved', returns: 'proved', fitted: [] });
    expect(bench.view.band).toBe('proved-dead');
  });

  it('leads a good switching supply to "supply proven", by way of its freewheel diode', () => {
    const bench = walk(new Bench(programOf(tree, 'ostrel-16')));
    expect(bench.view.end?.says).toBe('supply-proven');
    expect(bench.state.context.visited).toContain('freewheel');
  });
});
