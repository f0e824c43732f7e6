/** Instruments in words. */
import { QUANTITIES } from '@/flows/document/ids';
import type { Instrument, InstrumentRange } from '@/shared/contract/instruments';
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Unit } from '@/shared/quantity/units';

export const INSTRUMENT_KINDS_IN_WORDS: Readonly<Record<Instrument['kind'], string>> = {
  multimeter: 'multimeter',
  'two-pole-tester': 'two-pole tester',
  'low-ohm-meter': 'low-ohm meter',
  'insulation-tester': 'insulation tester',
  'earth-tester': 'earth tester',
  oscilloscope: 'oscilloscope',
  thermometer: 'thermometer',
};

const FUNCTIONS: Readonly<Record<InstrumentRange['quantity'], string>> = {
  'volts-dc': 'Volts DC',
  'volts-ac': 'Volts AC',
  'amps-dc': 'Amps DC',
  'amps-ac': 'Amps AC',
  ohms: 'Ohms',
  'diode-volts': 'Diode volts',
  farads: 'Farads',
  'esr-ohms': 'ESR',
  celsius: 'Degrees Celsius',
  seconds: 'Seconds',
};

export interface InstrumentFunction {
  name: string;
  /** as makers print it */
  accuracy: string;
  /** full scales, smallest first, none broken from its unit */
  ranges: string;
}

/** Ranges of one function that share their accuracy stand in one line, as in a maker's table. */
export function functionsOf(ranges: readonly InstrumentRange[]): InstrumentFunction[] {
  const groups = new Map<string, InstrumentRange[]>();
  for (const range of ranges) {
    const key = `${range.quantity} ${range.percent} ${range.counts}`;
    groups.set(key, [...(groups.get(key) ?? []), range]);
  }
  return [...groups.values()].flatMap((group) => {
    const first = group[0];
    if (first === undefined) return [];
    const unit: Unit = QUANTITIES[first.quantity];
    const scales = group.map((r) => r.fullScale).sort((a, b) => a - b);
    return [
      {
        name: FUNCTIONS[first.quantity],
        accuracy: `± (${formatNumber(first.percent)} % + ${first.counts})`,
        ranges: scales.map((n) => formatQuantity(n, unit).replace(' ', '\u00a0')).join(', '),
      },
    ];
  });
}
