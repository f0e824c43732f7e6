/** Published values of rails and their loads. */
import type { OutsideValue } from '@/tests/outside/outsideValue';

const sheet = 'rail-load-plan';
const atx = 'ATX12V power supply design guide, table of d.c. output regulation (from memory)';
const trade = 'common practice, no source';
const one = (more: object) => ({ rails: [{ name: 'rail', nominalVolts: 5, maxAmps: 17, ...more }], load: 'electronic', leadOhms: 0.01 });

export const values: readonly OutsideValue[] = [
  { sheet, what: '+5 V ± 5 %, least', source: atx, expected: 4.75, within: 0.005, given: one({}), read: 'rails.0.lowVolts' },
  { sheet, what: '+5 V ± 5 %, most', source: atx, expected: 5.25, within: 0.005, given: one({}), read: 'rails.0.highVolts' },
  {
    sheet,
    what: '−12 V ± 10 %, the one nearer to zero',
    source: atx,
    expected: -10.8,
    within: 0.005,
    given: one({ nominalVolts: -12, tolerancePercent: 10 }),
    read: 'rails.0.lowVolts',
  },
  {
    sheet,
    what: '−12 V ± 10 %, the other',
    source: atx,
    expected: -13.2,
    within: 0.005,
    given: one({ nominalVolts: -12, tolerancePercent: 10 }),
    read: 'rails.0.highVolts',
  },
  {
    sheet,
    what: '+3.3 V ± 5 %, least (printed 3.14)',
    source: atx,
    expected: 3.14,
    within: 0.006,
    given: one({ nominalVolts: 3.3 }),
    read: 'rails.0.lowVolts',
  },
  {
    sheet,
    what: '5 V at 17 A, watts',
    source: `Ohm’s law; ${trade}`,
    expected: 85,
    within: 0.5,
    given: one({ sense: 'remote' }),
    read: 'rails.0.steps.4.loadWatts',
  },
  {
    sheet,
    what: '5 V at 17 A as one resistor, ohms',
    source: `Ohm’s law, E24 above (IEC 60063); ${trade}`,
    expected: 0.3,
    within: 0.001,
    given: one({}),
    read: 'rails.0.fullOhms',
  },
  {
    sheet,
    what: '10 Ω on 5 V draws half an amp',
    source: `Dummy load of a bench supply made of a computer’s: 10 Ω, 10 W on 5 V; ${trade}`,
    expected: 0.5,
    within: 0.005,
    given: { rails: [{ name: 'rail', nominalVolts: 5, maxAmps: 0.5 }], load: 'resistors', owned: [{ ohms: 10, watts: 10 }], leadOhms: 0 },
    read: 'rails.0.steps.4.amps',
  },
  {
    sheet,
    what: 'and 2.5 W, a quarter of its rating',
    source: `Dummy load of a bench supply made of a computer’s: 10 Ω, 10 W on 5 V; ${trade}`,
    expected: 2.5,
    within: 0.05,
    given: { rails: [{ name: 'rail', nominalVolts: 5, maxAmps: 0.5 }], load: 'resistors', owned: [{ ohms: 10, watts: 10 }], leadOhms: 0 },
    read: 'rails.0.steps.4.loadWatts',
  },
];
