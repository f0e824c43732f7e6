/** What the lost-return sheet asks for: rails, wires, loads, diodes, and readings where there are any. */
import { z } from 'zod';

import { copperOhmsPerMetre } from '@/shared/workings/copper';
import { choiceField, numberField, rowsField, textField } from '@/shared/workings/sheet';

/** The node that every rail gives from and every return ends at: the supply's own 0 V. */
export const ZERO_NODE = '0 V';

const optional = <T extends z.ZodType>(field: T) => field.nullable().default(null);

const rail = z.strictObject({
  name: textField('Name', 'As printed at its terminal'),
  terminal: optional(textField('Terminal', 'Node that feeds start from; empty for the name itself')),
  volts: numberField({ title: 'Volts', description: 'Nominal, with the sign', unit: 'V', min: -1000, max: 1000 }),
  tolerancePercent: numberField({ title: 'Tolerance', description: 'Allowed either way', unit: '%', min: 0.1, max: 50 }).default(5),
  limitAmps: numberField({
    title: 'Limit',
    description: 'Amps at which it really limits, which may be several times its rating',
    unit: 'A',
    min: 1e-3,
    max: 1000,
  }),
  shortedAmps: optional(
    numberField({
      title: 'Amps when shorted',
      description: 'Less than the limit where it folds back; empty for the limit',
      unit: 'A',
      min: 1e-3,
      max: 1000,
    }),
  ),
  takes: choiceField('Takes current', 'Whether it also takes current; most outputs only give', ['no', 'yes']).default('no'),
  outputOhms: numberField({ title: 'Output ohms', description: 'Slope before the limit', unit: 'Ω', min: 1e-4, max: 10 }).default(0.005),
});

const wire = (goesTo: string) =>
  z.strictObject({
    name: textField('Name', 'As in the harness list'),
    from: textField('From', goesTo),
    to: textField('To', 'Node at the far end'),
    squareMillimetres: optional(numberField({ title: 'Cross-section', description: 'Copper, in mm²', unit: null, min: 0.01, max: 1000 })),
    metres: optional(numberField({ title: 'Length', description: 'One way, in metres', unit: null, min: 0.001, max: 1000 })),
    contactOhms: numberField({ title: 'Contacts', description: 'Of both ends together', unit: 'Ω', min: 0, max: 1e6 }).default(0.002),
    ohms: optional(
      numberField({
        title: 'Ohms',
        description: 'Measured end to end; empty for gauge and length',
        unit: 'Ω',
        min: 1e-5,
        max: 1e7,
      }),
    ),
  });

const load = z.strictObject({
  name: textField('Board', 'Board or dummy load; the same name again for its next rail'),
  from: textField('From', 'Node of its feed'),
  to: textField('To', 'Node of its return, or of another rail'),
  amps: optional(numberField({ title: 'Amps', description: 'At nominal volts', unit: 'A', min: 1e-6, max: 1000 })),
  ohms: optional(numberField({ title: 'Ohms', description: 'In place of amps', unit: 'Ω', min: 1e-3, max: 1e9 })),
});

const diode = z.strictObject({
  name: textField('Name', 'Part number on the board'),
  part: choiceField('Part', 'What it is there for', ['freewheel', 'rectifier', 'clamp']),
  junction: choiceField('Junction', 'Kind of junction', ['silicon', 'schottky']).default('silicon'),
  anode: textField('Anode', 'Node at its anode'),
  cathode: textField('Cathode', 'Node at its cathode, the banded end'),
  ratedAmps: optional(numberField({ title: 'Rated amps', description: 'Average forward', unit: 'A', min: 1e-3, max: 10_000 })),
  saturationAmps: optional(
    numberField({
      title: 'Saturation current',
      description: 'IS; empty for 10 pA silicon, 1 μA Schottky',
      unit: 'A',
      min: 1e-18,
      max: 1e-2,
    }),
  ),
  emission: optional(
    numberField({
      title: 'Emission coefficient',
      description: 'N; empty for 1, or 2 for a rectifier, which is two in series',
      unit: null,
      min: 0.5,
      max: 10,
    }),
  ),
  seriesOhms: numberField({
    title: 'Series ohms',
    description: 'Of chip, leads and choke in its path',
    unit: 'Ω',
    min: 1e-4,
    max: 100,
  }).default(0.005),
});

const reading = z.strictObject({
  rail: textField('Rail', 'Name of the rail'),
  load: textField('Board', 'Board at which it was read'),
  supplyVolts: numberField({ title: 'At the supply', description: 'Against 0 V at the supply', unit: 'V', min: -1000, max: 1000 }),
  loadVolts: numberField({ title: 'At the board', description: 'Against 0 V at the board', unit: 'V', min: -2000, max: 2000 }),
});

export const lostReturnInputs = z.strictObject({
  rails: rowsField({ title: 'Rails', description: 'Every output of the supply', rowName: 'rail', row: rail, fewest: 1, most: 8 }),
  returns: rowsField({
    title: 'Returns',
    description: 'Every conductor that carries current back to 0 V; each, and each pair, is opened',
    rowName: 'return',
    row: wire('Node at the supply, 0 V for most'),
    fewest: 1,
    most: 16,
  }),
  feeds: rowsField({
    title: 'Feeds',
    description: 'Conductors from the terminals out',
    rowName: 'feed',
    row: wire('Terminal, or the node before'),
    fewest: 0,
    most: 64,
  }).default([]),
  loads: rowsField({
    title: 'Loads',
    description: 'Boards or dummy loads, between any two nodes',
    rowName: 'load',
    row: load,
    fewest: 1,
    most: 128,
  }),
  diodes: rowsField({
    title: 'Diodes',
    description: 'Those on the supply’s side that conduct when a rail is pulled the wrong way',
    rowName: 'diode',
    row: diode,
    fewest: 0,
    most: 32,
  }).default([]),
  readings: rowsField({
    title: 'Readings',
    description: 'Of a machine that runs, to find the wire at fault',
    rowName: 'reading',
    row: reading,
    fewest: 0,
    most: 64,
  }).default([]),
});

export type LostReturnInputs = z.output<typeof lostReturnInputs>;
export type WireRow = LostReturnInputs['returns'][number];
export type DiodeRow = LostReturnInputs['diodes'][number];

/** End to end, from the ohms that were measured or else from gauge, length and contacts; null where neither is given. */
export function wireOhms({ ohms, squareMillimetres, metres, contactOhms }: WireRow): number | null {
  if (ohms !== null) return ohms;
  if (squareMillimetres === null || metres === null) return null;
  return copperOhmsPerMetre(squareMillimetres) * metres + contactOhms;
}

/** IS and N of a diode row, with what stands in where they are empty. Typical of power diodes; common practice, no source. */
export function diodeCard({ part, junction, saturationAmps, emission, seriesOhms }: DiodeRow) {
  return {
    saturationAmps: saturationAmps ?? (junction === 'schottky' ? 1e-6 : 1e-11),
    emission: emission ?? (part === 'rectifier' ? 2 : 1),
    seriesOhms,
  };
}
