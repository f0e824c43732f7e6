import { describe, expect, it } from 'vitest';

import { misfits } from '@/flows/document/admits';
import { defaultSettings } from '@/flows/document/settings';
import { prove } from '@/flows/proof/prove';
import { demoProfile, libraryTree, makeDead } from './walk';

const TREES = ['make-dead', 'first-power', 'lamp-bright', 'look-over', 'returns-measured', 'reform-in-place', 'rail-low', 'trip-fires', 'raw-on-rail', 'ripple', 'ticking', 'lost-return', 'dies-twice', 'earth-insulation', 'heat-and-fan'];
const MACHINES = ['corvane-12', 'ostrel-16', 'brindle-80', 'wendle-5'];

describe.each(TREES)('the house rules on every path of %s', (id) => {
  const tree = libraryTree(id);
  const applies = MACHINES.filter((name) => misfits(tree, demoProfile(name)).length === 0);

  it.each(applies)('hold on %s', (name) => {
    const proof = prove({ tree, callees: [makeDead], profile: demoProfile(name), settings: defaultSettings });
    expect(proof.faults).toEqual([]);
    expect(proof.rules.filter((rule) => !rule.holds).map((rule) => `${rule.id} ${rule.story}`)).toEqual([]);
  });
});
