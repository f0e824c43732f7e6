/** Each house rule at run time: a tree that breaks it, played until the machine refuses, and its twin that is let through. */
import { describe, expect, it } from 'vitest';

import { Bench, benchProfile, program } from '../support/bench';
import { play, ready } from '../support/play';
import { bench, clip, connect, dead, earth, fit, hands, insulation, lamp, look, mains, observe, rails, remove, step, treeOf, work } from '../support/steps';

describe('H1: hands only on what is proved dead', () => {
  it('refuses hands before the first proof', () => {
    expect(play(treeOf([look('touch'), hands('touch', 'done')]))).toMatchObject({ rule: 'H1', at: 'look' });
  });
  it('refuses to go on to hands while live', () => {
    expect(play(treeOf([...ready('lamp'), lamp('lamp', 'touch'), hands('touch', 'done')])).rule).toBe('H1');
  });
  it('refuses covers while a source is in', () => {
    expect(play(treeOf([...ready('lamp'), lamp('lamp', 'cover'), observe('cover', 'done', { contact: 'cover' })])).rule).toBe('H1');
  });
  it('refuses ohms by probe on what is not dead', () => {
    const ohms = step('measure', 'ohms', 'done', { contact: 'probe', probe: 'hand', quantity: 'ohms', limit: { is: 'above', low: 1 } });
    expect(play(treeOf([look('ohms'), ohms])).rule).toBe('H1');
    expect(play(treeOf([look('d1'), dead('d1', 'ohms'), ohms])).rule).toBeNull();
  });
  it('refuses hands straight after the insulation test', () => {
    expect(play(treeOf([look('d1'), dead('d1', 'insulation'), insulation('touch'), hands('touch', 'done')])).rule).toBe('H1');
  });
});

describe('H2 and H3: proved dead', () => {
  it('refuses a proof while a source is in (H2)', () => {
    expect(play(treeOf([look('prove'), step('prove-dead', 'prove', 'done', { contact: 'probe' })])).rule).toBe('H2');
  });
  it('refuses to discharge a machine that is plugged in (H3)', () => {
    expect(play(treeOf([look('bleed'), step('discharge', 'bleed', 'done', { contact: 'probe', toolOhms: 100, toolWatts: 10 })])).rule).toBe('H3');
  });
  it('refuses the proof of a part that was not discharged (H3)', () => {
    const isolate = step('isolate', 'out', 'prove');
    expect(play(treeOf([look('out'), isolate, step('prove-dead', 'prove', 'done', { contact: 'probe' })])).rule).toBe('H3');
  });
  it('takes one two-pole tester for the whole proof (H2)', () => {
    const b = new Bench(program(treeOf([look('d1'), dead('d1', 'done')])));
    b.pass().answer('good').pass().pass();
    b.do({ type: 'WARNING_READ', step: b.view.key }).row().row();
    const row = b.view.current?.row.id ?? '';
    const read = (id: string, twoPole: boolean) => b.try({ type: 'READING', step: b.view.key, row, value: 0, typed: '0', instrument: { id, twoPole, uncertainty: 0.01 } });
    expect(read('other', true)).toMatchObject({ ok: false, refusal: { rule: 'H2', code: 'instrument' } });
    expect(read('tester', false)).toMatchObject({ ok: false, refusal: { rule: 'H2' } });
    expect(read('tester', true).ok).toBe(true);
  });
  it('waits for the discharge and for the rebound before it takes a reading (H3)', () => {
    const b = new Bench(program(treeOf([look('d1'), dead('d1', 'done')])));
    b.pass().answer('good').pass();
    b.do({ type: 'WARNING_READ', step: b.view.key });
    const early = b.try({ type: 'READING', step: b.view.key, row: 'c1', value: 0, typed: '0', instrument: { id: 'tester', twoPole: true, uncertainty: 0.01 } });
    expect(early).toMatchObject({ ok: false, refusal: { code: 'too-early', rule: 'H3' } });
    b.pass();
    b.do({ type: 'WARNING_READ', step: b.view.key });
    while (b.view.current && !b.view.current.row.id.startsWith('again-')) b.row();
    const opensAt = b.view.current?.opensAt ?? 0;
    expect(opensAt - b.at).toBeGreaterThan(50_000);
  });
  it('goes on only when the second proof of the tester is good, and holds every source unknown when it is not', () => {
    const b = new Bench(program(treeOf([look('d1'), dead('d1', 'done')])));
    b.pass().answer('good').pass().pass().pass({ 'proof-after': 'cannot' });
    expect(b.view.key).toBe('d1/isolate');
    expect(b.view.facts.sources.every((s) => s.state === 'unknown')).toBe(true);
  });
});

describe('H4: temporary things are counted', () => {
  const link = { id: 'short', name: 'shorting link', class: 'link', area: 'part' };
  it('refuses power with a link fitted', () => {
    expect(play(treeOf([...ready('link'), fit('link', link, 'lamp'), lamp('lamp', 'abort')])).rule).toBe('H4');
    expect(play(treeOf([...ready('link'), fit('link', link, 'unlink'), remove('unlink', 'short', 'lamp'), lamp('lamp', 'abort')])).rule).toBeNull();
  });
  it('refuses power with the earth or the primary lifted', () => {
    const strap = { id: 'strap', name: 'earth strap', class: 'lifted', area: 'earth' };
    // fitting voids earth and insulation, which speak first
    expect(['H4', 'H7']).toContain(play(treeOf([...ready('lift'), fit('lift', strap, 'lamp'), lamp('lamp', 'abort')])).rule);
  });
});

describe('H5: the guard', () => {
  it('refuses a guard that was let go too soon', () => {
    const b = new Bench(program(treeOf([...ready('lamp'), lamp('lamp', 'abort')])));
    b.pass().answer('good').dead().pass().pass().pass().dead();
    b.do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' }).do({ type: 'HOLD_GIVEN', step: 'lamp', by: 'sam' });
    expect(b.try({ type: 'GUARD_HELD', step: 'lamp', heldMs: 1200 })).toMatchObject({ ok: false, refusal: { rule: 'H5' } });
    expect(b.view.facts.sources.find((s) => s.id === 'mains')?.state).toBe('out');
    expect(b.try({ type: 'GUARD_HELD', step: 'lamp', heldMs: 2000 }).ok).toBe(true);
  });
  it('refuses a second source', () => {
    expect(play(treeOf([...ready('bench'), bench('bench', 'lamp'), lamp('lamp', 'abort')])).rule).toBe('H5');
  });
  it('refuses a load other than the declared one', () => {
    expect(play(treeOf([...ready('lamp'), lamp('lamp', 'abort', { load: 'light' })])).rule).toBe('H5');
    expect(play(treeOf([...ready('load'), connect('load', 'light', 'lamp'), lamp('lamp', 'abort', { load: 'light' })])).rule).toBeNull();
  });
});

describe('H6 and H7: limited first, earth and insulation before any inlet power', () => {
  it('refuses mains without a limited pass', () => {
    expect(play(treeOf([...ready('mains'), mains('mains', 'abort')])).rule).toBe('H6');
  });
  it('lets mains follow a limited pass on the same build', () => {
    const passed = [...ready('clip'), clip('lamp'), lamp('lamp', 'read'), rails('read', 'limited', 'd3'), dead('d3', 'unclip'), remove('unclip', 'rail-clips', 'mains')];
    expect(play(treeOf([...passed, mains('mains', 'abort')])).rule).toBeNull();
    expect(play(treeOf([...passed.slice(0, -1), remove('unclip', 'rail-clips', 'work'), work('work', 'regulator', 'mains'), mains('mains', 'abort')])).rule).not.toBeNull();
  });
  it('does not let a bench pass open the mains', () => {
    expect(play(treeOf([...ready('bench'), bench('bench', 'read'), rails('read', 'regulator', 'd3'), dead('d3', 'mains'), mains('mains', 'abort')])).rule).toBe('H6');
  });
  it('refuses the lamp without the look-over, the earth, or the insulation', () => {
    expect(play(treeOf([dead('d1', 'earth'), earth('insulation'), insulation('d2'), dead('d2', 'lamp'), lamp('lamp', 'abort')])).rule).toBe('H6');
    expect(play(treeOf([look('d1'), dead('d1', 'insulation'), insulation('d2'), dead('d2', 'lamp'), lamp('lamp', 'abort')])).rule).toBe('H7');
    expect(play(treeOf([look('d1'), dead('d1', 'earth'), earth('lamp'), lamp('lamp', 'abort')])).rule).toBe('H7');
  });
  it('asks no earth of Class II', () => {
    const classTwo = { ...benchProfile, mains: { ...benchProfile.mains, protectiveClass: 'II' as const } };
    expect(play(treeOf([look('d1'), dead('d1', 'insulation'), insulation('d2'), dead('d2', 'lamp'), lamp('lamp', 'abort')]), {}, classTwo).rule).toBeNull();
  });
  it('asks on Class II, where a tree proves the earth, whether there is none; an earth that is there is a failure', () => {
    const classTwo = { ...benchProfile, mains: { ...benchProfile.mains, protectiveClass: 'II' as const } };
    const atEarth = () => new Bench(program(treeOf([dead('d1', 'earth'), earth('done')]), classTwo)).pass().dead().do({ type: 'WARNING_READ', step: 'earth' });
    const bench = atEarth();
    expect(bench.view).toMatchObject({ key: 'earth', title: 'Class II: no earth to prove' });
    expect(bench.view.current?.row).toMatchObject({ ask: 'word' });
    expect(bench.try({ type: 'READING', step: 'earth', row: 'earth', value: 0.05, typed: '0.05', instrument: { id: 'ohms', twoPole: false, uncertainty: 0 } }).ok).toBe(false);
    bench.row({ earth: 'high' });
    expect(bench.view.facts.earth).toBe('unknown');
    expect(bench.view.facts.owed.fails.map((fail) => fail.check)).toEqual(['earth']);
    expect(atEarth().row({ earth: 'in' }).view.facts.earth).toBe('proved');
  });
});

describe('H8: live steps only read or trim', () => {
  it('refuses fitting while live', () => {
    const resistor = { id: 'series', name: 'series resistor', class: 'series', area: 'regulator' };
    expect(play(treeOf([...ready('lamp'), lamp('lamp', 'fit'), fit('fit', resistor, 'done')])).rule).toBe('H1');
  });
  it('refuses a reading without contact where no clip was fitted', () => {
    const read = step('measure', 'read', 'abort', { probe: 'clipped', each: 'rails', quantity: 'volts-dc', power: 'live', limit: { is: 'nominal', of: 'row', tolerance: 'row' } });
    expect(play(treeOf([...ready('lamp'), lamp('lamp', 'read'), read])).rule).toBe('H8');
    expect(play(treeOf([...ready('clip'), clip('lamp'), lamp('lamp', 'read'), read])).rule).toBeNull();
  });
  it('refuses a live reading of a dead supply', () => {
    const read = step('measure', 'read', 'done', { contact: 'probe', probe: 'hand', each: 'rails', quantity: 'volts-dc', power: 'live', limit: { is: 'nominal', of: 'row', tolerance: 'row' } });
    expect(play(treeOf([look('read'), read])).rule).toBe('H8');
  });
});

describe('H9 and H10: boards', () => {
  it('refuses to fit boards into a supply that is not proved', () => {
    expect(play(treeOf([...ready('boards'), connect('boards', 'boards', 'done')])).rule).toBe('H9');
  });
  it('refuses the insulation test with boards in', () => {
    const inMachine = { ...benchProfile, outOfMachine: false };
    expect(play(treeOf([look('d1'), dead('d1', 'insulation'), insulation('done')]), {}, inMachine).rule).toBe('H9');
  });
  it('refuses to energise boards', () => {
    const inMachine = { ...benchProfile, outOfMachine: false, boards: { removable: false, fitted: [] } };
    expect(play(treeOf([...ready('lamp'), lamp('lamp', 'abort', { load: 'boards' })]), {}, inMachine).rule).toBe('H9');
  });
});

describe('H12: ends', () => {
  it('refuses "supply proven" on facts that are not there', () => {
    const claims = treeOf([look('d1'), dead('d1', 'proven'), { id: 'proven', kind: 'end', title: 'Proven', lines: ['It is.'], contact: 'none', tools: [], minutes: 0, hazards: [], exits: [], says: 'supply-proven' }]);
    expect(play(claims).rule).toBe('H12');
  });
  it('closes out an end that is reached live: isolate, discharge, prove dead', () => {
    const b = play(treeOf([...ready('lamp'), lamp('lamp', 'see'), observe('see', 'done', { power: 'live' })])).bench;
    expect(b.view.band).toBe('proved-dead');
    expect(b.state.context.visited).toEqual(expect.arrayContaining(['~isolate', '~discharge', '~prove']));
  });
  it('takes out what was put in, and names what stays', () => {
    const b = play(treeOf([...ready('clip'), clip('done')])).bench;
    expect(b.state.context.visited).toContain('~take-out');
    expect(b.view.facts.fitted).toEqual([]);
  });
});

describe('what an earlier run has left', () => {
  const strap = { id: 'strap', name: 'earth strap', class: 'lifted', area: 'earth' } as const;
  const carried = () => {
    const b = new Bench(program(treeOf([look('done')])), false, { fitted: [strap] });
    b.pass();
    return b;
  };
  it('is put back, dead, before the first step', () => {
    const b = carried();
    expect(b.view.key).toBe('~isolate');
    b.dead();
    expect(b.view).toMatchObject({ key: '~put-back', band: 'proved-dead' });
    b.pass();
    expect(b.view.key).toBe('look');
    expect(b.view.facts.fitted).toEqual([]);
  });
  it('stops the run when it has to stay, still named on the machine', () => {
    const b = carried().dead().pass({ strap: 'cannot' });
    expect(b.view.end).toMatchObject({ says: 'stopped' });
    expect(b.view.facts.fitted).toEqual([strap]);
  });
});

describe('H13 and H14: unsure and failed', () => {
  const tree = treeOf([...ready('see'), observe('see', 'lamp', {}, 'lamp'), lamp('lamp', 'abort')]);
  it('gives no power after an unsure answer', () => {
    expect(play(tree, { see: 'not-sure' }).rule).toBe('H13');
  });
  it('gives no power after a failed check that was not fixed', () => {
    expect(play(tree, { see: 'bad' }).rule).toBe('H14');
    expect(play(tree).rule).toBeNull();
  });
  it('gives no power after a photo that was wanted and not taken', () => {
    const seen = treeOf([...ready('seen'), step('photo', 'seen', 'lamp', { of: 'connectors', power: 'dead' }, 'lamp'), lamp('lamp', 'abort')]);
    expect(play(seen, { seen: 'cannot' }).rule).toBe('H13');
  });
  it('gives power again when a senior has lifted the doubt at a hold that names it', () => {
    const held = treeOf([...ready('see'), observe('see', 'hold', {}, 'hold'), step('hold', 'hold', 'lamp', { asks: 'Go on?', names: ['see'] }), lamp('lamp', 'abort')]);
    expect(play(held, { see: 'not-sure' }).rule).toBeNull();
  });
  it('refuses a tree whose exits leave an outcome out, or take it twice', () => {
    expect(() => treeOf([step('measure', 'm', 'done', { contact: 'probe', probe: 'hand', quantity: 'ohms', limit: { is: 'above', low: 1 }, exits: [{ id: 'in', on: ['in'], to: 'done' }] })])).toThrow(/H13: no exit for/);
    expect(() => treeOf([step('work', 'w', 'done', { contact: 'hands', area: 'part', exits: [{ id: 'a', on: ['done'], to: 'done' }, { id: 'b', on: ['done', 'not-sure', 'cannot'], to: 'done' }] })])).toThrow(/H13: 2 exits for/);
  });
});

describe('H15: what killed a replaced part', () => {
  const swap = work('swap', 'regulator', 'again', { replaces: ['pass'] });
  const redo = (next: string) => [observe('again', 'd3', { lookOver: true }), dead('d3', 'earth'), earth('insulation'), insulation('d4'), dead('d4', next)];
  it('is ruled out before power', () => {
    expect(play(treeOf([look('d1'), dead('d1', 'swap'), swap, ...redo('lamp'), lamp('lamp', 'abort')])).rule).toBe('H15');
    const check = observe('check', 'lamp', { exits: [{ id: 'good', label: 'Good', on: ['answer'], to: 'lamp', evidence: [{ suspect: 'diode', says: 'rules-out' }] }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' }] });
    expect(play(treeOf([look('d1'), dead('d1', 'swap'), swap, ...redo('check'), check, lamp('lamp', 'abort')])).rule).toBeNull();
  });
});

describe('H17 and H20: the warning, the hold point', () => {
  const atLamp = () => {
    const b = new Bench(program(treeOf([...ready('lamp'), lamp('lamp', 'abort')])));
    b.pass().answer('good').dead().pass().pass().pass().dead();
    return b;
  };
  it('shows the warning before the guard, and takes nothing else first', () => {
    const b = atLamp();
    expect(b.view.phase).toBe('warning');
    expect(b.view.hazards).toContain('mains-shock');
    expect(b.try({ type: 'GUARD_HELD', step: 'lamp', heldMs: 3000 }).ok).toBe(false);
    expect(b.try({ type: 'ANSWER', step: 'lamp', answer: 'on' }).ok).toBe(false);
  });
  it('puts a hold point before the first power of a kind, unless the restorer is a senior', () => {
    const b = atLamp().do({ type: 'WARNING_READ', step: 'lamp' });
    expect(b.view.phase).toBe('hold');
    const senior = new Bench(program(treeOf([...ready('lamp'), lamp('lamp', 'abort')])), true);
    senior.pass().answer('good').dead().pass().pass().pass().dead();
    expect(senior.do({ type: 'WARNING_READ', step: 'lamp' }).view.phase).toBe('guard');
  });
  it('never takes the countersign of the one who does the work', () => {
    const b = atLamp().do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' });
    expect(b.try({ type: 'HOLD_GIVEN', step: 'lamp', by: 'ann' })).toMatchObject({ ok: false, refusal: { rule: 'H20' } });
    expect(b.do({ type: 'HOLD_GIVEN', step: 'lamp', by: 'sam' }).view.phase).toBe('guard');
  });
  it('leads to make-safe when the countersign is refused', () => {
    const b = atLamp().do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' });
    b.do({ type: 'HOLD_REFUSED', step: 'lamp', by: 'sam', reason: 'Fit the fan first.' });
    expect(b.view.key).toBe('~isolate');
    expect(b.view.facts.owed.doubts).toEqual(['lamp']);
  });
  it('lets an old countersign go stale', () => {
    const b = atLamp().do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' }).do({ type: 'HOLD_GIVEN', step: 'lamp', by: 'sam' });
    b.at += 31 * 60_000;
    expect(b.try({ type: 'GUARD_HELD', step: 'lamp', heldMs: 3000 })).toMatchObject({ ok: false, refusal: { rule: 'H20' } });
  });
});

describe('H11 and H21: time, stop, lapse', () => {
  const live = () => {
    const b = new Bench(program(treeOf([...ready('lamp'), lamp('lamp', 'see'), observe('see', 'abort', { power: 'live' })], { reentries: [{ step: 'earth', needs: ['dead'] }] })));
    b.pass().answer('good').dead().pass().pass().pass().dead().answer('on');
    return b;
  };
  it('takes only isolate, abort and Stop once the time is up', () => {
    const b = live();
    b.at += 11 * 60_000;
    expect(b.try({ type: 'ANSWER', step: 'see', answer: 'good' })).toMatchObject({ ok: false, refusal: { rule: 'H11', code: 'overdue' } });
    expect(b.do({ type: 'ABORT' }).view.key).toBe('abort/isolate');
  });
  it('does not pause while live', () => {
    expect(live().try({ type: 'PAUSE' })).toMatchObject({ ok: false, refusal: { rule: 'H11' } });
  });
  it('stops at once and leads to power only through proved dead', () => {
    const b = live().do({ type: 'STOP' });
    expect(b.view.key).toBe('~isolate');
    expect(b.try({ type: 'REENTER', step: 'earth' })).toMatchObject({ ok: false, refusal: { rule: 'H21' } });
    b.dead();
    expect(b.view.key).toBe('~choose');
    expect(b.view.reentries.map((r) => r.key)).toEqual(['earth']);
    expect(b.do({ type: 'REENTER', step: 'earth' }).view.key).toBe('earth');
  });
  it('mends a proof that is older than 30 minutes and comes back to the step', () => {
    const b = new Bench(program(treeOf([look('d1'), dead('d1', 'touch'), hands('touch', 'again'), hands('again', 'done')])));
    b.pass().answer('good').dead();
    expect(b.view.key).toBe('touch');
    b.at += 31 * 60_000;
    b.do({ type: 'TICK' });
    expect(b.view.key).toBe('~isolate');
    b.dead();
    expect(b.view.key).toBe('touch');
  });
  it('comes back to make-safe when the page was loaded anew while live, and to the step when it was dead', () => {
    const b = live();
    b.boot = 'boot-2';
    expect(b.try({ type: 'ANSWER', step: 'see', answer: 'good' })).toMatchObject({ ok: false, refusal: { code: 'restarted' } });
    expect(b.do({ type: 'RESTART' }).view.key).toBe('~isolate');
    expect(b.view.band).toBe('unknown');

    const d = new Bench(program(treeOf([look('d1'), dead('d1', 'touch'), hands('touch', 'done')])));
    d.pass().answer('good').dead();
    d.boot = 'boot-2';
    d.do({ type: 'RESTART' });
    expect(d.view.key).toBe('~isolate');
    expect(d.view.purpose).toEqual({ is: 'mend', to: 'touch' });
    expect(d.dead().view.key).toBe('touch');
  });
  it('lets the facts lapse when the clock is put back', () => {
    const d = new Bench(program(treeOf([look('d1'), dead('d1', 'touch'), hands('touch', 'done')])));
    d.pass().answer('good').dead();
    d.skewMs = -3_600_000;
    d.do({ type: 'TICK' });
    expect(d.view.facts.stored).not.toBe('proved');
    expect(d.view.purpose).toEqual({ is: 'mend', to: 'touch' });
  });
});

describe('a limit that is said by size', () => {
  it('takes a current the wrong way round for what it is', () => {
    const leak = (value: number) => {
      const b = new Bench(program(treeOf([look('d1'), dead('d1', 'leak'), step('measure', 'leak', 'done', { contact: 'probe', probe: 'hand', quantity: 'amps-dc', limit: { is: 'below', high: 0.005 } })])));
      return b.pass().answer('good').dead().pass({ reading: value }).view.end?.key;
    };
    expect(leak(0.002)).toBe('done');
    expect(leak(-0.002)).toBe('done');
    expect(leak(-0.02)).toBe('refer');
  });
});

describe('H20: live work above the limits', () => {
  const probe = (red: string) => step('measure', 'read', 'abort', { contact: 'probe', probe: 'hand', quantity: 'volts-dc', power: 'live', points: { red }, limit: { is: 'between', low: 1, high: 400 } });
  const high = { ...benchProfile, points: [...benchProfile.points, { id: 'bulk', name: 'bulk +', connector: 'C9', pin: '+', rail: null, mark: null, neighbours: [] }] };
  it('needs a second person who has signed in, and never the restorer', () => {
    const { rule, bench: b } = play(treeOf([...ready('lamp'), lamp('lamp', 'read'), probe('bulk')]), {}, high);
    expect(rule).toBe('H20');
    expect(b.try({ type: 'SECOND_PRESENT', by: 'ann' }).ok).toBe(false);
    b.do({ type: 'SECOND_PRESENT', by: 'sam' }).row();
    expect(b.view.key).toBe('abort/isolate');
  });
  it('asks nobody for a rail of 5 V', () => {
    expect(play(treeOf([...ready('lamp'), lamp('lamp', 'read'), probe('t5')]), {}, high).rule).toBeNull();
  });
});
