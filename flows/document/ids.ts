/** Identifiers used in trees, profiles and runs: a narrow alphabet that no object, state key or path can misread. */
import { z } from 'zod';

/** `a-z0-9-`, starting with a letter, at most 40 long; the one name that every object already owns is refused. */
export const idSchema = z
  .string()
  .regex(/^[a-z][a-z0-9-]{0,39}$/, 'an id is made of a-z, 0-9 and -, starts with a letter and is at most 40 long')
  .refine((id) => id !== 'constructor', 'this name is reserved');

export type Id = z.infer<typeof idSchema>;

/** Areas of a machine; primary, raw, regulator and trip are parts of the supply. */
export const AREAS = ['supply', 'primary', 'raw', 'regulator', 'trip', 'earth', 'harness', 'boards', 'part', 'clip'] as const;
export type Area = (typeof AREAS)[number];

/** Quantities that a reading can have, each with its SI unit. */
export const QUANTITIES = {
  'volts-dc': 'V',
  'volts-ac': 'V',
  'amps-dc': 'A',
  'amps-ac': 'A',
  ohms: 'Ω',
  'diode-volts': 'V',
  farads: 'F',
  'esr-ohms': 'Ω',
  celsius: '°C',
  seconds: 's',
} as const;
export type Quantity = keyof typeof QUANTITIES;
export const QUANTITY_NAMES = Object.keys(QUANTITIES) as [Quantity, ...Quantity[]];

/** Quantities whose meter puts its own current through the circuit and therefore needs it dead. */
export const DEAD_QUANTITIES: readonly Quantity[] = ['ohms', 'diode-volts', 'farads', 'esr-ohms'];
