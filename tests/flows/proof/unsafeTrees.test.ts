/** Trees that could lead a hand to a live circuit, each in one line: every one is refused, with the rule that it breaks and a path to it. */
import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import { defaultSettings } from '@/flows/document/settings';
import type { Profile } from '@/flows/document/profile';
import type { Tree } from '@/flows/document/tree';
import { prove } from '@/flows/proof/prove';
import type { Proof } from '@/flows/proof/prove';

import { benchProfile, makeDeadTree } from '../support/bench';
import { bench, clip, connect, dead, earth, end, fit, hands, insulation, lamp, look, mains, observe, rails, remove, returns, step, treeJson, treeOf, work } from '../support/steps';

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

describe('trees that look safe by their labels alone', () => {
  const documentSays = (steps: Step[]) => {
    const parsed = parseTree(treeJson(steps));
    return parsed.ok ? '' : parsed.faults.map((f) => `${f.step ?? 'head'}|${f.key}|${f.message}`).join('\n');
  };
  it('fit a clip under the name of a link that is still in', () => {
    const link = fit('link', { id: 'wire', name: 'link', class: 'link', area: 'part' }, 'clip');
    const clipped = fit('clip', { id: 'wire', name: 'clip', class: 'clip', area: 'clip', point: 'each-rail' }, 'lamp');
    expect(documentSays([...ready('link'), link, clipped, lamp('lamp', 'abort')])).toMatch(/link\|fits\.0\.id\|"wire" is also fitted as something else/);
  });
  it('fit it in a called tree', () => {
    const inner = treeOf([dead('safe', 'clip'), fit('clip', { id: 'wire', name: 'clip', class: 'clip', area: 'clip', point: 'each-rail' }, 'done')], { id: 'inner' });
    const tree = treeOf([look('d1'), dead('d1', 'link'), fit('link', { id: 'wire', name: 'link', class: 'link', area: 'part' }, 'go'), { ...dead('go', 'done'), tree: 'inner', exits: [{ id: 'both', on: ['done', 'refer'], to: 'done' }] }]);
    expect(proofOf(tree, benchProfile, [makeDeadTree, inner]).rules.find((r) => r.id === 'H4')?.story).toMatch(/“wire” is fitted as one thing here and as another elsewhere/);
  });
  it('feed a part “alone” behind a lead that is no lead', () => {
    const fed = bench('feed', 'abort', { node: 'part', lead: 'rail-clips', mostVolts: 5 });
    expect(documentSays([look('d1'), dead('d1', 'clip'), clip('feed'), fed])).toMatch(/feed\|lead\|"rail-clips" is no lifted lead/);
  });
  it('test a trip through a part that is no series part', () => {
    expect(documentSays([...ready('clip'), clip('bench'), bench('bench', 'trip', { node: 'rail', rail: 'p5', mostVolts: 6.8 }), step('prove-trip', 'trip', 'abort', { contact: 'probe', probe: 'hand', rail: 'p5', series: 'rail-clips', ceilingVolts: 6.8 }, 'abort')])).toMatch(/trip\|series\|"rail-clips" is no series part/);
  });
  it.each([
    ['a check', step('measure', 'm', 'done', { contact: 'probe', probe: 'hand', quantity: 'volts-dc', limit: { is: 'below', high: 4 }, exits: [{ id: 'in', on: ['in', 'low', 'high', 'reversed'], to: 'done', verdict: 'find', reason: 'A question' }, { id: 'what', on: ['close', 'not-sure', 'cannot'], to: 'done', verdict: 'find', reason: 'A question' }] }), /"what" calls an unsure answer a find/],
    ['an act', hands('m', 'done', { exits: [{ id: 'good', on: ['done'], to: 'done' }, { id: 'other', on: ['not-sure', 'cannot'], to: 'done', verdict: 'fail' }] }), /"other" calls an unsure answer a failure/],
  ])('call an unsure answer of %s something else', (_, unsure, message) => {
    expect(documentSays([look('d1'), dead('d1', 'm'), unsure])).toMatch(message);
  });
  it('raise the lamp to full mains, past the countersign of the first full power', () => {
    const up = step('raise', 'up', 'abort', { contact: 'none', source: 'mains', through: 'mains', node: 'inlet', load: 'none', mostVolts: 230, mostAmps: 2, longestMinutes: 10, abort: 'abort' }, 'abort');
    const proof = proofOf(treeOf([...passed('again'), lamp('again', 'up'), up]));
    expect(proof.rules.filter((r) => !r.holds).map((r) => r.id)).toEqual(['H20']);
  });
  it('call a lamp that limits nothing a limited first power', () => {
    // 120 VA on the plate: a lamp of up to 240 W limits it (series lamp sheet, common practice, no source)
    const through = (watts: number) => rulesOf(treeOf([...ready('lamp'), lamp('lamp', 'abort', { lampWatts: watts })]));
    expect(through(240)).toEqual([]);
    expect(through(1000)).toEqual(['H6']);
  });
  it('feed a rail that has no trip with more than it may have', () => {
    const bare: Profile = { ...benchProfile, rails: benchProfile.rails.map((r) => ({ ...r, trip: null })) };
    const feed = (volts: number) => rulesOf(treeOf([...ready('feed'), bench('feed', 'abort', { node: 'rail', rail: 'p5', mostVolts: volts })]), bare);
    expect(feed(6.6)).toEqual(['H9']);
    expect(feed(5.2)).toEqual([]);
  });
  it('trim the regulator with the boards in', () => {
    const boards: Profile = { ...benchProfile, outOfMachine: false };
    const trim = step('do', 'trim', 'done', { contact: 'probe', trims: 'regulator' });
    expect(rulesOf(treeOf([look('d1'), dead('d1', 'trim'), trim]), boards)).toContain('H9');
    expect(rulesOf(treeOf([look('d1'), dead('d1', 'trim'), trim]))).toEqual([]);
  });
  it('clip an earthed scope to the bulk capacitor of a switch-mode supply', () => {
    const switcher: Profile = { ...benchProfile, supplyKind: 'switch-mode' };
    const scope = (point: string) => fit('scope', { id: 'scope', name: 'scope', class: 'clip', area: 'clip', earthed: true, point }, 'done');
    const onScope = (point: string, profile: Profile) => rulesOf(treeOf([look('d1'), dead('d1', 'scope'), scope(point)]), profile);
    expect(onScope('raw', switcher)).toEqual(['H8']);
    expect(onScope('each-store', switcher)).toEqual(['H8']);
    expect(onScope('t5', switcher)).toEqual([]);
    expect(onScope('raw', benchProfile)).toEqual([]);
  });
  it('try again and again', () => {
    const again = (n: number) => rulesOf(treeOf([look('see'), observe('see', 'done', { exits: [{ id: 'good', label: 'Good', on: ['answer'], to: 'done' }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'see', atMost: n, then: 'refer' }] })]));
    expect(again(4)).toEqual(['H16']);
    expect(again(3)).toEqual([]);
  });
  it('raise in a called tree what its caller has put in', () => {
    const up = step('raise', 'up', 'done', { contact: 'none', source: 'bench', through: 'bench', node: 'raw', load: 'none', mostVolts: 12, mostAmps: 1, longestMinutes: 5, abort: 'abort' }, 'abort');
    const inner = treeOf([up], { id: 'inner' });
    const tree = treeOf([...ready('feed'), bench('feed', 'go'), { ...dead('go', 'abort'), tree: 'inner', exits: [{ id: 'both', on: ['done', 'refer'], to: 'abort' }] }]);
    expect(proofOf(tree, benchProfile, [makeDeadTree, inner]).rules.find((r) => r.id === 'H19')?.story).toMatch(/only reads a source that was in at its call/);
  });
  it('call a tree that is not for this machine', () => {
    const other = treeOf([dead('safe', 'done')], { id: 'other', appliesTo: { protectiveClasses: ['II'], supplyKinds: ['linear'], fewestRails: 1, mostRails: 6 } });
    const tree = treeOf([look('go'), { ...dead('go', 'done'), tree: 'other', exits: [{ id: 'done', on: ['done'], to: 'done' }] }]);
    expect(proofOf(tree, benchProfile, [makeDeadTree, other]).rules.find((r) => r.id === 'H19')?.story).toMatch(/does not apply here: it is for protective class II/);
  });
});
