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

const CURRENT: Readonly<Partial<Record<InstrumentRange['quantity'], string>>> = {
  'volts-dc': ' DC',
  'volts-ac': ' AC',
  'amps-dc': ' DC',
  'amps-ac': ' AC',
  'diode-volts': ' diode',
  'esr-ohms': ' ESR',
};

/** `60 V DC ± (0.5 % + 2 of 10 mV)`. */
export function rangeWords({ quantity, fullScale, resolution, percent, counts }: InstrumentRange): string {
  const unit: Unit = QUANTITIES[quantity];
  return `${formatQuantity(fullScale, unit)}${CURRENT[quantity] ?? ''} ± (${formatNumber(percent)} % + ${counts} of ${formatQuantity(resolution, unit)})`;
}
