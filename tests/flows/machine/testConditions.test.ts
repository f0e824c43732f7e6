/** Test conditions and opened parts at run time: refused where they do not stand, and their twins that are let through. */
import { describe, expect, it } from 'vitest';

import { stepNotes } from '@/flows/machine/stepNotes';

import { Bench, benchProfile, makeDeadTree, program } from '../support/bench';
import { play, ready } from '../support/play';
import { dead, hands, lamp, look, observe, step, treeOf } from '../support/steps';

const photo = (to: string, other = 'refer') => step('photo', 'photo', to, { of: 'The failed part' }, other);
const opened = (to: string, instead?: string) => observe('open', to, { contact: 'hands', opens: { suspect: 'pass', photo: 'photo', ...(instead === undefined ? {} : { instead }) } });

describe('H17: what is destroyed by looking at it', () => {
  const beryllium = { ...benchProfile, hazards: ['beryllium-oxide' as const] };
  it('refuses to open a part without its photo', () => {
    expect(play(treeOf([look('d1'), dead('d1', 'photo'), photo('open', 'open'), opened('done')]), { photo: 'cannot' })).toMatchObject({ rule: 'H17', at: 'photo' });
    expect(play(treeOf([look('d1'), dead('d1', 'photo'), photo('open'), opened('done')])).rule).toBeNull();
  });
  it('refuses to open one that may hold beryllium oxide, or goes round it', () => {
    expect(play(treeOf([look('d1'), dead('d1', 'photo'), photo('open'), opened('done')]), {}, beryllium)).toMatchObject({ rule: 'H17', at: 'photo' });
    const round = play(treeOf([look('d1'), dead('d1', 'photo'), photo('open'), opened('keep', 'keep'), hands('keep', 'done')]), {}, beryllium);
    expect(round).toMatchObject({ rule: null, at: 'done' });
    expect(round.bench.state.context.visited).not.toContain('open');
    expect(round.bench.state.context.visited).toContain('keep');
  });
  it('says before it that it must be dead and after its photo', () => {
    const b = play(treeOf([look('d1'), dead('d1', 'photo'), photo('open'), { ...opened('done'), exits: [{ id: 'burnt', label: 'Burnt through', on: ['answer'], to: 'done', shows: 'large-over-current', evidence: [{ suspect: 'diode', says: 'points-to' }] }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' }] }]), { look: 'stop' });
    expect(b.bench.program.layout.steps.get('open')?.step).toMatchObject({ opens: { photo: 'photo' } });
    expect(stepNotes(b.bench.program.layout.steps.get('open')!.step).map((n) => n.name)).toEqual(['Opening destroys it', 'Large over-current']);
  });
});

describe('H5: test conditions are what the step states', () => {
  const confirm = (to: string) => step('do', 'cover', to, { contact: 'cover', confirms: ['cover-on', 'forced-air'] });
  const covered: Record<string, unknown>[] = [...ready('cover'), confirm('lamp'), lamp('lamp', 'soak', { asInService: ['cover-on', 'forced-air'] }), step('soak', 'soak', 'abort', { probe: 'none', quantity: 'celsius', power: 'live', limit: { is: 'below', high: 70 }, holdMinutes: 4, everyMinutes: 2, asInService: ['cover-on', 'forced-air'] }, 'abort')];
  it('refuses power under a cover that nobody has put on', () => {
    expect(play(treeOf(covered.filter((s) => s['id'] !== 'cover').map((s) => (s['id'] === 'd2' ? { ...s, exits: [{ id: 'dead', on: ['dead'], to: 'lamp' }] } : s)))).rule).toBe('H5');
  });
  it('lets it through where both were confirmed, and takes them back with the first hand inside', () => {
    const { rule, bench: b } = play(treeOf(covered));
    expect(rule).toBeNull();
    expect(b.view.facts.conditions).toEqual([]);
  });
  it('takes them back with a break: the run goes on as after Stop', () => {
    const b = new Bench(program(treeOf(covered), benchProfile, [makeDeadTree]));
    b.answer('good').dead().pass().pass().pass().dead();
    while (b.view.key === 'cover' && b.view.phase === 'warning') b.do({ type: 'WARNING_READ', step: 'cover' });
    expect(b.view.notes.map((n) => n.say)).toEqual(['Cover on, as in service.', 'Forced air, as in service.']);
    b.do({ type: 'ANSWER', step: 'cover', answer: 'done' });
    expect(b.view.facts.conditions).toEqual(['cover-on', 'forced-air']);
    b.do({ type: 'PAUSE' }).do({ type: 'RESUME' });
    expect(b.view).toMatchObject({ key: '~isolate', purpose: { is: 'stop' }, facts: { conditions: [] } });
  });
});
