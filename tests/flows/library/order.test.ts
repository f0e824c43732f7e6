/** The order in which the trade brings a supply up and its boards back; common practice, no source. */
import { describe, expect, it } from 'vitest';

import { unmetAtStart } from '@/flows/machine/advance';
import { rehearse } from '@/flows/rehearsal/rehearse';
import { Bench } from '../support/bench';
import { libraryTree, move, programOf, walk } from './walk';
import type { Choices } from './walk';

/** The order in which the first visit of some steps came. */
const order = (path: readonly string[], wanted: readonly string[]) => [...new Set(path)].filter((key) => wanted.includes(key));

describe('refit, board by board', () => {
  const tree = libraryTree('refit');
  const program = programOf(tree, 'wendle-5');
  const released = (choices: Choices = {}) => walk(new Bench(program, false, { release: true }), choices);

  it('does not begin without a release of that supply', () => {
    const start = { restorer: 'ann', restorerIsSenior: false, release: false, fitted: [], killers: [], at: 0 };
    expect(unmetAtStart(program, start)).toEqual(['release']);
    expect(unmetAtStart(program, { ...start, release: true })).toEqual([]);
  });

  it('proves returns, earth, insulation, trip and full load again, and then the empty backplane, before the first board', () => {
    const path = rehearse(program).sound.path;
    const wanted = ['boards-out', 'returns', 'earth', 'insulation', 'trip', 'rails-lamp', 'order', 'rails-full', 'backplane', 'fit', 'returns-in', 'mains-board', 'rails-board', 'draws'];
    expect(order(path, wanted)).toEqual(wanted);
  });

  it('reads every rail after each board, and ends in service with all of them in', () => {
    const bench = new Bench(program, false, { release: true });
    const rows: string[] = [];
    let boards = 0;
    for (let i = 0; i < 3000 && bench.view.phase !== 'ended'; i += 1) {
      const { key, phase, current } = bench.view;
      if (key === 'rails-board' && phase === 'act' && current !== null) rows.push(`${boards} ${current.row.id}`);
      if (key === 'fit' && phase === 'act') boards += 1;
      move(bench, { more: boards < 3 ? 'left' : 'all' });
    }
    expect(rows).toEqual([1, 2, 3].flatMap((board) => ['p5', 'p12', 'm12'].map((rail) => `${board} ${rail}`)));
    expect(bench.view.end).toMatchObject({ says: 'in-service' });
    expect(bench.view.facts).toMatchObject({ load: 'boards', fitted: [], release: 'valid' });
  });

  it('ends at the board that pulls a rail out of its band, dead', () => {
    const bench = released({ 'rails-board': { p12: 9 } });
    expect(bench.view.end).toMatchObject({ says: 'fault-found', key: 'end-board-short' });
    expect(bench.view.band).toBe('proved-dead');
  });

  it('asks a senior where nobody knows whether the trip may be fed in place: parting it would void the release', () => {
    expect(released({ 'trip-may': 'not' }).view.end?.says).toBe('referred');
  });
});

describe('a regulator that was mended', () => {
  it('gets bench volts, regulated volts, the scope and full load in this order, and no mains', () => {
    const tree = libraryTree('regulator-bench');
    const { path, end } = rehearse(programOf(tree, 'ostrel-16')).sound;
    const wanted = ['input', 'outputs', 'low', 'raise-raw', 'regulated', 'scope-look', 'heat-light', 'full-low', 'rails-held'];
    expect(order(path, wanted)).toEqual(wanted);
    expect(end?.says).toBe('cleared');
    expect(tree.steps.filter((s) => s.kind === 'energise' && s.source !== 'bench')).toEqual([]);
  });
});

describe('rails to full load', () => {
  it('are read at 10, 25, 50, 80 and 100 %, each after its dwell, the lamp before', () => {
    const { path } = rehearse(programOf(libraryTree('full-load'), 'brindle-80')).sound;
    const wanted = ['rails-lamp', 'rails-10', 'rails-25', 'rails-50', 'rails-80', 'heat-80', 'rails-full', 'accept', 'ripple-full', 'heat-full'];
    expect(order(path, wanted)).toEqual(wanted);
  });
});

describe('a supply proved for its release', () => {
  it.each(['corvane-12', 'brindle-80', 'wendle-5'])('stands on all that a release rests on (%s)', (machine) => {
    const bench = walk(new Bench(programOf(libraryTree('prove-supply'), machine)));
    expect(bench.view.end?.says).toBe('supply-proven');
    expect(bench.view.facts).toMatchObject({ proving: 'full', earth: 'proved', insulation: 'proved', returns: 'proved', fitted: [] });
    expect(bench.view.facts.trips.every((trip) => trip.proved)).toBe(true);
  });

  it('has the output parted where the regulator would not stand it, and re-made before the lamp', () => {
    const bench = walk(new Bench(programOf(libraryTree('prove-supply'), 'corvane-12')), { 'trip-way': 'not' });
    expect(bench.state.context.visited).toContain('trip-part');
    expect(bench.view.end?.says).toBe('supply-proven');
  });
});
