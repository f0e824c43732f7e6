/** Facts of the trade about a lost return, and the textbook circuits beneath it. */
import { solve } from '@/shared/workings/network/network';
import type { OutsideValue } from '@/tests/outside/outsideValue';

const trade = 'common practice, no source: seen on supplies whose negative rail limits at several times its rating';

const supply = (limitAmps: number, seriesOhms: number) => ({
  rails: [
    { name: '+5 V', volts: 5, limitAmps: 25 },
    { name: '−12 V', volts: -12, limitAmps },
  ],
  returns: [{ name: 'R1', from: '0 V', to: 'backplane', ohms: 0.004 }],
  loads: [
    { name: 'Backplane', from: '+5 V', to: 'backplane', amps: 17 },
    { name: 'Backplane', from: '−12 V', to: 'backplane', amps: 5 },
  ],
  diodes: [{ name: 'D1', part: 'freewheel', anode: '0 V', cathode: '+5 V', ratedAmps: 15, seriesOhms }],
});

/** 10 Ω from +5 V and 40 Ω from −12 V, meeting where the return was: the two outputs drive 17 V through 50 Ω. */
const meeting = () => {
  const output = { zero: 3, limitAmps: 2, takes: false, outputOhms: 1e-4 };
  const { volts } = solve({
    nodes: 4,
    resistors: [
      { from: 0, to: 2, ohms: 10 },
      { from: 1, to: 2, ohms: 40 },
    ],
    diodes: [],
    outputs: [
      { ...output, terminal: 0, volts: 5 },
      { ...output, terminal: 1, volts: -12 },
    ],
  });
  return volts[2] ?? Number.NaN;
};

export const values: readonly OutsideValue[] = [
  {
    sheet: 'lost-return',
    what: 'a −12 V rail rated 5 A that limits at 20 A: amps through the +5 V freewheel diode',
    source: trade,
    given: supply(20, 0.005),
    read: 'openings.0.diodes.0.mostAmps',
    expected: 20,
    within: 0.05,
  },
  {
    sheet: 'lost-return',
    what: 'a choke of 4 mΩ in that path: amps through the diode all the same',
    source: 'common practice, no source: the output choke’s few milliohms do not save the diode',
    given: supply(20, 0.009),
    read: 'openings.0.diodes.0.mostAmps',
    expected: 20,
    within: 0.05,
  },
  {
    sheet: 'lost-return',
    what: 'the verdict on it',
    source: trade,
    given: supply(20, 0.005),
    read: 'openings.0.verdict',
    expected: 'destructive',
  },
  {
    sheet: 'lost-return',
    what: 'two loads in series on +5 V and −12 V: volts of the floating bus',
    source: 'voltage divider, any textbook: −12 + 17 × 40 ÷ (10 + 40)',
    gives: meeting,
    expected: 1.6,
    within: 0.01,
  },
];
