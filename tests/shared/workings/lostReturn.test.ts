import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { sheet } from '@/shared/workings/lostReturn';
import { openingsOf, statesOf } from '@/shared/workings/lostReturnCases';
import type { LostReturnResult } from '@/shared/workings/lostReturnResult';
import { lostReturnResult } from '@/shared/workings/lostReturnResult';
import { circuitFaults } from '@/shared/workings/plot';
import type { SheetAnswer } from '@/shared/workings/sheet';
import { runSheet } from '@/shared/workings/sheet';

/** Rows as a form gives them: anything. */
type Rows = Record<string, unknown>[];

const rails = [
  { name: '+5 V', volts: 5, limitAmps: 16, shortedAmps: 3 },
  { name: '−12 V', volts: -12, limitAmps: 9 },
];
const returns = [
  { name: 'R1', from: '0 V', to: 'left', ohms: 0.004 },
  { name: 'R2', from: '0 V', to: 'right', ohms: 0.004 },
];
const loads = [
  { name: 'Processor', from: '+5 V', to: 'left', amps: 8 },
  { name: 'Line board', from: '+5 V', to: 'right', amps: 6 },
  { name: 'Line board', from: '−12 V', to: 'right', amps: 0.5 },
];
const diodes = [
  { name: 'D7', part: 'freewheel', anode: '0 V', cathode: '+5 V', ratedAmps: 20 },
  { name: 'D9', part: 'clamp', anode: '−12 V', cathode: '0 V', ratedAmps: 20 },
];
const given = { rails, returns, loads, diodes };

function answerOf(input: unknown): SheetAnswer<LostReturnResult> {
  const answer = runSheet(sheet, input);
  if (!answer.ok) throw new Error(`${answer.field}: ${answer.say}`);
  return answer;
}

describe('lost return', () => {
  it('says in one sentence what has to be on, what is opened and what follows', () => {
    const { headline, result } = answerOf(given);
    expect(headline).toBe(
      'With −12 V on and +5 V off or in limit, opening R2 pulls +5 V to −0.75 V through its freewheel diode D7 at up to 7.8 A: destructive.',
    );
    expect(result.worst?.opens).toEqual(['R2']);
    expect(result.worst?.reversedRails[0]?.name).toBe('+5 V');
    expect(result.worst?.diodes).toMatchObject([{ name: 'D7', ratedAmps: 20, overRated: false }, { name: 'D9' }]);
    expect(result.worst?.limiting).toEqual(['−12 V']);
  });

  it('opens each return and each pair, with each rail on, off and in limit', () => {
    const { result } = answerOf(given);
    expect(result.openings.map(({ opens }) => opens)).toEqual([['R1'], ['R2'], ['R1', 'R2']]);
    expect(result.solvedCases).toBe(4 * 9);
    expect(openingsOf(10)).toHaveLength(1 + 10 + 45);
    const four = Array.from({ length: 4 }, () => ({ from: 0, to: 1, ohms: 1 }));
    expect(statesOf({ rails: Array.from({ length: 4 }) as never, overloads: four })).toHaveLength(1 + 8 + 24);
  });

  it('names the boards on the reversed rail first, then those on the negative one', () => {
    const { result } = answerOf({
      ...given,
      loads: [{ name: 'Panel', from: '−12 V', to: 'right', amps: 0.2 }, ...loads],
    });
    expect(
      result.worst?.exposedBoards
        .map(({ name }) => name)
        .slice(0, 2)
        .sort(),
    ).toEqual(['Line board', 'Processor']);
    expect(result.worst?.exposedBoards[0]).toMatchObject({ how: 'reversed' });
  });

  it('calls a return harmless that another carries as well', () => {
    const beside = { name: 'R3', from: '0 V', to: 'right', ohms: 0.004 };
    const { result } = answerOf({ ...given, returns: [...returns, beside] });
    const verdicts = Object.fromEntries(result.openings.map(({ opens, verdict }) => [opens.join('+'), verdict]));
    expect(verdicts).toMatchObject({ R2: 'harmless', R3: 'harmless', 'R2+R3': 'destructive' });
  });

  it('says when a diode is above its rating, and when none holds the rail', () => {
    const weak = answerOf({ ...given, diodes: [{ ...diodes[0], ratedAmps: 3 }, diodes[1]] });
    expect(weak.headline).toContain('at up to 7.8 A, above its rated 3 A');
    expect(weak.result.worst?.diodes[0]?.overRated).toBe(true);
    expect(answerOf({ ...given, diodes: [] }).headline).toContain('with no diode to hold it');
  });

  it('is out of tolerance and no more where one rail alone loses its return', () => {
    const { result, headline } = answerOf({ rails: [rails[0]], returns: [returns[0]], loads: [loads[0]] });
    expect(result.verdict).toBe('out of tolerance');
    expect(headline).toBe('With +5 V on, opening R1 leaves Processor 0 V of 5 V: out of tolerance.');
  });

  it('draws the case that it tells, with what is open marked and the way of the current lit', () => {
    const { drawing, result } = answerOf(given);
    if (drawing === undefined) throw new Error('nothing drawn');
    expect(circuitFaults(drawing)).toEqual([]);
    expect(drawing.branches.filter(({ mark }) => mark === 'opened').map(({ label }) => label)).toEqual(['R2']);
    expect(drawing.branches.filter(({ lit }) => lit === true).map(({ label }) => label)).toContain('D7');
    expect(drawing.nodes.find(({ label }) => label === '+5 V')?.trouble).toBe('reversed');
    expect(drawing.words).toContain('opening R2 pulls +5 V');
    expect(result.powerImbalance).toBeLessThan(1e-9);
  });

  it('answers in its own form', () => {
    expect(lostReturnResult.safeParse(answerOf(sheet.example).result).error).toBeUndefined();
  });
});

describe('lost return the other way round', () => {
  const feeds = [
    { name: 'F1', from: '+5 V', to: '+5 V right', ohms: 0.005 },
    { name: 'F2', from: '−12 V', to: '−12 V right', ohms: 0.005 },
  ];
  const far = [
    { name: 'Line board', from: '+5 V right', to: 'right', amps: 4 },
    { name: 'Line board', from: '−12 V right', to: 'right', amps: 1 },
    { name: 'Processor', from: '+5 V', to: 'left', amps: 2 },
  ];
  const machine = { rails, returns, feeds, loads: far, diodes };
  const supply = { '+5 V': 5.01, '−12 V': -11.98 } as const;

  /** What a meter would show with one wire at some ohms: 5 V / 1.25 Ω and 12 V / 12 Ω behind it. */
  function readings(bad: { feed?: number; back?: number }): Rows {
    const [g5, g12] = [4 / 5, 1 / 12];
    const [f1, f2, r] = [bad.feed ?? 0.005, 0.005, bad.back ?? 0.004];
    const [a, b] = [1 / (1 / g5 + f1), 1 / (1 / g12 + f2)];
    const zero = (supply['+5 V'] * a + supply['−12 V'] * b) / (a + b + 1 / r);
    const at5 = (supply['+5 V'] - zero) * a * (1 / g5);
    const at12 = (supply['−12 V'] - zero) * b * (1 / g12);
    const rounded = (value: number) => Number(value.toFixed(3));
    return [
      { rail: '+5 V', load: 'Line board', supplyVolts: supply['+5 V'], loadVolts: rounded(at5) },
      { rail: '−12 V', load: 'Line board', supplyVolts: supply['−12 V'], loadVolts: rounded(at12) },
    ];
  }

  it('finds nothing amiss with good wires', () => {
    const { result, headline } = answerOf({ ...machine, readings: readings({}) });
    expect(result.fault?.says).toBe('nothing amiss');
    expect(headline).toBe('The readings fit good wires throughout.');
  });

  it.each([0.05, 0.2, 1.5])('names the return at %d Ω', (back) => {
    const { result } = answerOf({ ...machine, readings: readings({ back }) });
    expect(result.fault).toMatchObject({ says: 'one wire', suspects: [{ name: 'R2', kind: 'return' }] });
    expect((result.fault?.suspects[0]?.ohms ?? 0) / back).toBeCloseTo(1, 1);
  });

  it.each([0.05, 0.4])('names the feed at %d Ω', (feed) => {
    const { result, headline } = answerOf({ ...machine, readings: readings({ feed }) });
    expect(result.fault).toMatchObject({ says: 'one wire', suspects: [{ name: 'F1', kind: 'feed' }] });
    expect((result.fault?.suspects[0]?.ohms ?? 0) / feed).toBeCloseTo(1, 1);
    expect(headline).toContain('F1 is at fault');
  });

  it('does not choose between two that the readings cannot tell apart', () => {
    const beside = { name: 'F3', from: '+5 V right', to: '+5 V board', ohms: 0.005 };
    const loadsBehind = far.map((row) => (row.from === '+5 V right' ? { ...row, from: '+5 V board' } : row));
    const { result } = answerOf({ ...machine, feeds: [...feeds, beside], loads: loadsBehind, readings: readings({ feed: 0.3 }) });
    expect(result.fault?.says).toBe('one of several');
    expect(result.fault?.suspects.map(({ name }) => name).sort()).toEqual(['F1', 'F3']);
  });

  it.each([
    ['rail', { rail: '+9 V' }, 'There is no rail “+9 V” among the rails above.'],
    ['load', { load: 'Tape' }, 'There is no board “Tape” among the loads above.'],
    ['load', { rail: '−12 V', load: 'Processor' }, '“Processor” has no load between −12 V and a return.'],
  ])('refuses a reading of an unknown %s', (column, change, say) => {
    const [first] = readings({});
    expect(runSheet(sheet, { ...machine, readings: [{ ...first, ...change }] })).toEqual({ ok: false, field: `readings.0.${column}`, say });
  });
});

describe('lost return refuses at the field', () => {
  const change = (list: keyof typeof given, row: number, values: Record<string, unknown>) => ({
    ...given,
    [list]: given[list].map((one, k) => (k === row ? { ...one, ...values } : one)),
  });

  it.each([
    ['a floating node', change('loads', 0, { from: '+5V', ohms: 1 }), 'loads.0.from', '“+5V” floats'],
    ['a diode on nothing', change('diodes', 0, { cathode: 'choke' }), 'diodes.0.cathode', '“choke” floats'],
    ['two rails on one terminal', change('rails', 1, { terminal: '+5 V' }), 'rails.1.terminal', 'fight each other'],
    ['a loop of sources', { ...given, feeds: [{ name: 'F1', from: '+5 V', to: '−12 V', ohms: 0.01 }] }, 'feeds.0.to', 'a loop of sources'],
    ['a shorted rail', { ...given, feeds: [{ name: 'F1', from: '+5 V', to: 'left', ohms: 0.01 }] }, 'feeds.0.to', 'shorts +5 V'],
    ['a rail at 0 V', change('rails', 0, { volts: 0 }), 'rails.0.volts', 'a rail at 0 V is a return'],
    ['a name twice', change('returns', 1, { name: 'R1' }), 'returns.1.name', 'there twice'],
    ['a wire onto itself', change('returns', 0, { to: '0 V' }), 'returns.0.to', 'starts and ends'],
    ['a wire without size', change('returns', 0, { ohms: null }), 'returns.0.ohms', 'give its ohms'],
    ['a load without amps', change('loads', 0, { amps: null }), 'loads.0.amps', 'give its amps or its ohms'],
    ['amps between two returns', change('loads', 0, { from: 'right' }), 'loads.0.ohms', 'no nominal volts'],
    ['more amps when shorted than the limit', change('rails', 1, { shortedAmps: 10 }), 'rails.1.shortedAmps', 'the limit or less'],
    ['a limit of nothing', change('rails', 0, { limitAmps: 0 }), 'rails.0.limitAmps', 'Rail 1: Limit must be'],
    ['a limit of a million amps', change('rails', 0, { limitAmps: 1e6 }), 'rails.0.limitAmps', 'or less'],
  ])('%s', (_, input, field, words) => {
    const answer = runSheet(sheet, input);
    expect(answer).toMatchObject({ ok: false, field });
    expect(answer.ok ? '' : answer.say).toContain(words);
  });
});

describe('lost return as physics has it', () => {
  const amps = fc.double({ min: 0.01, max: 30, noNaN: true });
  const most = (limitAmps: number, light: number, heavy: number): number =>
    answerOf({
      rails: [rails[0], { ...rails[1], limitAmps }],
      returns: [returns[0]],
      loads: [
        { name: 'A', from: '+5 V', to: 'left', amps: heavy },
        { name: 'A', from: '−12 V', to: 'left', amps: light },
      ],
      diodes,
    }).result.openings[0]?.diodes[0]?.mostAmps ?? Number.NaN;

  it('never sends more through the diode than the other rail’s limit, nor less when that is higher', () => {
    fc.assert(
      fc.property(amps, amps, amps, fc.double({ min: 1, max: 5, noNaN: true }), (limit, light, heavy, times) => {
        const [low, high] = [most(limit, light, heavy), most(limit * times, light, heavy)];
        expect(low).toBeLessThanOrEqual(limit * (1 + 1e-9));
        expect(high).toBeGreaterThanOrEqual(low - 1e-6);
      }),
      { numRuns: 60 },
    );
  });
});
