import { describe, expect, it } from 'vitest';

import { parseProfile, parseTree } from '@/flows/document/parseTree';

import { benchProfile, lampTreeJson } from '../support/bench';
import { dead, lamp, look, step, treeJson, work } from '../support/steps';

type Json = Record<string, unknown>;
const faults = (json: unknown) => {
  const parsed = parseTree(json);
  return parsed.ok ? [] : parsed.faults.map((f) => `${f.step ?? 'head'}|${f.key}|${f.message}`);
};
const changed = (change: (tree: Json & { steps: (Json & { exits: Json[] })[] }) => void) => {
  const tree = structuredClone(lampTreeJson) as never;
  change(tree);
  return faults(tree);
};

describe('parseTree', () => {
  it('reads a good tree', () => {
    expect(faults(lampTreeJson)).toEqual([]);
  });
  it('reports every fault at once, with step and key', () => {
    const found = changed((t) => {
      t['title'] = '';
      t.steps[0]!.exits[0]!['to'] = 'nowhere';
      t.steps[5]!['abort'] = 'see';
      (t['suspects'] as Json[])[0]!['prior'] = 0;
    });
    // what has the wrong shape is told first; the rest needs a document of the right shape
    expect(found).toEqual(expect.arrayContaining([expect.stringMatching(/^head\|title\|/), expect.stringMatching(/^head\|suspects\.0\.prior\|/)]));
    const shaped = changed((t) => {
      t.steps[0]!.exits[0]!['to'] = 'nowhere';
      t.steps[5]!['abort'] = 'see';
    });
    expect(shaped).toEqual(['look|exits.0.to|leads to "nowhere", which is no step', 'lamp|abort|the abort target is an isolate step, or the call of a tree that begins with one']);
  });
  it('wants a counted exit where workings count the boards that are in', () => {
    const found = changed((t) => {
      t.steps[0]!['workings'] = { sheet: 'refit-trip', boardsIn: { step: 'look', exit: 'none' } };
    });
    expect(found).toEqual(['look|workings.boardsIn|"none" of "look" is no counted exit']);
  });
  it.each([
    ['an unknown key', (t: Json) => (t['colour'] = 'red'), /Unrecognized key/],
    ['a format of another day', (t: Json) => (t['format'] = 9), /of format 9, and this program reads formats up to/],
    ['a prior that is no number', (t: Json) => ((t['suspects'] as Json[])[0]!['prior'] = 'likely'), /expected number/],
    ['a negative prior', (t: Json) => ((t['suspects'] as Json[])[0]!['prior'] = -1), />0/],
    ['an id like 10', (t: Json) => ((t['suspects'] as Json[])[0]!['id'] = '10'), /starts with a letter/],
    ['an id like a.b', (t: Json) => ((t['suspects'] as Json[])[0]!['id'] = 'a.b'), /starts with a letter/],
    ['a reserved id', (t: Json) => ((t['suspects'] as Json[])[0]!['id'] = 'constructor'), /reserved/],
    ['a suspect twice', (t: Json) => ((t['suspects'] as Json[])[1]!['id'] = 'short'), /twice/],
  ])('refuses %s', (_, change, message) => {
    expect(changed(change).join('\n')).toMatch(message);
  });
  it('does not take keys that pollute prototypes', () => {
    const parsed = JSON.parse(JSON.stringify(lampTreeJson).replace('"format":1', '"format":1,"__proto__":{"polluted":true}')) as unknown;
    expect(faults(parsed).length).toBeGreaterThan(0);
    expect(({} as Json)['polluted']).toBeUndefined();
  });
  it.each([
    ['a step twice', [look('look'), look('done')], /"look" is there twice/],
    ['a fit without hands', [step('do', 'fit', 'done', { fits: [{ id: 'x', name: 'x', class: 'link', area: 'part' }] })], /work of the hands/],
    ['taking out what nothing fits', [step('do', 'take', 'done', { contact: 'hands', removes: ['ghost'] })], /nothing fits "ghost"/],
    ['an earthed clip on the primary', [step('do', 'clip', 'done', { contact: 'hands', fits: [{ id: 'scope', name: 'scope', class: 'clip', area: 'primary', earthed: true, point: 'raw' }] })], /never clipped to the primary/],
    ['ohms read live', [step('measure', 'ohms', 'done', { contact: 'probe', probe: 'hand', quantity: 'ohms', power: 'live', limit: { is: 'above', low: 1 } })], /only read dead/],
    ['a nominal of its row without rows', [step('measure', 'm', 'done', { contact: 'probe', probe: 'hand', quantity: 'volts-dc', limit: { is: 'nominal', of: 'row', tolerance: 'row' } })], /over rails/],
    ['a limit in another unit than its quantity', [step('measure', 'm', 'done', { contact: 'probe', probe: 'hand', quantity: 'volts-dc', unit: 'mV', limit: { is: 'below', high: 50 } })], /m\|unit\|a limit of volts-dc is in V, not in mV/],
    ['an empty limit', [step('measure', 'm', 'done', { contact: 'probe', probe: 'hand', quantity: 'volts-dc', limit: { is: 'between', low: 5, high: 4 } })], /low end lies above/],
    ['mains into the raw node', [lamp('l', 'done', { node: 'raw' })], /mains goes into the inlet/],
    ['a lamp that is not named', [{ ...lamp('l', 'done'), lampWatts: undefined }], /names no lamp/],
    ['work for a check that is not there', [work('w', 'part', 'done', { for: ['ghost'] })], /no step "ghost"/],
    ['an unsure answer called a pass', [step('measure', 'm', 'done', { contact: 'probe', probe: 'hand', quantity: 'volts-dc', limit: { is: 'below', high: 4 }, exits: [{ id: 'a', on: ['in', 'close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], to: 'done', verdict: 'pass' }] })], /calls an unsure answer a pass/],
    ['a find without a reason', [step('measure', 'm', 'done', { contact: 'probe', probe: 'hand', quantity: 'volts-dc', limit: { is: 'below', high: 4 }, exits: [{ id: 'a', on: ['in', 'close', 'low', 'high', 'reversed', 'not-sure', 'cannot'], to: 'done', verdict: 'find' }] })], /says its reason/],
    ['half a counted exit', [step('work', 'w', 'done', { contact: 'hands', area: 'part', exits: [{ id: 'a', on: ['done', 'not-sure', 'cannot'], to: 'done', atMost: 3 }] })], /both `atMost` and `then`/],
  ])('refuses %s', (_, steps, message) => {
    expect(faults(treeJson(steps as Json[])).join('\n')).toMatch(message);
  });
  it('refuses what is no document at all', () => {
    for (const json of [null, 7, 'tree', [], {}]) expect(parseTree(json).ok).toBe(false);
  });
  it('answers a megabyte of nested rubbish quickly', () => {
    let nested: unknown = 1;
    for (let i = 0; i < 5000; i += 1) nested = { steps: [nested] };
    expect(parseTree(nested).ok).toBe(false);
    expect(parseTree({ ...lampTreeJson, steps: Array.from({ length: 12_001 }, () => lampTreeJson.steps[0]) }).ok).toBe(false);
  });
  it('keeps a called make-dead tree as its own document', () => {
    expect(faults(treeJson([look('d1'), dead('d1', 'done')]))).toEqual([]);
  });
});

describe('parseProfile', () => {
  const profileFaults = (change: (p: Json) => void) => {
    const p = structuredClone(benchProfile) as unknown as Json;
    change(p);
    const parsed = parseProfile(p);
    return parsed.ok ? '' : parsed.faults.map((f) => `${f.key}: ${f.message}`).join('\n');
  };
  it.each([
    ['a rail at 0 V', (p: Json) => ((p['rails'] as Json[])[0]!['nominal'] = 0), /a rail at 0 V is a return/],
    ['a trip below its rail', (p: Json) => ((p['rails'] as Json[])[0]!['trip'] = { lowVolts: 4.9, highVolts: 6 }), /at or below the rail/],
    ['a limit below the rating', (p: Json) => ((p['rails'] as Json[])[0]!['limitAmps'] = 1), /limit lies below/],
    ['a capacitor at a point that is not there', (p: Json) => ((p['stores'] as Json[])[0]!['point'] = 'ghost'), /no point "ghost"/],
    ['a capacitor worked above its rating', (p: Json) => ((p['stores'] as Json[])[0]!['voltsWorked'] = 900), /above its rating/],
    ['a rebound without a wait', (p: Json) => ((p['stores'] as Json[])[0]!['reboundWaitSeconds'] = 0), /needs a wait/],
    ['a source called mains', (p: Json) => (p['sources'] = [{ id: 'mains', name: 'x', kind: 'battery', volts: 3 }]), /always there/],
    ['no zero point', (p: Json) => (p['zeroPoint'] = 'ghost'), /zeroPoint: no point/],
    ['a key of another day', (p: Json) => (p['extra'] = 1), /Unrecognized/],
  ])('refuses %s', (_, change, message) => {
    expect(profileFaults(change)).toMatch(message);
  });
});
