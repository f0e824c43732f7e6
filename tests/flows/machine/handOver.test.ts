/** Handing a run over: what lapses, what is read back, who may take it, and that no way round it leads on. */
import { describe, expect, it } from 'vitest';

import { advance } from '@/flows/machine/advance';

import { Bench, lampTree, program } from '../support/bench';
import { connect, dead, earth, fit, hands, insulation, lamp, look, observe, returns, treeOf } from '../support/steps';

const CLIP = { id: 'own-clip', name: 'clip on C1', class: 'clip', area: 'clip', point: 'raw' };
const gives = { type: 'HANDED_OVER', by: 'ann', to: 'bo', meaning: 'I hand this run over.' } as const;
const takes = { type: 'TAKEN_OVER', by: 'bo', senior: false, meaning: 'I take this run over.' } as const;

/** The other device: a load of its page of its own, with clocks of its own. */
const onOtherDevice = (b: Bench) => {
  b.boot = 'other-device';
  return b;
};
const handed = (b: Bench) => onOtherDevice(b.do(gives).do(takes));

const touching = () => new Bench(program(treeOf([look('d1'), dead('d1', 'clip'), fit('clip', CLIP, 'touch'), hands('touch', 'done')], { reentries: [{ step: 'touch', needs: ['dead'] }] })));
const atTouch = () => touching().pass().answer('good').dead().answer('done');

describe('an offer', () => {
  it('pauses the run, lets "proved dead" lapse, and can be taken back', () => {
    const b = atTouch();
    expect(b.view.band).toBe('proved-dead');
    b.do(gives);
    expect(b.view).toMatchObject({ phase: 'paused', title: 'Offered', handing: { to: 'bo' }, restorer: 'ann', band: 'unknown' });
    expect(b.try({ type: 'ANSWER', step: 'touch', answer: 'done' }).ok).toBe(false);
    expect(b.do({ type: 'RESUME' }).view).toMatchObject({ key: '~isolate', handing: null, restorer: 'ann', purpose: { is: 'mend', to: 'touch' } });
    expect(b.try(takes)).toMatchObject({ ok: false, refusal: { code: 'not-now' } });
    expect(b.dead().view.key).toBe('touch');
  });
  it('comes from the restorer, to somebody else, once', () => {
    const b = atTouch();
    expect(b.try({ ...gives, by: 'sam' })).toMatchObject({ ok: false, refusal: { code: 'not-allowed' } });
    expect(b.try({ ...gives, to: 'ann' })).toMatchObject({ ok: false, refusal: { code: 'not-allowed' } });
    b.do(gives);
    expect(b.try({ ...gives, to: 'cy' })).toMatchObject({ ok: false, refusal: { code: 'not-now' } });
  });
  it('is refused while the bench is live, and can be made after Stop once it is safe', () => {
    const b = new Bench(program(lampTree)).pass().answer('sound').dead().pass().pass().dead().answer('on');
    expect(b.view.band).toBe('lamp');
    expect(b.try(gives)).toMatchObject({ ok: false, refusal: { rule: 'H11' } });
    b.do({ type: 'STOP' });
    expect(b.try(gives)).toMatchObject({ ok: false, refusal: { rule: 'H11' } });
    b.dead();
    expect(b.view.key).toBe('~choose');
    expect(b.do(gives).view.phase).toBe('paused');
  });
  it('withdraws a countersign that is awaited, and one that was given', () => {
    const b = new Bench(program(lampTree)).pass().answer('sound').dead().pass().pass().dead();
    b.do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' }).do({ type: 'HOLD_GIVEN', step: 'lamp', by: 'sam' });
    expect(b.view.phase).toBe('guard');
    b.do(gives).do({ type: 'RESUME' }).dead();
    b.do({ type: 'WARNING_READ', step: 'lamp' });
    expect(b.view).toMatchObject({ key: 'lamp', phase: 'hold' });
  });
  it('stands when the giver’s page is loaded anew, and ends with Stop', () => {
    const b = atTouch().do(gives);
    b.boot = 'boot-2';
    expect(b.do({ type: 'RESTART' }).view).toMatchObject({ phase: 'paused', handing: { to: 'bo' } });
    expect(b.do({ type: 'STOP' }).view).toMatchObject({ key: '~isolate', handing: null });
    expect(b.try(takes).ok).toBe(false);
  });
  it('cannot be made at the end of a run', () => {
    const b = new Bench(program(treeOf([look('done')]))).pass().answer('good').dead();
    expect(b.view.phase).toBe('ended');
    expect(b.try(gives)).toMatchObject({ ok: false, refusal: { code: 'not-now' } });
  });
});

describe('taking a run over', () => {
  it('is for the one who was asked', () => {
    const b = atTouch();
    expect(b.try(takes).ok).toBe(false);
    b.do(gives);
    expect(b.try({ ...takes, by: 'cy' })).toMatchObject({ ok: false, refusal: { code: 'not-allowed' } });
  });
  it('leads through the bench opening, isolate, discharge, prove dead and the read-back to the step that was under way', () => {
    const b = handed(atTouch());
    expect(b.view).toMatchObject({ phase: 'opening', restorer: 'bo', handing: null });
    expect(b.view.facts).toMatchObject({ stored: 'lapsed', opened: false });
    expect(b.pass().view).toMatchObject({ key: '~isolate' });
    expect(b.dead().view).toMatchObject({ key: '~read-back', band: 'proved-dead' });
    b.do({ type: 'WARNING_READ', step: '~read-back' });
    expect(b.view.rows.map((r) => r.row.label)).toEqual(['Load: nothing is connected to the rails', 'clip on C1: is in', 'Nothing else temporary is in']);
    expect(b.pass().view).toMatchObject({ key: 'touch', phase: 'warning' });
  });
  it('keeps what the facts say of the supply: only what lapses is made again', () => {
    const tree = treeOf([look('d1'), dead('d1', 'returns'), returns('earth'), earth('insulation'), insulation('d2'), dead('d2', 'touch'), hands('touch', 'done')]);
    const b = handed(new Bench(program(tree)).pass().answer('good').dead().pass().pass().pass().dead()).pass().dead().pass();
    expect(b.view.key).toBe('touch');
    expect(b.view.facts).toMatchObject({ looked: 'proved', returns: 'proved', earth: 'proved', insulation: 'proved', stored: 'proved', opened: true });
  });
  it.each([
    ['own-clip', 'cannot'],
    ['own-clip', 'not-sure'],
    ['load', 'cannot'],
    ['nothing-else', 'not-sure'],
  ])('ends as stopped when the bench does not bear the record out (%s: %s)', (row, word) => {
    const b = handed(atTouch()).pass().dead();
    b.pass({ [row]: word });
    expect(b.view.key).toBe('~take-out');
    expect(b.view.facts.owed.doubts).toEqual(['~read-back']);
    expect(b.view.facts.load).toBe(row === 'load' ? 'boards' : 'none');
    b.pass();
    expect(b.view).toMatchObject({ key: '~choose', reentries: [] });
    expect(b.do({ type: 'CLOSE' }).view.end?.says).toBe('stopped');
  });
  it('is not slipped through by Stop, a reload or a pause', () => {
    for (const slip of ['STOP', 'RESTART', 'PAUSE'] as const) {
      const b = handed(atTouch()).pass();
      if (slip === 'RESTART') b.boot = 'third-load';
      b.do({ type: slip });
      if (slip === 'PAUSE') b.do({ type: 'RESUME' });
      expect(b.view.key).toBe('~isolate');
      expect(b.dead().view.key).toBe('~read-back');
    }
  });
  it('goes on after a Stop in the opening only behind an opening that was gone through', () => {
    const tree = treeOf([look('d1'), dead('d1', 'earth'), earth('done')], { reentries: [{ step: 'earth', needs: ['dead', 'looked'] }] });
    const b = handed(new Bench(program(tree)).pass().answer('good').dead());
    b.do({ type: 'STOP' }).dead().pass();
    expect(b.view).toMatchObject({ key: '~choose', reentries: [{ key: 'earth' }] });
    expect(b.do({ type: 'REENTER', step: 'earth' }).view.phase).toBe('opening');
    expect(b.pass().dead().view.key).toBe('earth');
  });
  it('takes a load that was being connected for the worst, and leaves it to its step', () => {
    const tree = treeOf([look('d1'), dead('d1', 'load'), connect('load', 'full', 'touch'), hands('touch', 'done')]);
    const b = handed(new Bench(program(tree)).pass().answer('good').dead()).pass().dead();
    expect(b.view.facts.load).toBe('boards');
    b.do({ type: 'WARNING_READ', step: '~read-back' });
    expect(b.view.rows.map((r) => r.row.id)).toEqual(['nothing-else']);
    expect(b.pass().answer('done').view.facts.load).toBe('full');
  });
  it('leaves a thing that was being fitted to the step that fits it', () => {
    const b = handed(touching().pass().answer('good').dead().do({ type: 'WARNING_READ', step: 'clip' })).pass().dead();
    b.do({ type: 'WARNING_READ', step: '~read-back' });
    expect(b.view.rows.map((r) => r.row.id)).toEqual(['load', 'nothing-else']);
    expect(b.pass().view.key).toBe('clip');
  });
  it('asks nothing back where nothing had begun', () => {
    const b = handed(new Bench(program(lampTree)).row());
    expect(b.view).toMatchObject({ phase: 'opening', rows: expect.arrayContaining([expect.objectContaining({ answer: null })]) });
    expect(b.pass().view.key).toBe('look');
  });
  it('lets none of the restorers countersign, and asks again for the first power of the new one', () => {
    // a senior needs no countersign; the one who takes over does
    const tree = treeOf([look('d1'), dead('d1', 'returns'), returns('earth'), earth('insulation'), insulation('d2'), dead('d2', 'lamp'), lamp('lamp', 'see'), observe('see', 'd3', { power: 'live' }, 'abort'), dead('d3', 'lamp2'), lamp('lamp2', 'see2'), observe('see2', 'abort', { power: 'live' }, 'abort')]);
    const b = new Bench(program(tree), true).pass().answer('good').dead().pass().pass().pass().dead().answer('on').answer('good').dead();
    expect(b.view.key).toBe('lamp2');
    expect(b.view.facts.powered).toEqual(['limited']);
    handed(b).pass().dead().pass();
    b.do({ type: 'WARNING_READ', step: 'lamp2' });
    expect(b.view).toMatchObject({ key: 'lamp2', phase: 'hold' });
    b.do({ type: 'HOLD_ASKED', step: 'lamp2' });
    for (const by of ['ann', 'bo']) expect(b.try({ type: 'HOLD_GIVEN', step: 'lamp2', by })).toMatchObject({ ok: false, refusal: { rule: 'H20' } });
    expect(b.do({ type: 'HOLD_GIVEN', step: 'lamp2', by: 'sam' }).view.phase).toBe('guard');
  });
  it('can go back again, with each of them named', () => {
    const b = handed(atTouch()).pass();
    b.do({ ...gives, by: 'bo', to: 'ann' }).do({ ...takes, by: 'ann', senior: true });
    expect(b.state.context).toMatchObject({ restorer: 'ann', restorerIsSenior: true, restorers: ['bo', 'ann'], readBack: true });
    b.boot = 'boot-9';
    expect(b.pass().dead().view.key).toBe('~read-back');
  });
  it('is refused to a device that was left behind', () => {
    const b = handed(atTouch()).row();
    expect(advance(b.program, b.state, { type: 'PAUSE', at: b.at, monotonic: b.at, boot: 'boot-1' })).toMatchObject({ ok: false, refusal: { code: 'restarted' } });
  });
});

describe('more than eight hours without a word', () => {
  it.each([
    ['paused', (b: Bench) => b.do({ type: 'PAUSE' }), { type: 'RESUME' } as const, 'boot-1'],
    ['left open', (b: Bench) => b, { type: 'TICK' } as const, 'boot-1'],
    ['loaded anew', (b: Bench) => b, { type: 'RESTART' } as const, 'boot-2'],
  ])('opens the bench anew and reads back (%s)', (_, leave, back, boot) => {
    const b = leave(atTouch());
    b.at += 8.1 * 3_600_000;
    b.boot = boot;
    expect(b.do(back).view.phase).toBe('opening');
    expect(b.pass().dead().view.key).toBe('~read-back');
    expect(b.pass().view.key).toBe('touch');
  });
  it('asks for less after a shorter time', () => {
    const b = atTouch().do({ type: 'PAUSE' });
    b.at += 7.9 * 3_600_000;
    expect(b.do({ type: 'RESUME' }).view.key).toBe('~isolate');
    expect(b.dead().view.key).toBe('touch');
  });
});
