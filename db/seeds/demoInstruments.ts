/** The instruments of the demo: six in the first workshop, of which one is out of date, and one in the second. */
import type { Instrument, InstrumentRange } from '@/shared/contract/instruments';

import type { DemoWorkshopKey } from './DemoContent';

export interface DemoInstrument extends Omit<Instrument, 'calibratedUntil' | 'outOfDate'> {
  workshop: DemoWorkshopKey;
  /** days after loading; negative is out of date */
  calibratedForDays: number;
}

type Quantity = InstrumentRange['quantity'];
/** Ranges of one function: full scales that all have the same number of counts. */
const steps = (quantity: Quantity, fullScales: readonly number[], display: number, percent: number, counts: number): InstrumentRange[] =>
  fullScales.map((fullScale) => ({ quantity, fullScale, resolution: fullScale / display, percent, counts }));

const id = (n: number) => `5f0c6a12-0000-4000-8000-${String(n).padStart(12, '0')}`;

const multimeter = [
  ...steps('volts-dc', [0.6, 6, 60, 600], 6000, 0.3, 3),
  ...steps('volts-ac', [0.6, 6, 60, 600], 6000, 1, 4),
  ...steps('amps-dc', [0.6, 10], 6000, 1, 3),
  ...steps('amps-ac', [0.6, 10], 6000, 1.5, 4),
  ...steps('ohms', [600, 6e3, 60e3, 600e3, 6e6, 60e6], 6000, 0.8, 3),
  ...steps('diode-volts', [3], 3000, 1, 3),
  ...steps('esr-ohms', [2, 20], 2000, 2, 4),
  ...steps('farads', [1e-6, 1e-5, 1e-4, 1e-3, 1e-2], 6000, 2, 5),
];

export const demoInstruments: readonly DemoInstrument[] = [
  { id: id(1), workshop: 'first', tag: 'Q-01', name: 'Two-pole voltage tester', kind: 'two-pole-tester', serial: '20-1143', category: 'CAT IV 600 V', twoPole: true, calibratedForDays: 210, ranges: [...steps('volts-dc', [690], 6900, 2, 4), ...steps('volts-ac', [690], 6900, 2, 4)] },
  { id: id(2), workshop: 'first', tag: 'Q-02', name: 'Bench multimeter', kind: 'multimeter', serial: 'BM 5518', category: 'CAT III 600 V', twoPole: false, calibratedForDays: 160, ranges: multimeter },
  { id: id(3), workshop: 'first', tag: 'Q-03', name: 'Low-ohm meter, four wires', kind: 'low-ohm-meter', serial: '0071', category: null, twoPole: false, calibratedForDays: 300, ranges: steps('ohms', [0.02, 0.2, 2, 20], 20_000, 0.1, 4) },
  { id: id(4), workshop: 'first', tag: 'Q-04', name: 'Insulation tester', kind: 'insulation-tester', serial: 'IT-330', category: 'CAT III 600 V', twoPole: false, calibratedForDays: 95, ranges: [...steps('ohms', [20e6, 200e6, 2e9], 2000, 3, 5), ...steps('volts-dc', [1000], 1000, 2, 3)] },
  { id: id(5), workshop: 'first', tag: 'Q-05', name: 'Infra-red thermometer', kind: 'thermometer', serial: 'T 0919', category: null, twoPole: false, calibratedForDays: 240, ranges: steps('celsius', [300], 3000, 1, 15) },
  { id: id(6), workshop: 'first', tag: 'Q-06', name: 'Field multimeter', kind: 'multimeter', serial: 'FM 0212', category: 'CAT III 300 V', twoPole: false, calibratedForDays: -34, ranges: multimeter },
  { id: id(7), workshop: 'second', tag: 'H-01', name: 'Two-pole tester with multimeter', kind: 'two-pole-tester', serial: '3301', category: 'CAT III 600 V', twoPole: true, calibratedForDays: 120, ranges: [...multimeter, ...steps('ohms', [0.02, 0.2, 2, 20, 200e6, 2e9], 20_000, 0.5, 4), ...steps('celsius', [300], 3000, 1, 15)] },
];
