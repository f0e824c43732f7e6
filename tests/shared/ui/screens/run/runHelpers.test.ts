import { describe, expect, it } from 'vitest';

import type { Instrument } from '@/shared/contract/instruments';
import type { Saved } from '@/shared/ui/api/outbox';
import { play } from '@/shared/ui/hooks/play';
import { bandDetail, clockOf } from '@/shared/ui/screens/run/bandWords';
import { guardChecks, guardTold } from '@/shared/ui/screens/run/guardWords';
import { hazardsShown } from '@/shared/ui/screens/run/hazardsShown';
import { holdAsks } from '@/shared/ui/screens/run/holdWords';
import { firstMeter, metersFor } from '@/shared/ui/screens/run/meters';
import { savedWords } from '@/shared/ui/screens/run/savedWords';
import { scaleShown } from '@/shared/ui/screens/run/scaleShown';
import { stripsOf } from '@/shared/ui/screens/run/stripsOf';
import { wayOf } from '@/shared/ui/screens/run/wayOf';
import { Bench, benchProfile, lampTree, program } from '@/tests/flows/support/bench';

const lamp = program(lampTree);
const toGuard = () => {
  const bench = new Bench(lamp, true);
  bench.pass();
  bench.answer('sound').dead().pass().pass().dead();
  return bench.do({ type: 'WARNING_READ', step: 'lamp' });
};

describe('bandDetail', () => {
  it('counts the time that the bench is live, and what is in circuit', () => {
    const bench = toGuard().do({ type: 'GUARD_HELD', step: 'lamp', heldMs: 2100 });
    const since = bench.view.live?.since ?? 0;
    expect(bandDetail(lamp, bench.state, bench.view, since + 72_000)).toBe('60 W, 230 V · live 01:12');
    expect(bandDetail(lamp, bench.state, bench.view, since + 9 * 60_000)).toBe('60 W, 230 V · 01:00 left');
    expect(bandDetail(lamp, bench.state, bench.view, since + 11 * 60_000)).toMatch(/^Time is up: isolate now/);
  });

  it('lets the word stand alone before anything is known', () => {
    const bench = new Bench(lamp);
    expect(bandDetail(lamp, bench.state, bench.view, bench.at)).toBeUndefined();
  });
});

describe('clockOf', () => {
  it.each([
    [-5, '00:00'],
    [72_000, '01:12'],
    [3_849_000, '1:04:09'],
  ])('prints %i ms', (ms, words) => {
    expect(clockOf(ms)).toBe(words);
  });
});

describe('guardChecks', () => {
  it('names the load that is declared and the protection', () => {
    const step = toGuard().view.step;
    if (step?.kind !== 'energise') throw new Error('not at the guard');
    expect(guardChecks(step, benchProfile).map((c) => c.label)).toEqual([
      'Hands and tools are clear of the machine',
      'Nothing is connected to the rails',
      expect.stringContaining('RCD'),
    ]);
    expect(guardTold(step, lamp)).toMatch(/At most 500 mA, for 10 min/);
  });
});

describe('hazardsShown', () => {
  it('names the volts and the joules of this machine, worst first', () => {
    const shown = hazardsShown(['lead-solder', 'stored-charge', 'mains-shock'], benchProfile, lamp.layout.settings);
    expect(shown.map((h) => h.hazard)).toEqual(['Stored charge: C1 reservoir, 13.6\u00a0J', 'Mains voltage: 230\u00a0V', 'Lead solder']);
    expect(shown[0]?.signal).toBe('danger');
  });
});

describe('holdAsks', () => {
  it('says which power the countersign opens', () => {
    expect(holdAsks(toGuard().view, lamp)).toMatch(/first limited mains power/);
  });
});

describe('stripsOf', () => {
  const rail = lamp.layout.steps.get('lamp')?.step;
  const points = Object.fromEntries(benchProfile.points.map((p) => [p.id, p]));
  const row = {
    id: 'p5',
    label: '+5 V',
    wait: null,
    ask: 'reading',
    quantity: 'volts-dc',
    low: 4.75,
    high: 5.25,
    nominal: 5,
    bySize: false,
    plain: false,
    mayFall: false,
    red: points['t5'] ?? null,
    black: points['t0'] ?? null,
  } as const;

  it('draws the strip of both leads, and names no neighbour that carries the other lead', () => {
    if (!rail) throw new Error('no step');
    expect(stripsOf(benchProfile, rail, row)).toEqual({
      strips: [
        {
          title: 'TB1',
          points: [
            { id: 't5', name: '+5V', highlight: 'red' },
            { id: 't0', name: '0V', highlight: 'black' },
          ],
        },
      ],
      neighbours: [],
    });
  });

  it('draws nothing where no lead goes anywhere', () => {
    if (!rail) throw new Error('no step');
    expect(stripsOf(benchProfile, rail, { ...row, red: null })).toBeNull();
  });
});

describe('wayOf', () => {
  it('shows a call as one step, done or now, with the power in which it was left', () => {
    const events = [] as Parameters<typeof play>[2][number][];
    const bench = new Bench(lamp);
    const once = bench.try.bind(bench);
    bench.try = (event) => {
      const taken = once(event);
      if (taken.ok) events.push(bench.stamp(event));
      return taken;
    };
    bench.pass();
    bench.answer('sound').pass();
    const { account, state } = play(
      lamp,
      { run: 'r', restorer: 'ann', restorerIsSenior: false, at: Date.UTC(2026, 0, 5, 9), release: false, fitted: [], killers: [] },
      events,
    );
    const way = wayOf(lamp.layout, account, state.context.key);
    expect(way.map((s) => [s.stud, s.state])).toEqual([
      ['1', 'done'],
      ['2', 'now'],
      ['3', 'ahead'],
      ['4', 'ahead'],
      ['5', 'ahead'],
      ['6', 'ahead'],
      ['7', 'ahead'],
      ['8', 'ahead'],
    ]);
    expect(way[1]?.band).toBe('off');
  });
});

describe('savedWords', () => {
  const saved: Saved = { waiting: 0, notTaken: [], trouble: null, onDevice: true };
  const trouble = (code: 'no-network' | 'session-expired') =>
    ({ kind: 'problem', code, say: '', retryable: true, rule: null, faults: [], details: {} }) as const;
  it.each([
    [saved, 'all saved'],
    [{ ...saved, waiting: 1 }, '1 answer waits to be sent'],
    [{ ...saved, waiting: 3, trouble: trouble('no-network') }, '3 answers wait to be sent: no network'],
    [{ ...saved, waiting: 3, trouble: trouble('session-expired') }, '3 answers wait to be sent: sign in again'],
    [{ ...saved, onDevice: false }, 'all saved; this browser keeps nothing itself'],
  ])('says where the answers are', (of, words) => {
    expect(savedWords(of)).toBe(words);
  });
});

describe('scaleShown', () => {
  it('rules an earth path in milliohms and an insulation in megohms', () => {
    const row = {
      id: 'e',
      label: 'earth',
      wait: null,
      ask: 'reading',
      quantity: 'ohms',
      low: null,
      high: 0.15,
      nominal: null,
      bySize: false,
      plain: false,
      mayFall: false,
      red: null,
      black: null,
    } as const;
    expect(scaleShown(row, 0.08, 0.01)).toMatchObject({ unit: 'mΩ', high: 150, value: 80, guard: 10 });
    expect(scaleShown({ ...row, low: 1e6, high: null }, 'over', 0)).toMatchObject({ unit: 'MΩ', low: 1, value: Infinity });
  });
});

describe('metersFor', () => {
  const of = (id: string, more: Partial<Instrument>): Instrument => ({
    id,
    tag: id,
    name: id,
    kind: 'multimeter',
    serial: '1',
    category: null,
    twoPole: false,
    calibratedUntil: '2027-01-01',
    outOfDate: false,
    ranges: [{ quantity: 'volts-dc', fullScale: 60, resolution: 0.01, percent: 0.5, counts: 3 }],
    ...more,
  });
  const all = [
    of('old', { outOfDate: true }),
    of('meter', {}),
    of('tester', { twoPole: true, kind: 'two-pole-tester' }),
    of('ohms', { ranges: [] }),
  ];

  it('says why an instrument cannot be used', () => {
    const meters = metersFor(all, { quantity: 'volts-dc', kind: 'prove-dead', only: null });
    expect(meters.map((m) => [m.instrument.id, m.barred])).toEqual([
      ['tester', null],
      ['old', 'Out of date since 2027-01-01'],
      ['meter', 'Not a two-pole tester'],
    ]);
  });

  it('begins with the one used before, else with one of the kind that the tree lists', () => {
    const meters = metersFor(all, { quantity: 'volts-dc', kind: 'measure', only: null });
    const five = { quantity: 'volts-dc', about: 5 } as const;
    expect(firstMeter(meters, 'tester', lampTree, five)?.id).toBe('tester');
    expect(firstMeter(meters, 'old', lampTree, five)?.id).toBe('meter');
    expect(firstMeter([], null, lampTree, five)).toBeNull();
  });

  it('does not begin with one that cannot tell at this size, even when it was used before', () => {
    const fine = of('fine', {
      kind: 'low-ohm-meter',
      ranges: [{ quantity: 'ohms', fullScale: 2, resolution: 0.0001, percent: 0.2, counts: 3 }],
    });
    const coarse = of('coarse', { ranges: [{ quantity: 'ohms', fullScale: 600, resolution: 0.1, percent: 0.9, counts: 3 }] });
    const meters = metersFor([coarse, fine], { quantity: 'ohms', kind: 'prove-earth', only: null });
    expect(firstMeter(meters, 'coarse', lampTree, { quantity: 'ohms', about: 0.15 })?.id).toBe('fine');
  });

  it('takes an insulation tester for insulation, never a multimeter', () => {
    const meters = metersFor([of('meter', { ranges: [{ quantity: 'ohms', fullScale: 6e7, resolution: 1e4, percent: 1, counts: 5 }] })], {
      quantity: 'ohms',
      kind: 'prove-insulation',
      only: null,
    });
    expect(meters[0]?.barred).toMatch(/volts/);
  });
});
