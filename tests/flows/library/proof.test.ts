import { readdirSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { misfits } from '@/flows/document/admits';
import { defaultSettings } from '@/flows/document/settings';
import { oddProfiles } from '@/flows/proof/oddProfiles';
import { prove } from '@/flows/proof/prove';
import { demoProfile, libraryTree, makeDead } from './walk';

const TREES = readdirSync('flows/library').filter((file) => file.endsWith('.json')).map((file) => file.replace('.json', ''));
const MACHINES = ['corvane-12', 'ostrel-16', 'brindle-80', 'wendle-5'].map((name) => demoProfile(name)).concat(oddProfiles);

describe.each(TREES)('the house rules on every path of %s', (id) => {
  const tree = libraryTree(id);
  const applies = MACHINES.filter((profile) => misfits(tree, profile).length === 0);

  it('are asked of a machine that is odd', () => {
    expect(applies.some((profile) => oddProfiles.includes(profile))).toBe(true);
  });

  it.each(applies.map((profile) => ({ title: profile.title, profile })))('hold on $title', ({ profile }) => {
    const proof = prove({ tree, callees: [makeDead], profile, settings: defaultSettings });
    expect(proof.faults).toEqual([]);
    expect(proof.rules.filter((rule) => !rule.holds).map((rule) => `${rule.id} ${rule.story}`)).toEqual([]);
  });
});
