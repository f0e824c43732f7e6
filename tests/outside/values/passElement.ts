/** Published values of the heat of a pass device, and of the two currents that tell how it works. */
import type { OutsideValue } from '@/tests/outside/outsideValue';

const trade = 'common practice, no source';
const newsletter = 'Newsletter on thermal design (onedfrk.com, April 2026): LM7805, 12 V to 5 V, 500 mA, 5 + 1 + 10 K/W';
const calculator = 'Heatsink calculator with worked example (aionlinecalculator.com, June 2026): 3.5 W, 2 + 0.5 + 20 K/W, 25 °C';
const lm7805 = { inputVolts: 12, outputVolts: 5, amps: 0.5, style: 'linear', junctionToCase: 5, caseToSink: 1, sinkToAir: 10, ambient: 25 };
const lm317 = { ...lm7805, junctionToCase: 2, caseToSink: 0.5, sinkToAir: 20, junctionLimit: 125 };
const computer = { inputVolts: 39, outputVolts: 5, amps: 17, style: 'switching' };
const maniktala = { inputVolts: 11.5, outputVolts: 5, amps: 1, style: 'switching', switchVolts: 1, diodeVolts: 0.5, edgeSeconds: 0 };
const appendix = 'Maniktala, Switching Power Supplies A to Z, appendix 2 (quoted): V in = 2 V out + V on + V diode for a duty of one half';
const sheet = 'pass-element';

export const values: readonly OutsideValue[] = [
  {
    sheet,
    what: '39 V to 5 V at 17 A as a linear regulator, watts',
    source: trade,
    expected: 578,
    within: 0.5,
    given: computer,
    read: 'linear.deviceWatts',
  },
  {
    sheet,
    what: 'its duty without drops',
    source: trade,
    expected: 0.13,
    within: 0.005,
    given: { ...computer, switchVolts: 0, diodeVolts: 0 },
    read: 'switching.duty',
  },
  { sheet, what: '3.1 A into it', source: trade, expected: 'switching', given: { ...computer, readInputAmps: 3.1 }, read: 'verdict.is' },
  {
    sheet,
    what: 'input current that follows output current',
    source: trade,
    expected: 'not-switching',
    given: { ...computer, outputVolts: 4.3, readInputAmps: 17.4, lightOutputAmps: 3, lightInputAmps: 3.4 },
    read: 'verdict.is',
  },
  { sheet, what: 'LM7805, watts', source: newsletter, expected: 3.5, within: 1e-9, given: lm7805, read: 'watts' },
  { sheet, what: 'LM7805, junction', source: newsletter, expected: 81, within: 0.5, given: lm7805, read: 'temperatures.junction' },
  {
    sheet,
    what: 'LM7805 bare, junction',
    source: newsletter,
    expected: 252,
    within: 0.6,
    given: { ...lm7805, junctionToCase: 0, caseToSink: 0, sinkToAir: 65 },
    read: 'temperatures.junction',
  },
  { sheet, what: 'LM317 at 3.5 W, junction', source: calculator, expected: 104, within: 0.5, given: lm317, read: 'temperatures.junction' },
  { sheet, what: 'LM317 at 3.5 W, heatsink', source: calculator, expected: 26, within: 0.5, given: lm317, read: 'mostSinkToAir' },
  {
    sheet,
    what: '12 V to 3.3 V at 1 A, watts',
    source: 'Design guide (rftools.io, February 2026)',
    expected: 8.7,
    within: 0.05,
    given: { inputVolts: 12, outputVolts: 3.3, amps: 1, style: 'linear' },
    read: 'watts',
  },
  { sheet, what: 'duty of one half', source: appendix, expected: 0.5, within: 1e-9, given: maniktala, read: 'switching.duty' },
  {
    sheet,
    what: 'average current of the switch at half duty',
    source: appendix,
    expected: 0.5,
    within: 1e-9,
    given: maniktala,
    read: 'switching.inputAmps',
  },
];
