/** Junction test: what diode-test and two-lead readings say of a diode, Zener, transistor or thyristor, in or out of circuit. */
import { z } from 'zod';

import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { junctionDrawing } from '@/shared/workings/junctionDrawing';
import type { JunctionKind, JunctionReading } from '@/shared/workings/junctionReading';
import { junctionKind, readJunction } from '@/shared/workings/junctionReading';
import type { Circuit } from '@/shared/workings/plot';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField, rowsField, textField } from '@/shared/workings/sheet';

const LEADS = ['anode', 'cathode', 'gate', 'base', 'emitter', 'collector'] as const;
type Lead = (typeof LEADS)[number];

const PARTS = ['diode', 'zener', 'npn-transistor', 'pnp-transistor', 'thyristor'] as const;
type Part = (typeof PARTS)[number];

/** Red on the first, black on the second; `either` where a part may have a resistor of its own inside. */
type Expected = readonly [red: Lead, black: Lead, wants: 'conducts' | 'blocks' | 'either'];

const EXPECTED: Readonly<Record<Part, readonly Expected[]>> = {
  diode: [
    ['anode', 'cathode', 'conducts'],
    ['cathode', 'anode', 'blocks'],
  ],
  zener: [
    ['anode', 'cathode', 'conducts'],
    ['cathode', 'anode', 'blocks'],
  ],
  'npn-transistor': [
    ['base', 'emitter', 'conducts'],
    ['base', 'collector', 'conducts'],
    ['emitter', 'base', 'blocks'],
    ['collector', 'base', 'blocks'],
    ['collector', 'emitter', 'blocks'],
    ['emitter', 'collector', 'blocks'],
  ],
  'pnp-transistor': [
    ['emitter', 'base', 'conducts'],
    ['collector', 'base', 'conducts'],
    ['base', 'emitter', 'blocks'],
    ['base', 'collector', 'blocks'],
    ['collector', 'emitter', 'blocks'],
    ['emitter', 'collector', 'blocks'],
  ],
  thyristor: [
    ['gate', 'cathode', 'conducts'],
    // Many have a resistor from gate to cathode inside: the gate may read alike both ways.
    ['cathode', 'gate', 'either'],
    ['anode', 'cathode', 'blocks'],
    ['cathode', 'anode', 'blocks'],
    ['gate', 'anode', 'blocks'],
    ['anode', 'gate', 'blocks'],
  ],
};

const KINDS = ['short', 'low', 'low-drop', 'silicon', 'high', 'resistance', 'open'] as const satisfies readonly JunctionKind[];

const output = z.strictObject({
  says: z.enum(['good', 'short', 'open', 'leaky', 'lift-a-lead', 'not-told', 'incomplete']),
  /** What the junctions that conduct look like; null where none was read or they differ. */
  junction: z.enum(['silicon', 'low-drop', 'high']).nullable(),
  /** The leads that the finding is about, or the next to be read; null where all is well. */
  red: z.enum(LEADS).nullable(),
  black: z.enum(LEADS).nullable(),
  readings: z.array(z.strictObject({ red: z.enum(LEADS), black: z.enum(LEADS), is: z.enum(KINDS) })),
});

/** Result of the sheet. */
export type JunctionTestResult = z.output<typeof output>;

const inputs = z.strictObject({
  part: choiceField('Part', 'What it is by drawing or marking', PARTS),
  circuit: choiceField('Where', 'Out: at least one lead of a diode, two of a three-legged part, are lifted', [
    'in-circuit',
    'out-of-circuit',
  ]).default('in-circuit'),
  zenerVolts: numberField({ title: 'Zener volts', description: 'For a Zener; empty when not known', unit: 'V', min: 0.5, max: 1000 })
    .nullable()
    .default(null),
  meterVolts: numberField({
    title: 'Meter’s own volts',
    description: 'What its diode test can drive at most; 2 to 3 V is usual',
    unit: 'V',
    min: 0.5,
    max: 20,
  }).default(2.5),
  readings: rowsField({
    title: 'Readings',
    description: 'Two leads at a time, then the other way round',
    rowName: 'reading',
    row: z.strictObject({
      red: choiceField('Red on', 'The lead under the red probe', LEADS),
      black: choiceField('Black on', 'The lead under the black probe', LEADS),
      shown: textField('Shows', 'As the meter shows it: 0.612, OL, or ohms with their Ω', 20),
    }),
    fewest: 1,
    most: 12,
  }),
});

type Inputs = z.output<typeof inputs>;

interface Read {
  readonly red: Lead;
  readonly black: Lead;
  readonly reading: JunctionReading;
  readonly is: JunctionKind;
  readonly wants: Expected[2];
}

const law = [
  '0.1 V or less: shorted · 0.2 to 0.45 V: Schottky or germanium, the reading cannot tell which · 0.45 to 0.9 V: silicon · OL: open',
  'a junction conducts one way and blocks the other; a short shows in at least one direction; OL both ways is open',
  'in circuit: OL where it should conduct is true, for what lies beside it can only lower a reading; any other finding wants a lead lifted',
  'thyristor: gate to cathode like a junction, anode to cathode OL both ways; it is not thereby shown to fire',
];
const validity =
  'A digital meter on its diode test, about 1 mA, red positive. Analogue meters have the red probe negative on ohms. Power parts may have a resistor or a diode inside and Darlingtons read two junctions; the maker’s data come first. A part may pass here and still break down at its working volts: this finds the dead, not the weak.';
const source =
  'Shorted at 0.100 V or less, silicon 0.5 to 0.8 V, OL open: Fluke 80 Series V manual, p. 30. 0.3 to 0.8 V: Keysight U1271A manual; 0.40 to 0.80 V: FLIR CM174 manual. Germanium 0.2 to 0.3 V, Schottky 0.2 to 0.4 V: device makers’ notes. Gate of a thyristor 0.2 to 0.8 V: meter maker’s note. 10 Ω as a short, 1 MΩ as open: common practice, no source.';
const caution =
  'Dead only: sources out, discharged, proved dead. A charged capacitor behind the part harms the meter and you. Local codes, the maker’s data and licensed practice come first.';

function shownWords(read: Read): string {
  const { reading } = read;
  if (reading.kind === 'open') return 'OL';
  return reading.kind === 'volts' ? formatQuantity(reading.volts, 'V', { digits: 3 }) : formatQuantity(reading.ohms, 'Ω', { digits: 3 });
}

function readAll(given: Inputs): readonly Read[] | SheetRefusal {
  const expected = EXPECTED[given.part];
  const leads = new Set(expected.flatMap(([red, black]) => [red, black]));
  const all: Read[] = [];
  for (const [at, { red, black, shown }] of given.readings.entries()) {
    const number = `Reading ${String(at + 1)}: `;
    for (const [column, lead] of [
      ['red', red],
      ['black', black],
    ] as const)
      if (!leads.has(lead))
        return {
          ok: false,
          field: `readings.${String(at)}.${column}`,
          say: `${number}a ${words(given.part)} has no ${lead}; it has ${[...leads].join(', ')}.`,
        };
    if (red === black) return { ok: false, field: `readings.${String(at)}.black`, say: `${number}both probes are on the ${red}.` };
    if (all.some((read) => read.red === red && read.black === black))
      return { ok: false, field: `readings.${String(at)}.red`, say: `${number}red on ${red}, black on ${black} stands there already.` };
    const reading = readJunction(shown);
    if ('say' in reading) return { ok: false, field: `readings.${String(at)}.shown`, say: `${number}${reading.say}` };
    const wants = expected.find(([one, other]) => one === red && other === black)?.[2] ?? 'either';
    all.push({ red, black, reading, is: junctionKind(reading), wants });
  }
  return all;
}

const words = (part: Part): string => (part === 'zener' ? 'Zener' : part.replace('npn', 'NPN').replace('pnp', 'PNP').replace('-', ' '));

/** A Zener whose volts the meter can drive reads them the other way round: that is no leak. */
function isZenerVolts({ part, zenerVolts, meterVolts }: Inputs, { reading }: Read): boolean {
  if (part !== 'zener' || reading.kind !== 'volts') return false;
  const tenth = zenerVolts === null ? null : 0.2 * zenerVolts;
  return zenerVolts !== null && tenth !== null && zenerVolts <= meterVolts ? Math.abs(reading.volts - zenerVolts) <= tenth : false;
}

function verdict(given: Inputs, all: readonly Read[]): Pick<JunctionTestResult, 'says' | 'red' | 'black'> {
  const inCircuit = given.circuit === 'in-circuit';
  const find = (test: (read: Read) => boolean) => all.find(test);
  const on = (says: JunctionTestResult['says'], read: Read) => ({ says, red: read.red, black: read.black });
  const open = find((read) => read.wants === 'conducts' && read.is === 'open');
  if (open !== undefined) return on('open', open);
  // A thyristor may have 15 to 50 Ω from gate to cathode inside, which a diode test shows as next to nothing.
  const isGate = ({ red, black }: Read) => red === 'gate' && black === 'cathode';
  const short = find((read) => read.is === 'short' && read.wants !== 'either' && !isGate(read));
  if (short !== undefined) return on(inCircuit ? 'lift-a-lead' : 'short', short);
  const leak = find((read) => read.wants === 'blocks' && read.is !== 'open' && !isZenerVolts(given, read));
  if (leak !== undefined) return on(inCircuit ? 'lift-a-lead' : 'leaky', leak);
  const odd = find((read) => read.wants === 'conducts' && (read.is === 'short' || read.is === 'low' || read.is === 'resistance'));
  if (odd !== undefined) return on(inCircuit ? 'lift-a-lead' : 'not-told', odd);
  const next = EXPECTED[given.part].find(
    ([red, black, wants]) => wants !== 'either' && !all.some((read) => read.red === red && read.black === black),
  );
  if (next !== undefined) return { says: 'incomplete', red: next[0], black: next[1] };
  return { says: 'good', red: null, black: null };
}

function junctionOf(all: readonly Read[]): JunctionTestResult['junction'] {
  const kinds = new Set(all.filter((read) => read.wants === 'conducts').map((read) => read.is));
  const [only] = kinds;
  return kinds.size === 1 && (only === 'silicon' || only === 'low-drop' || only === 'high') ? only : null;
}

const JUNCTION_WORDS = {
  silicon: 'silicon by its drop',
  'low-drop': 'Schottky or germanium by its drop, the reading cannot tell which',
  high: 'two junctions in series by its drop, as in a Darlington',
} as const;

function headlineOf(given: Inputs, all: readonly Read[], result: JunctionTestResult): string {
  const { says, red, black, junction } = result;
  const here = all.find((read) => read.red === red && read.black === black);
  const shown = here === undefined ? '' : shownWords(here);
  const pair = `red on ${red ?? ''}, black on ${black ?? ''}`;
  switch (says) {
    case 'open':
      return `Open: OL with ${pair}, where it should conduct${given.circuit === 'in-circuit' ? '. That is true in circuit too' : ''}.`;
    case 'short':
      return `Shorted: ${shown} with ${pair}.`;
    case 'leaky':
      return `Leaky: ${shown} with ${pair}, where it should block.`;
    case 'lift-a-lead':
      return `Not told yet: ${shown} with ${pair} may be the part or what lies beside it. Lift a lead and read again.`;
    case 'not-told':
      return `Not told: ${shown} with ${pair} is no usual junction. Check range, leads and marking, and compare with a good one.`;
    case 'incomplete':
      return `Nothing wrong so far. Read next: ${pair}.`;
    case 'good': {
      const drop = junction === null ? '' : `, ${JUNCTION_WORDS[junction]}`;
      if (given.part === 'thyristor') return 'Its gate conducts and it blocks both ways. Whether it fires and holds, the trip test shows.';
      const zener = given.part === 'zener' ? ' Its Zener volts are not shown by this: read them on a current-limited supply.' : '';
      return `Good${drop}.${zener}`;
    }
  }
}

function formulaOf(all: readonly Read[]): readonly string[] {
  const kind: Readonly<Record<JunctionKind, string>> = {
    short: '0.1 V or less, or 10 Ω or less: joined',
    low: 'between a short and any junction',
    'low-drop': '0.2 to 0.45 V: Schottky or germanium',
    silicon: '0.45 to 0.9 V: silicon',
    high: 'above 0.9 V: two junctions, or a Zener the other way',
    resistance: 'ohms between short and open',
    open: 'nothing flows',
  };
  const wanted = { conducts: 'should conduct', blocks: 'should block', either: 'may read either way' } as const;
  return all.map((read) => `red on ${read.red}, black on ${read.black}: ${shownWords(read)}: ${kind[read.is]}; ${wanted[read.wants]}`);
}

function drawingOf(given: Inputs, all: readonly Read[], result: JunctionTestResult, finding: string): Circuit {
  const expected = EXPECTED[given.part];
  const ways = expected.map(([red, black, wants]) => {
    const read = all.find((one) => one.red === red && one.black === black);
    const found = result.red === red && result.black === black && result.says !== 'incomplete';
    return { red, black, conducts: wants === 'conducts', shown: read === undefined ? null : shownWords(read), accused: found };
  });
  const leads = [...new Set(expected.flatMap(([red, black]) => [red, black]))];
  return junctionDrawing(`The junctions of a ${words(given.part)}`, leads, ways, finding);
}

/** Junction test. */
export const sheet = defineSheet({
  id: 'junction-test',
  title: 'Junction test',
  question: 'Is this diode, transistor or thyristor good, by two leads at a time?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Good, shorted and open diodes: manuals of five meters',
    'Schottky and germanium: device makers’ notes',
    'Gate and anode of a thyristor, base of a transistor: meter makers’ and teaching notes',
  ],
  example: {
    part: 'npn-transistor',
    circuit: 'out-of-circuit',
    readings: [
      { red: 'base', black: 'emitter', shown: '0.652' },
      { red: 'base', black: 'collector', shown: '0.640' },
      { red: 'collector', black: 'emitter', shown: '0.003' },
    ],
  },
  compute(given): SheetAnswer<JunctionTestResult> | SheetRefusal {
    const all = readAll(given);
    if ('ok' in all) return all;
    const result: JunctionTestResult = {
      ...verdict(given, all),
      junction: junctionOf(all),
      readings: all.map(({ red, black, is }) => ({ red, black, is })),
    };
    // The law stands below a single reading too, so that its limits are seen.
    const formula = [...formulaOf(all), ...(all.length === 1 ? law.slice(0, 1) : [])];
    const headline = headlineOf(given, all, result);
    return { ok: true, result, headline, formula, caution, validity, source, drawing: drawingOf(given, all, result, headline) };
  },
});
