/** The kinds of reading that a step can ask for. */
import type { Prefix, Unit } from '@/shared/quantity/units';

/** Every kind of reading, in the order in which a list shows them. */
export const QUANTITY_IDS = [
  'volts-dc',
  'volts-ac',
  'amps-dc',
  'amps-ac',
  'ohms',
  'diode-volts',
  'farads',
  'esr-ohms',
  'celsius',
  'seconds',
] as const;

/** One kind of reading. */
export type Quantity = (typeof QUANTITY_IDS)[number];

/** What is known about one kind of reading. */
export interface QuantityInfo {
  /** As a person says it: "this step reads volts DC". */
  readonly name: string;
  readonly unit: Unit;
  /** Whether a minus sign can be a true reading. */
  readonly signed: boolean;
  /** Narrower than the unit's own where the instrument cannot show the rest. */
  readonly prefixes: readonly Prefix[];
  /** `ac` or `dc` where the reading has a kind of current, for `V AC` against `V DC` on entry. */
  readonly current: 'ac' | 'dc' | null;
}

/** Every kind of reading by its id. */
export const QUANTITIES: Readonly<Record<Quantity, QuantityInfo>> = {
  'volts-dc': { name: 'volts DC', unit: 'V', signed: true, prefixes: ['μ', 'm', '', 'k'], current: 'dc' },
  'volts-ac': { name: 'volts AC', unit: 'V', signed: false, prefixes: ['μ', 'm', '', 'k'], current: 'ac' },
  'amps-dc': { name: 'amps DC', unit: 'A', signed: true, prefixes: ['p', 'n', 'μ', 'm', ''], current: 'dc' },
  'amps-ac': { name: 'amps AC', unit: 'A', signed: false, prefixes: ['n', 'μ', 'm', ''], current: 'ac' },
  ohms: { name: 'ohms', unit: 'Ω', signed: false, prefixes: ['μ', 'm', '', 'k', 'M', 'G'], current: null },
  'diode-volts': { name: 'diode-test volts', unit: 'V', signed: true, prefixes: ['m', ''], current: null },
  farads: { name: 'farads', unit: 'F', signed: false, prefixes: ['p', 'n', 'μ', 'm', ''], current: null },
  'esr-ohms': { name: 'ohms of ESR', unit: 'Ω', signed: false, prefixes: ['m', ''], current: null },
  celsius: { name: 'degrees Celsius', unit: '°C', signed: true, prefixes: [''], current: null },
  seconds: { name: 'seconds', unit: 's', signed: false, prefixes: ['μ', 'm', ''], current: null },
};
