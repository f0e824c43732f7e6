import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import type { Tree } from '@/flows/document/tree';
import { compareTrees } from '@/flows/compare/compareTrees';
import { renamedSteps } from '@/flows/compare/renamed';

import { libraryTree } from '../library/walk';
import { lampTree, lampTreeJson, must } from '../support/bench';

type Json = Record<string, unknown>;
const json = lampTreeJson as unknown as { steps: Json[] } & Json;

/** The lamp tree with one step changed. */
const withStep = (id: string, change: Json): Tree => must(parseTree({ ...json, steps: json.steps.map((s) => (s['id'] === id ? { ...s, ...change } : s)) }));
const exitsOf = (id: string, change: (exit: Json) => Json) => (json.steps.find((s) => s['id'] === id)?.['exits'] as Json[]).map(change);
const says = (b: Tree) => compareTrees(lampTree, b).changes.map((c) => c.say);

describe('compareTrees', () => {
  it('finds nothing between a tree and itself, in whatever order its steps are written', () => {
    const tree = libraryTree('first-power');
    fc.assert(
      fc.property(fc.shuffledSubarray(tree.steps.slice(1), { minLength: tree.steps.length - 1 }), (rest) => {
        expect(compareTrees(tree, { ...tree, steps: [tree.steps[0] as Tree['steps'][number], ...rest] })).toEqual({ risk: 'none', changes: [], newWaysToLive: [] });
      }),
      { numRuns: 20 },
    );
  });

  it('tells a new wording as text', () => {
    const b = withStep('look', { lines: ['Look closely.'] });
    expect(compareTrees(lampTree, b)).toMatchObject({ risk: 'text', newWaysToLive: [] });
    expect(says(b)).toEqual(['“Look it over”: instruction is now Look closely., it was Look..']);
  });

  it('tells an exit that leads past the guards, with the way to the lamp that it opens', () => {
    const b = withStep('look', { exits: exitsOf('look', (e) => (e['id'] === 'damaged' ? { ...e, to: 'lamp' } : e)) });
    const compared = compareTrees(lampTree, b);
    expect(compared.risk).toBe('energy');
    expect(compared.changes).toMatchObject([{ what: 'exit', step: 'look', risk: 'order', say: '“Look it over”: “Damaged” now leads to lamp, not to refer.' }]);
    expect(compared.newWaysToLive).toMatchObject([{ to: 'lamp', path: ['look', 'lamp'], leg: { from: 'look', answer: 'damaged', to: 'lamp' } }]);
  });

  it('tells no new way where an exit turns away from power', () => {
    const b = withStep('earth', { exits: exitsOf('earth', (e) => ({ ...e, to: 'refer' })) });
    expect(compareTrees(lampTree, b)).toMatchObject({ risk: 'order', newWaysToLive: [] });
  });

  it('tells a guard that was taken out, and the way that closes over it', () => {
    const steps = json.steps.filter((s) => s['id'] !== 'insulation').map((s) => (s['id'] === 'earth' ? { ...s, exits: exitsOf('earth', (e) => (e['id'] === 'good' ? { ...e, to: 'dead2' } : e)) } : s));
    const compared = compareTrees(lampTree, must(parseTree({ ...json, steps })));
    expect(compared.changes).toContainEqual(expect.objectContaining({ what: 'removed', step: 'insulation', risk: 'energy' }));
    expect(compared.newWaysToLive.map((w) => w.path)).toEqual([['look', 'dead1', 'earth', 'dead2', 'lamp']]);
  });

  it.each([
    ['mostAmps', { mostAmps: 2 }, 'power', 'energy'],
    ['contact', { contact: 'none', lampWatts: 100 }, 'power', 'energy'],
    ['minutes', { minutes: 4 }, 'limit', 'text'],
  ] as const)('classes a change of %s', (_, change, what, risk) => {
    const compared = compareTrees(lampTree, withStep('lamp', change));
    expect(compared).toMatchObject({ risk, changes: [{ what, risk, step: 'lamp' }] });
  });

  it('tells evidence, suspects and the opening list', () => {
    const b = must(
      parseTree({
        ...json,
        opening: { ...(json['opening'] as Json), parts: [{ id: 'fuse', name: 'Fuse 1 A' }] },
        suspects: [{ id: 'short', part: 'C1', mode: 'short', prior: 5, killedBy: [] }, { id: 'bridge', part: 'Bridge', mode: 'short', prior: 1, killedBy: ['short'] }],
        steps: json.steps.map((s) => (s['id'] === 'see' ? { ...s, exits: exitsOf('see', (e) => (e['id'] === 'bright' ? { ...e, evidence: [{ suspect: 'short', says: 'all-but-proves' }] } : e)) } : s)),
      }),
    );
    expect(says(b)).toEqual([
      'The suspect short (C1, short) has changed: prior is now 5, it was 1.',
      'On the opening list, “Fuse 1 A” is new.',
      '“Look at the lamp”: “Bright” now all but proves short, before: points to.',
    ]);
  });

  it('takes a step with a new name and the same content for renamed, wherever it is named', () => {
    const text = JSON.stringify(json).replaceAll('"insulation"', '"megger"').replaceAll('"dead2"', '"dead-again"');
    const b = must(parseTree(JSON.parse(text)));
    const compared = compareTrees(lampTree, b);
    expect(compared.changes.map((c) => c.what)).toEqual(['renamed', 'renamed']);
    expect(compared).toMatchObject({ risk: 'text', newWaysToLive: [] });
    expect([...renamedSteps(lampTree, b)].sort()).toEqual([['dead2', 'dead-again'], ['insulation', 'megger']]);
  });

  it('finds a change of any one key of any step', () => {
    const tree = libraryTree('first-power');
    fc.assert(
      fc.property(fc.nat(tree.steps.length - 1), fc.constantFrom('title', 'minutes', 'contact', 'tools'), (at, key) => {
        const changed = tree.steps.map((s, i) => (i === at ? { ...s, [key]: key === 'title' ? `${s.title}!` : key === 'minutes' ? s.minutes + 1 : key === 'contact' ? (s.contact === 'cover' ? 'none' : 'cover') : [...s.tools, 'lamp-holder'] } : s)) as Tree['steps'];
        const { changes, risk } = compareTrees(tree, { ...tree, steps: changed });
        expect(changes).toHaveLength(1);
        expect(changes[0]?.step).toBe(tree.steps[at]?.id);
        expect(risk).toBe(key === 'contact' ? 'energy' : 'text');
      }),
    );
  });
});
