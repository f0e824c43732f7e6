/** The diagnosing trees of the library, each suspect played through them on the machines that they apply to. */
import { readdirSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { misfits } from '@/flows/document/admits';
import { oddProfiles } from '@/flows/proof/oddProfiles';
import { rehearse } from '@/flows/rehearsal/rehearse';
import { libraryTree, machineNamed, programOf } from './walk';

const TREES = readdirSync('flows/library').filter((file) => file.endsWith('.json')).map((file) => file.replace('.json', '')).filter((id) => libraryTree(id).suspects.length > 0);
const DEMO = ['corvane-12', 'ostrel-16', 'brindle-80', 'wendle-5'];
const ODD = oddProfiles.map((profile) => profile.title);

describe.each(TREES)('%s', (id) => {
  const tree = libraryTree(id);
  const fits = (names: string[]) => names.filter((name) => misfits(tree, machineNamed(name)).length === 0);
  const applies = fits(DEMO).length > 0 ? fits(DEMO) : fits(ODD);

  it('applies to a machine of the demo, or to an odd one', () => {
    expect(applies).not.toEqual([]);
  });

  it.each(applies)('leads each suspect to its own verdict or mends it, on %s', (name) => {
    const { good, suspects } = rehearse(programOf(tree, name));
    expect(suspects.filter((s) => s.reached !== 'verdict').map((s) => `${s.suspect}: ${s.reached} ${s.end?.key ?? s.stuck?.say ?? ''}`)).toEqual([]);
    expect(good).toBe(true);
  });

  it('uses every step that it has', () => {
    const unused = applies.map((name) => rehearse(programOf(tree, name)).neverUsed);
    const everywhere = unused[0]?.filter((step) => unused.every((steps) => steps.includes(step))) ?? [];
    expect(everywhere.filter((step) => tree.steps.find((s) => s.id === step)?.kind !== 'end')).toEqual([]);
  });
});
