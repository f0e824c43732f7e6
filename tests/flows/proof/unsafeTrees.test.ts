/** Trees that could lead a hand to a live circuit, each in one line: every one is refused, with the rule that it breaks and a path to it. */
import { describe, expect, it } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import type { Profile } from '@/flows/document/profile';
import type { Tree } from '@/flows/document/tree';
import { prove } from '@/flows/proof/prove';
import type { Proof } from '@/flows/proof/prove';

import { benchProfile, makeDeadTree } from '../support/bench';
import { bench, clip, connect, dead, earth, end, fit, hands, insulation, lamp, look, mains, observe, rails, remove, returns, step, treeOf, work } from '../support/steps';

type Step = Record<string, unknown>;
const proofOf = (tree: Tree, profile: Profile = benchProfile, callees = [makeDeadTree]): Proof => prove({ tree, callees, profile, settings: defaultSettings });
const rulesOf = (tree: Tree, profile?: Profile) => proofOf(tree, profile).rules.filter((r) => !r.holds).map((r) => r.id);

/** Everything that must stand before power at the inlet, then `next`. */
const ready = (next: string, extra: { boards?: boolean } = {}): Step[] => [look('d1'), dead('d1', extra.boards === true ? 'out' : 'returns'), ...(extra.boards === true ? [connect('out', 'none', 'returns')] : []), returns('earth'), earth('insulation'), insulation('d2'), dead('d2', next)];
const passed = (next: string): Step[] => [...ready('clip'), clip('lamp'), lamp('lamp', 'read'), rails('read', 'limited', 'd3', { exits: outs('in', 'd3', ['close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], 'abort') }), dead('d3', 'unclip'), remove('unclip', 'rail-clips', next)];
function outs(pass: string, to: string, others: string[], other: string) {
  return [{ id: 'good', on: [pass], to }, { id: 'other', on: others, to: other }];
}
const series = { id: 'series', name: 'series resistor', class: 'series', area: 'regulator' };
const battery: Profile = { ...benchProfile, sources: [{ id: 'cell', name: 'memory battery', kind: 'battery', volts: 3.6 }] };

const beryllium: Profile = { ...benchProfile, hazards: ['beryllium-oxide'] };
const photo = (to: string, other = 'refer') => step('photo', 'photo', to, { of: 'The failed part' }, other);
const opened = (id: string, to: string, instead?: string) => observe(id, to, { contact: 'hands', opens: { suspect: 'pass', photo: 'photo', ...(instead === undefined ? {} : { instead }) } });
const confirm = (id: string, confirms: string[], to: string, contact = 'cover') => step('do', id, to, { contact, confirms });
const soak = (id: string, to: string) => step('soak', id, to, { probe: 'none', quantity: 'celsius', power: 'live', limit: { is: 'below', high: 70 }, holdMinutes: 4, everyMinutes: 2, asInService: ['cover-on', 'forced-air'] }, to);

describe('trees that hold', () => {
  it.each<[string, Step[]]>([
    ['look, dead, hands', [look('d1'), dead('d1', 'touch'), hands('touch', 'done')]],
    ['the lamp behind earth and insulation', [...ready('lamp'), lamp('lamp', 'see'), observe('see', 'abort', { power: 'live' }, 'abort')]],
    ['mains after a limited pass', [...passed('mains'), mains('mains', 'abort')]],
    ['a part opened dead, after its photo', [look('d1'), dead('d1', 'photo'), photo('open'), opened('open', 'done')]],
    ['a soak under the cover that was confirmed', [...ready('cover'), confirm('cover', ['cover-on', 'forced-air'], 'lamp'), lamp('lamp', 'soak', { asInService: ['cover-on', 'forced-air'] }), soak('soak', 'abort')]],
    ['a fan that is seen to turn while live', [...ready('cover'), confirm('cover', ['cover-on'], 'lamp'), lamp('lamp', 'fan'), { ...confirm('fan', ['forced-air'], 'soak', 'none'), exits: outs('done', 'soak', ['not-sure', 'cannot'], 'abort') }, soak('soak', 'abort')]],
  ])('%s', (_, steps) => {
    expect(rulesOf(treeOf(steps, { reentries: [] })).filter((r) => r !== 'H18')).toEqual([]);
  });
});

describe('a tree that goes round an opening where a part may hold beryllium oxide', () => {
  const tree = treeOf([look('d1'), dead('d1', 'photo'), photo('open'), opened('open', 'done', 'keep'), hands('keep', 'done')]);
  it('holds on such a machine, which is never shown the opening', () => {
    expect(rulesOf(treeOf([look('d1'), dead('d1', 'photo'), photo('open'), opened('open', 'keep', 'keep'), hands('keep', 'done')]), beryllium)).toEqual([]);
    expect(proofOf(tree, beryllium).rules.filter((r) => !r.holds).map((r) => r.id)).toEqual([]);
  });
  it('still has to reach every step that it has on any other', () => {
    expect(rulesOf(tree)).toEqual(['H16']);
  });
});

describe('unsafe trees', () => {
  const table: [string, string, Step[], Profile?][] = [
    ['U1 a second source on top of the first', 'H5', [...ready('bench'), bench('bench', 'lamp'), lamp('lamp', 'abort')]],
    ['U3 ohms with a probe on a live part', 'H1', [...ready('lamp'), lamp('lamp', 'ohms'), step('measure', 'ohms', 'abort', { contact: 'probe', probe: 'hand', quantity: 'ohms', limit: { is: 'above', low: 1 } }, 'abort')]],
    ['U4 fitting the series resistor while live', 'H1', [...ready('lamp'), lamp('lamp', 'fit'), fit('fit', series, 'done')]],
    ['U5 discharge across a plugged-in machine', 'H3', [look('bleed'), step('discharge', 'bleed', 'd1', { contact: 'probe' }), dead('d1', 'done')]],
    ['U6 a proof that finds mains leads to discharge', 'H3', [look('out'), step('isolate', 'out', 'bleed'), step('discharge', 'bleed', 'prove', { contact: 'probe' }), step('prove-dead', 'prove', 'done', { contact: 'probe', exits: [{ id: 'in', on: ['in'], to: 'done' }, { id: 'no', on: ['falling', 'high', 'not-sure', 'cannot'], to: 'bleed', atMost: 2, then: 'refer' }] })]],
    ['U7 proved dead at the switch, hands', 'H2', [look('prove'), step('prove-dead', 'prove', 'touch', { contact: 'probe' }), hands('touch', 'done')]],
    ['U8 hands straight after the insulation test', 'H1', [look('d1'), dead('d1', 'earth'), earth('insulation'), insulation('touch'), hands('touch', 'done')]],
    ['U9 a bench pass, then mains direct', 'H6', [...ready('bench'), bench('bench', 'read'), rails('read', 'regulator', 'd3', { exits: outs('in', 'd3', ['close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], 'abort') }), dead('d3', 'mains'), mains('mains', 'abort')]],
    ['U10 the bench supply feeds the output node and proves itself', 'H6', [...ready('fit'), fit('fit', series, 'bench'), bench('bench', 'read', { node: 'rail', rail: 'p5', mostVolts: 6, throughItems: ['series'] }), rails('read', 'regulator', 'abort', { exits: outs('in', 'abort', ['close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], 'abort') })]],
    ['U11 first power from a bench supply at full amps', 'H6', [...ready('bench'), bench('bench', 'abort', { mostAmps: 12 })]],
    ['U12 the earth strap lifted, lamp on', 'H7', [...ready('lift'), fit('lift', { id: 'strap', name: 'earth strap', class: 'lifted', area: 'earth' }, 'lamp'), lamp('lamp', 'abort')]],
    ['U15 the trip test with a load on', 'H9', [...ready('load'), connect('load', 'light', 'fit'), fit('fit', series, 'bench'), bench('bench', 'trip', { node: 'rail', rail: 'p5', mostVolts: 6.8, load: 'light', throughItems: ['series'] }), step('prove-trip', 'trip', 'abort', { contact: 'probe', probe: 'hand', rail: 'p5', series: 'series', ceilingVolts: 6.8 }, 'abort')]],
    ['U16 the transformer replaced, then the boards', 'H9', [...ready('swap'), work('swap', 'primary', 'boards'), connect('boards', 'boards', 'done')]],
    ['U17 the second lamp check fails, the first still opens the mains', 'H14', [...ready('clip'), clip('lamp'), lamp('lamp', 'read'), rails('read', 'limited', 'again', { exits: outs('in', 'again', ['close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], 'abort') }), rails('again', 'limited', 'd3', { exits: outs('in', 'd3', ['close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], 'd3') }), dead('d3', 'unclip'), remove('unclip', 'rail-clips', 'mains'), mains('mains', 'abort')]],
    ['U21 a hold awaited while live', 'H11', [...ready('lamp'), lamp('lamp', 'hold'), step('hold', 'hold', 'abort', { asks: 'Go on?' }, 'abort')]],
    ['U26 the lamp with the bench not looked over', 'H6', [dead('d1', 'earth'), earth('insulation'), insulation('d2'), dead('d2', 'lamp'), lamp('lamp', 'abort')]],
    ['U28 in service on the lamp', 'H12', [...ready('lamp'), lamp('lamp', 'service'), end('service', 'in-service')]],
    ['U37 the declared load is not the load', 'H5', [...ready('load'), connect('load', 'full', 'lamp'), lamp('lamp', 'abort', { load: 'light' })]],
    ['an end that claims what its facts do not give', 'H12', [look('d1'), dead('d1', 'proven'), end('proven', 'supply-proven')]],
    ['a link left while energising', 'H4', [...ready('link'), fit('link', { id: 'wire', name: 'link', class: 'link', area: 'part' }, 'lamp'), lamp('lamp', 'abort')]],
    ['a bypass at full power', 'H4', [...passed('by'), fit('by', { id: 'by-pass', name: 'bypass', class: 'bypass', area: 'part' }, 'mains'), mains('mains', 'abort')]],
    ['unsure, then power', 'H13', [...ready('see'), observe('see', 'lamp', { exits: [{ id: 'good', label: 'Good', on: ['answer'], to: 'lamp' }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'lamp' }] }), lamp('lamp', 'abort')]],
    ['failed, then power', 'H14', [...ready('see'), observe('see', 'lamp', {}, 'lamp'), lamp('lamp', 'abort')]],
    ['a part swapped, its killer not ruled out', 'H15', [look('d0'), dead('d0', 'swap'), work('swap', 'regulator', 'look2', { replaces: ['pass'] }), observe('look2', 'd1', { lookOver: true }), dead('d1', 'returns'), returns('earth'), earth('insulation'), insulation('d2'), dead('d2', 'lamp'), lamp('lamp', 'abort')]],
    ['a loop that nothing counts', 'H16', [look('a'), observe('a', 'b'), observe('b', 'a', {}, 'refer')]],
    ['a step that nothing leads to', 'H16', [look('done'), observe('orphan', 'done')]],
    ['longer on than stated', 'H11', [...ready('lamp'), lamp('lamp', 'see', { longestMinutes: 2 }), observe('see', 'abort', { power: 'live', minutes: 5 }, 'abort')]],
    ['an end reached live', 'H11', [...ready('lamp'), lamp('lamp', 'done')]],
    ['a part opened live', 'H1', [...ready('photo'), photo('lamp'), lamp('lamp', 'open'), opened('open', 'done')]],
    ['a part opened before its photo', 'H17', [look('d1'), dead('d1', 'open'), opened('open', 'photo'), photo('done')]],
    ['a part opened although its photo was not taken', 'H17', [look('d1'), dead('d1', 'photo'), photo('open', 'open'), opened('open', 'done')]],
    ['the part after the one that was photographed', 'H17', [look('d1'), dead('d1', 'photo'), photo('swap'), work('swap', 'regulator', 'open'), opened('open', 'done')]],
    ['a part opened that may hold beryllium oxide', 'H17', [look('d1'), dead('d1', 'photo'), photo('open'), opened('open', 'done')], beryllium],
    ['a soak with a cover that nobody confirmed', 'H5', [...ready('lamp'), lamp('lamp', 'soak'), soak('soak', 'abort')]],
    ['power with a fan that nobody confirmed', 'H5', [...ready('lamp'), lamp('lamp', 'abort', { asInService: ['forced-air'] })]],
    ['the cover taken off again before the soak', 'H5', [...ready('cover'), confirm('cover', ['cover-on', 'forced-air'], 'touch'), hands('touch', 'lamp'), lamp('lamp', 'soak'), soak('soak', 'abort')]],
    ['a probe put in before the soak', 'H5', [...ready('cover'), confirm('cover', ['cover-on', 'forced-air'], 'lamp'), lamp('lamp', 'rails'), rails('rails', 'limited', 'soak', { exits: outs('in', 'soak', ['close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], 'abort') }), soak('soak', 'abort')]],
    ['the fan off with the plug, and on again', 'H5', [...ready('air'), confirm('air', ['forced-air'], 'd4', 'none'), dead('d4', 'lamp'), lamp('lamp', 'abort', { asInService: ['forced-air'] })]],
    ['not sure whether the cover is on, and power', 'H13', [...ready('cover'), { ...confirm('cover', ['cover-on'], 'lamp'), exits: [{ id: 'all', on: ['done', 'not-sure', 'cannot'], to: 'lamp' }] }, lamp('lamp', 'abort')]],
    ['boards in before the trip is proved', 'H9', [...ready('boards'), connect('boards', 'boards', 'done')]],
  ];
  it.each(table)('%s breaks %s', (_, rule, steps, profile) => {
    const proof = proofOf(treeOf(steps), profile);
    const verdict = proof.rules.find((r) => r.id === rule);
    expect(proof.holds).toBe(false);
    expect(verdict?.holds, proof.rules.filter((r) => !r.holds).map((r) => `${r.id} ${r.story}`).join('\n')).toBe(false);
    expect(verdict?.path.length).toBeGreaterThan(0);
  });

  it('U2 lets no source of the profile be forgotten: isolate has a row for each', () => {
    const rows = proofOf(treeOf([look('d1'), dead('d1', 'done')]), battery);
    expect(rows.holds || rows.rules.every((r) => r.holds || r.id === 'H18')).toBe(true);
  });
  it('U22 U24 proves nothing over rows that the profile lacks', () => {
    const noReturns: Profile = { ...benchProfile, conductors: [] };
    expect(proofOf(treeOf([look('d1'), dead('d1', 'returns'), returns('done')]), noReturns).faults).toEqual([expect.objectContaining({ step: 'returns' })]);
  });
  it('U25 does not read an earthed clip on the primary', () => {
    expect(() => treeOf([look('d1'), dead('d1', 'fit'), fit('fit', { id: 'scope', name: 'scope', class: 'clip', area: 'primary', earthed: true, point: 'raw' }, 'done')])).toThrow(/never clipped to the primary/);
  });
  it('U30 asks a switch-mode supply for its minimum load', () => {
    const switcher: Profile = { ...benchProfile, supplyKind: 'switch-mode', minimumLoad: [{ rail: 'p5', amps: 2 }] };
    expect(rulesOf(treeOf([...ready('lamp'), lamp('lamp', 'abort')]), switcher)).toContain('H5');
    expect(rulesOf(treeOf([...ready('load'), connect('load', 'light', 'lamp'), lamp('lamp', 'abort', { load: 'light' })]), switcher)).not.toContain('H5');
  });
  it('refuses a tree that calls one which is not there, or itself', () => {
    const proof = proofOf(treeOf([look('d1'), { ...dead('d1', 'done'), tree: 'ghost' }]));
    expect(proof.holds).toBe(false);
    expect(proof.faults).toEqual([expect.objectContaining({ step: 'd1', message: 'no issued tree "ghost"' })]);
  });
  it('tells a broken rule in its author’s words', () => {
    const tree = treeOf([...ready('lamp'), lamp('lamp', 'see', { title: 'Switch on through the lamp' }), observe('see', 'abort', { title: 'Look at the lamp', power: 'live', exits: [{ id: 'bright', label: 'bright', on: ['answer'], to: 'abort' }, { id: 'dim', label: 'dim', on: ['answer'], to: 'swap' }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'abort' }] }), work('swap', 'raw', 'refer', { title: 'Swap the reservoir capacitor' })]);
    const h1 = proofOf(tree).rules.find((r) => r.id === 'H1');
    expect(h1?.story).toBe('You could reach “Swap the reservoir capacitor” although a source is in, or nobody knows that it is out; stored charge is not proved dead, by answering “dim” at “Look at the lamp”.');
    expect(h1?.path.at(-1)).toBe('swap');
  });
});
