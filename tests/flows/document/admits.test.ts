/** Which machines a tree is for, beyond what its head says. */
import { describe, expect, it } from 'vitest';

import { misfits } from '@/flows/document/admits';

import { benchProfile } from '../support/bench';
import { connect, end, step, treeOf } from '../support/steps';

const rail = benchProfile.rails[0]!;
const twoTrips = { ...benchProfile, rails: [rail, { ...rail, id: 'p24', name: '+24 V', nominal: 24, trip: { lowVolts: 27, highVolts: 30 } }] };
const series = { id: 'series', name: 'series resistor', class: 'series', area: 'clip' };
const tripTest = [step('do', 'fit', 'trip', { contact: 'hands', fits: [series] }), step('prove-trip', 'trip', 'next', { rail: 'p5', series: 'series', probe: 'hand', contact: 'probe', ceilingVolts: 7 })];

describe('a tree that stands on the trips', () => {
  const claims = treeOf([...tripTest, end('next', 'supply-proven')]);
  const fits = treeOf([...tripTest, connect('next', 'boards', 'done')]);
  const reads = treeOf([...tripTest, end('next', 'cleared')]);

  it('is for a machine all of whose trips it tests', () => {
    expect(misfits(claims, benchProfile)).toEqual([]);
    expect(misfits(fits, benchProfile)).toEqual([]);
  });

  it.each([claims, fits])('is not for a machine that has another', (tree) => {
    expect(misfits(tree, twoTrips)).toEqual(['it does not test the over-voltage trip of +24 V, on which it would have to stand']);
  });

  it('is for it where it claims nothing and fits nothing, or where the trips are there from the start', () => {
    expect(misfits(reads, twoTrips)).toEqual([]);
    expect(misfits({ ...fits, needsAtStart: ['trips'] }, twoTrips)).toEqual([]);
  });

  it('is not for a machine whose boards cannot be parted, where it fits boards', () => {
    const one = { ...benchProfile, boards: { ...benchProfile.boards, removable: false } };
    expect(misfits(fits, one)).toEqual(['it fits boards, and those of this machine cannot be parted from the supply']);
    expect(misfits(claims, one)).toEqual([]);
  });
});
