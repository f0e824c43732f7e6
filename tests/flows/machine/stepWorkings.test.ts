import { describe, expect, it } from 'vitest';

import type { Profile } from '@/flows/document/profile';
import { defaultSettings } from '@/flows/document/settings';
import type { Step } from '@/flows/document/steps';
import { WORKINGS_SHEETS } from '@/flows/document/steps';
import { workingsOf } from '@/flows/machine/stepWorkings';
import type { ReadingNow } from '@/flows/machine/stepWorkings';
import { sheetById } from '@/shared/workings/list';
import { benchProfile } from '@/tests/flows/support/bench';

type Reference = NonNullable<Step['workings']>;

const step = (workings: Reference): Step => ({
  id: 'look',
  kind: 'observe',
  title: 'Look',
  lines: ['Look.'],
  contact: 'none',
  tools: [],
  minutes: 1,
  hazards: [],
  exits: [],
  asks: 'What?',
  workings,
});
const headline = (workings: Reference, profile: Profile = benchProfile, now: ReadingNow | null = null): string | null => {
  const worked = workingsOf(step(workings), profile, defaultSettings, now);
  if (worked === null) return null;
  return worked.answer.ok ? worked.answer.headline : worked.answer.say;
};

describe('workingsOf', () => {
  it('knows every sheet that a step may name', () => {
    for (const id of WORKINGS_SHEETS) expect(sheetById(id), id).toBeDefined();
  });

  it('sets the reading of the step against its limit with the accuracy of the instrument', () => {
    const now: ReadingNow = { row: 'reading', quantity: 'volts-dc', low: 4.75, high: 5.25, accuracy: { percent: 0.5, counts: 3, resolution: 0.001 }, value: null };
    expect(headline({ sheet: 'reading-limit' }, benchProfile, now)).toMatch(/^Clearly in from 4\.781\d* V to 5\.216\d* V with this instrument\.$/);
    expect(headline({ sheet: 'reading-limit' }, benchProfile, { ...now, value: 4.77 })).toMatch(/^In, but close: .* 4\.77 V ± 31 mV/);
    expect(headline({ sheet: 'reading-limit' }, benchProfile, { ...now, value: 5.4 })).toBe('Out, high: 5.4 V ± 35 mV.');
  });

  it('says nothing of a reading while nobody knows the instrument', () => {
    expect(headline({ sheet: 'reading-limit' })).toBeNull();
    expect(headline({ sheet: 'reading-limit' }, benchProfile, { row: 'reading', quantity: 'ohms', low: null, high: null, accuracy: { percent: 1, counts: 2, resolution: 0.1 }, value: 3 })).toBe('Give a low limit, a high limit, or both.');
  });

  it('works a return out at the most amps of its rail, its contacts with what the limit of the profile leaves them', () => {
    expect(headline({ sheet: 'wire-drop' })).toBe('8.835 mΩ: 106 mV lost at 12 A, at most 109 mV with a cable to IEC 60228.');
    expect(headline({ sheet: 'wire-drop', conductor: 'r1' })).toBe(headline({ sheet: 'wire-drop' }));
    expect(headline({ sheet: 'wire-drop' }, { ...benchProfile, conductors: [] })).toBeNull();
  });

  it('takes the reading of the row into the sheet, and agrees with the limit of the row', () => {
    const ohms = (value: number | null): ReadingNow => ({ row: 'r1', quantity: 'ohms', low: null, high: 0.01, accuracy: { percent: 0.5, counts: 2, resolution: 1e-5 }, value });
    expect(headline({ sheet: 'wire-drop' }, benchProfile, ohms(null))).toMatch(/^8\.835 mΩ:/);
    expect(headline({ sheet: 'wire-drop' }, benchProfile, ohms(0.0099))).toMatch(/^9\.9 mΩ read, as expected\./);
    expect(headline({ sheet: 'wire-drop' }, benchProfile, ohms(0.0101))).toMatch(/^10\.1 mΩ read where .*: look for a bad contact\./);
    const volts = (value: number): ReadingNow => ({ row: 'p5-2', quantity: 'volts-dc', low: 4.75, high: 5.25, accuracy: { percent: 0.5, counts: 3, resolution: 0.001 }, value });
    expect(headline({ sheet: 'rail-limits' }, benchProfile, volts(4.4))).toBe('4.75 V to 5.25 V; 4.4 V is low.');
    const trip: Step = { ...step({ sheet: 'over-voltage-trip' }), kind: 'prove-trip', rail: 'p5', series: 's', probe: 'clipped', ceilingVolts: 6.9 } as unknown as Step;
    const worked = workingsOf(trip, benchProfile, defaultSettings, { ...volts(6.2), row: 'p5' });
    expect(worked?.answer.ok === true ? worked.answer.headline : '').toMatch(/^Fired at 6\.2 V: it fires between rail and parts\. In order:/);
    const negative = { ...benchProfile, rails: benchProfile.rails.map((r) => ({ ...r, nominal: -5 })) };
    const mirrored = workingsOf(trip, negative, defaultSettings, { ...volts(6.2), row: 'p5' });
    expect(mirrored?.answer.ok === true ? mirrored.answer.headline : '').toMatch(/^Fired at −6\.2 V: it fires between rail and parts\./);
  });

  it('takes the fuse and the plate of the machine', () => {
    expect(headline({ sheet: 'fuse-inrush' })).toBe('Carries the 522 mA. Blows from 2.1 A on, within 2 min.');
    const american = { ...benchProfile, mains: { ...benchProfile.mains, volts: 120 } };
    expect(headline({ sheet: 'fuse-inrush' }, american)).toMatch(/^Too small: it may carry 750 mA for good, the load draws 1 A\. The least usual rating is 1\.5 A\.$/);
  });

  it('puts the trip of a rail between rail and logic, and is silent where no rail has one', () => {
    expect(headline({ sheet: 'over-voltage-trip' })).toBe('In order: rail at most 5.25 V, trip 5.8 V to 6.6 V, parts stand 7 V.');
    const [rail] = benchProfile.rails;
    if (rail === undefined) throw new Error('no rail');
    expect(headline({ sheet: 'over-voltage-trip' }, { ...benchProfile, rails: [{ ...rail, trip: null }] })).toBeNull();
  });

  it('sets the limit for the next board from the boards before it', () => {
    const board = (id: string, amps: number) => ({ id, name: id, slot: id, draws: [{ rail: 'p5', amps }], biasFirst: null });
    const profile = { ...benchProfile, boards: { removable: true, fitted: [board('cpu', 2), board('store', 1.5), board('panel', 0.4)] } };
    const next = (key: string, counters: { key: string; n: number }[]) => {
      const worked = workingsOf(step({ sheet: 'refit-trip', boardsIn: { step: 'more', exit: 'left' } }), profile, defaultSettings, null, { key, counters });
      return worked?.answer.ok === true ? worked.answer.headline : null;
    };
    expect(next('board', [])).toMatch(/^Set the limit to 2\.5 A: 0 A so far, 2 A for this board\./);
    expect(next('board', [{ key: 'more>left', n: 1 }])).toMatch(/^Set the limit to 3\.88 A: 2 A so far, 1\.5 A for this board\./);
    expect(next('refit-1/board', [{ key: 'more>left', n: 9 }, { key: 'refit-1/more>left', n: 2 }])).toMatch(/^Set the limit to 4 A: 3\.5 A so far/);
    // a board more than the profile has
    expect(next('board', [{ key: 'more>left', n: 3 }])).toBeNull();
    expect(headline({ sheet: 'refit-trip' }, profile)).toBeNull();
    expect(headline({ sheet: 'refit-trip', board: 'panel' }, profile)).toMatch(/^Set the limit to 4 A: 3\.5 A so far, 400 mA for this board\./);
    expect(headline({ sheet: 'refit-trip', board: 'none' }, profile)).toBeNull();
    expect(headline({ sheet: 'refit-trip' })).toBeNull();
  });

  it('forms a part to the volts that it works at, as long as it has slept', () => {
    expect(headline({ sheet: 'reforming' })).toMatch(/^5 stages to 20 V through /);
    expect(headline({ sheet: 'reforming', storageYears: 2.5 })).toMatch(/^4 stages to 20 V through .*: 2 h at least/);
    expect(headline({ sheet: 'reforming', storageYears: 0 })).toMatch(/^No reforming needed/);
    expect(headline({ sheet: 'reforming' }, { ...benchProfile, stores: [] })).toBeNull();
  });

  it('plans the load of every rail, or of the one that is named, with its minimum', () => {
    const [rail] = benchProfile.rails;
    if (rail === undefined) throw new Error('no rail');
    const two = { ...benchProfile, rails: [rail, { ...rail, id: 'm12', name: '−12 V', nominal: -12, maxAmps: 1 }], minimumLoad: [{ rail: 'p5', amps: 2 }] };
    expect(headline({ sheet: 'rail-load-plan' }, two)).toBe('+5 V, then −12 V; 72 W at full load, 1 h 40 min in all.');
    expect(headline({ sheet: 'rail-load-plan', rail: 'm12' }, two)).toBe('−12 V; 12 W at full load, 50 min in all.');
    const plan = workingsOf(step({ sheet: 'rail-load-plan' }), two, defaultSettings);
    expect(plan?.answer).toMatchObject({ ok: true, result: { rails: [{ minimumAmps: 2 }, { minimumAmps: 0 }] } });
  });

  it('burns in the pass device what stands between raw node and rail, and is silent without a raw node', () => {
    expect(headline({ sheet: 'pass-element' })).toMatch(/^66 W as linear/);
    expect(headline({ sheet: 'pass-element', loadShare: 0.1 })).toMatch(/^6\.6 W as linear/);
    expect(headline({ sheet: 'pass-element' }, { ...benchProfile, raw: null })).toBeNull();
  });

  it('gives a discharge its own tool, and the parts of the machine one after the other', () => {
    const [store] = benchProfile.stores;
    if (store === undefined) throw new Error('no store');
    const two = { ...benchProfile, stores: [store, { ...store, id: 'c2', name: 'C2', farads: 0.2 }] };
    const discharge = { ...step({ sheet: 'bleed-down' }), kind: 'discharge', toolOhms: 100, toolWatts: 50 } as unknown as Step;
    const worked = workingsOf(discharge, two, defaultSettings);
    expect(worked?.answer.ok === true ? worked.answer.headline : '').toBe('40 J: 44 s to 5 V, worst case. All 2: 53.6 J, 59 s one after the other.');
    expect(worked?.inputs).toMatchObject({ toolOhms: 100, toolWatts: 50, others: [{ name: 'C1 reservoir' }] });
  });
});
