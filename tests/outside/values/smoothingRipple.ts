/** Published values of reservoir ripple. */
import type { OutsideValue } from '@/tests/outside/outsideValue';

const sheet = 'smoothing-ripple';
const calculator = 'Ripple calculator with worked example (calculator.7search.cc): 2 A, 60 Hz, 1000 μF';
const homework = 'Worked homework (homeworksource.com): 12 V, two 0.8 V diodes, 100 Ω, 60 Hz, 1 V: 1283 μF';
const sedra = 'Sedra & Smith, Microelectronic Circuits, peak rectifier: 100 V peak, 60 Hz, 10 kΩ, 83.3 μF (from memory)';
const trade = 'common practice, no source';
const bridge = {
  secondaryVolts: 40,
  mainsHertz: 60,
  rectifier: 'bridge',
  diodeVolts: 0.8,
  sourceOhms: 0.01,
  farads: 1000e-6,
  load: 'steady',
  amps: 2,
};
const printed = { ...bridge, secondaryVolts: 12, farads: 1283e-6, load: 'resistor', amps: null, loadOhms: 100 };
const peak = {
  secondaryVolts: 100 / Math.SQRT2,
  mainsHertz: 60,
  rectifier: 'half-wave',
  diodeVolts: 0,
  sourceOhms: 0.01,
  farads: 83.3e-6,
  load: 'resistor',
  loadOhms: 10e3,
};

export const values: readonly OutsideValue[] = [
  {
    sheet,
    what: '2 A into 1000 μF at 60 Hz full wave, by the formula',
    source: calculator,
    expected: 16.67,
    within: 0.005,
    given: bridge,
    read: 'simple.rippleVolts',
  },
  { sheet, what: '12 V with two diodes, peak', source: homework, expected: 15.37, within: 0.005, given: printed, read: 'simple.highVolts' },
  {
    sheet,
    what: '1283 μF at 0.154 A, by the formula',
    source: homework,
    expected: 1,
    within: 0.005,
    given: printed,
    read: 'simple.rippleVolts',
  },
  {
    sheet,
    what: '1 A into 8.33 mF at 60 Hz full wave, by the formula',
    source: 'I ÷ (2 f C), any textbook; a public page prints 16.7 mF, which is half wave',
    expected: 1,
    within: 0.001,
    given: { ...bridge, amps: 1, farads: 8.3333e-3 },
    read: 'simple.rippleVolts',
  },
  { sheet, what: 'peak rectifier, ripple', source: sedra, expected: 2, within: 0.1, given: peak, read: 'exact.rippleVolts' },
  {
    sheet,
    what: 'peak rectifier, conduction in percent',
    source: sedra,
    expected: 3.18,
    within: 0.06,
    given: peak,
    read: 'exact.conductionShare',
    times: 100,
  },
  {
    sheet,
    what: 'peak rectifier, peak diode mA',
    source: sedra,
    expected: 638,
    within: 30,
    given: peak,
    read: 'exact.peakDiodeAmps',
    times: 1e3,
  },
  {
    sheet,
    what: 'ripple at the mains of a bridge',
    source: trade,
    expected: 'one-half',
    given: { ...bridge, readHertz: 60 },
    read: 'from',
  },
  { sheet, what: 'ripple at twice the mains', source: trade, expected: 'both-halves', given: { ...bridge, readHertz: 120 }, read: 'from' },
  { sheet, what: 'ripple of 20 kHz', source: trade, expected: 'faster', given: { ...bridge, readHertz: 20e3 }, read: 'from' },
];
