/** Wire and return drop: what a conductor and its contacts take away, and what an end-to-end reading says about it. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { awgDiameterMetres, copperFactor, copperOhmsPerMetre, mostOhmsPerMetre, roundSquareMillimetres } from '@/shared/workings/copper';
import type { Plot } from '@/shared/workings/plot';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

/** Below this a meter's own two leads are no longer small against what is read. Common practice, no source. */
export const FOUR_WIRE_BELOW_OHMS = 1;

/** How far above the expected ohms a reading may lie before a contact is accused: wire and temperature are known no better. Common practice, no source. */
const SPARE_SHARE = 0.1;

const output = z.strictObject({
  squareMillimetres: z.number(),
  /** One conductor, one metre, at 20 °C. */
  ohmsPerMetre: z.number(),
  /** All of the path at its temperature, without contacts. */
  wireOhms: z.number(),
  contactOhms: z.number(),
  ohms: z.number(),
  /** With the most that IEC 60228 allows for this size; null where the table has no such size. */
  worstOhms: z.number().nullable(),
  volts: z.number(),
  worstVolts: z.number().nullable(),
  watts: z.number(),
  wattsPerMetre: z.number(),
  /** Whether the drop stays within what is allowed, worst case; null when nothing is given. */
  allowed: z.boolean().nullable(),
  fourWire: z.boolean(),
  reading: z
    .strictObject({
      /** What was read without the leads of the meter. */
      ohms: z.number(),
      /** Over what is expected; below zero when less was read. */
      excessOhms: z.number(),
      excessVolts: z.number(),
      excessWatts: z.number(),
      says: z.enum(['as-expected', 'contact', 'less-than-wire']),
    })
    .nullable(),
});

/** Result of the sheet; nothing rounded. */
export type WireDropResult = z.output<typeof output>;

const inputs = z.strictObject({
  awg: numberField({
    title: 'AWG',
    description: 'Gauge number; 0 for 1/0, −1 for 2/0, −3 for 4/0; empty when given in square millimetres',
    unit: null,
    min: -3,
    max: 40,
  })
    .nullable()
    .default(null),
  squareMillimetres: numberField({
    title: 'Area',
    description: 'Copper area of one conductor; empty when given as AWG',
    unit: 'mm²',
    min: 0.005,
    max: 500,
  })
    .nullable()
    .default(null),
  kind: choiceField('Conductor', 'How it is made; it counts for the most that the standard allows', [
    'solid',
    'flexible',
    'flexible-tinned',
  ]).default('flexible'),
  metres: numberField({ title: 'Length', description: 'Of the conductor, from end to end', unit: 'm', min: 0.005, max: 10_000 }),
  path: choiceField('Path', 'A return or a feed alone, or out and back again', ['one-way', 'there-and-back']).default('one-way'),
  inParallel: numberField({
    title: 'In parallel',
    description: 'Alike conductors side by side, each with its own contacts',
    unit: null,
    min: 1,
    max: 50,
  }).default(1),
  amps: numberField({ title: 'Current', description: 'Through all of them together', unit: 'A', min: 0, max: 1000 }),
  celsius: numberField({
    title: 'Copper temperature',
    description: 'Of the copper, not of the air',
    unit: '°C',
    min: -40,
    max: 200,
  }).default(20),
  contacts: numberField({
    title: 'Contacts',
    description: 'Pins, lugs and screws in each conductor',
    unit: null,
    min: 0,
    max: 100,
  }).default(0),
  contactOhms: numberField({
    title: 'Ohms a contact',
    description: 'Of a sound one, from the maker of the connector; 5 to 20 mΩ is usual',
    unit: 'Ω',
    min: 0,
    max: 10,
  }).default(0.01),
  allowedVolts: numberField({
    title: 'Allowed drop',
    description: 'Most volts that may be lost; empty for none',
    unit: 'V',
    min: 0.0001,
    max: 1000,
  })
    .nullable()
    .default(null),
  readOhms: numberField({
    title: 'Reading',
    description: 'End to end, dead, as the meter shows it; empty when not read',
    unit: 'Ω',
    min: 0,
    max: 1e6,
  })
    .nullable()
    .default(null),
  leadOhms: numberField({
    title: 'Meter leads',
    description: 'Reading with the probes held together; 0 with four wires',
    unit: 'Ω',
    min: 0,
    max: 10,
  }).default(0),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'AWG: d = 0.005 inch × 92^((36 − n) ÷ 39),  A = π ÷ 4 × d²',
  'R = 1.7241 × 10⁻⁸ Ωm ÷ A × length × (1 + 0.00393 × (T − 20 °C)) ÷ conductors in parallel + contacts',
  'most: ohms per kilometre of IEC 60228 in place of 1.7241 × 10⁻⁸ Ωm ÷ A',
  'V = I × R,  P = I² × R; of a reading: R = reading − leads, and what is over is taken for contact',
];
const validity =
  'Direct current, or mains frequency in wires up to some 25 mm² (no skin effect). Annealed copper; old, thin or plated strands have more. The most of IEC 60228 is for its cable sizes, 0.5 to 6 mm². This is no table of what a wire may carry: bundles, insulation and heat decide that. Of several in parallel, a bad contact shifts its share to the others; this takes them as alike.';
const source =
  'AWG: ASTM B258. Resistivity and temperature: annealed copper, 100 % IACS, 0.00393 per kelvin (NBS Handbook 100). Maxima: IEC 60228, table of classes 1, 2 and 5. Four wires below 1 Ω, contacts of 5 to 20 mΩ, one tenth to spare: common practice, no source.';
const caution =
  'Read ohms dead only: sources out, proved dead. Never open a return to measure its current while anything is in: the rail behind it can be pulled the wrong way. A contact that takes watts burns. Local codes, the maker’s data and licensed practice come first.';

const v = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
const r = (value: number): string => formatQuantity(value, 'Ω', { digits: 4 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const w = (value: number): string => formatQuantity(value, 'W', { digits: 3 });
const mm2 = (value: number): string => formatQuantity(value, 'mm²', { digits: 4 });
const m = (value: number): string => formatQuantity(value, 'm', { digits: 4 });

function sizeOf(given: Inputs): number | SheetRefusal {
  const { awg, squareMillimetres } = given;
  if (awg === null && squareMillimetres === null)
    return { ok: false, field: 'squareMillimetres', say: 'Give the size: AWG or square millimetres.' };
  if (awg !== null && squareMillimetres !== null)
    return { ok: false, field: 'awg', say: 'Give the size once: AWG or square millimetres, and leave the other empty.' };
  if (squareMillimetres !== null) return squareMillimetres;
  const gauge = awg ?? 0;
  if (!Number.isInteger(gauge)) return { ok: false, field: 'awg', say: 'AWG must be a whole number; 1/0 is 0, 2/0 is −1, 4/0 is −3.' };
  return roundSquareMillimetres(awgDiameterMetres(gauge));
}

/** Ohms of the path per ohm-per-metre of the wire. */
const metresOf = (given: Inputs): number => (given.metres * (given.path === 'one-way' ? 1 : 2)) / given.inParallel;

function judge(given: Inputs, ohms: number, worstOhms: number | null, wireOhms: number): WireDropResult['reading'] {
  if (given.readOhms === null) return null;
  const read = given.readOhms - given.leadOhms;
  const excessOhms = read - ohms;
  const most = Math.max(worstOhms ?? 0, ohms) * (1 + SPARE_SHARE);
  const least = wireOhms * (1 - 2 * SPARE_SHARE);
  const says = read > most ? 'contact' : read < least ? 'less-than-wire' : 'as-expected';
  return { ohms: read, excessOhms, excessVolts: given.amps * excessOhms, excessWatts: given.amps * given.amps * excessOhms, says };
}

function headlineOf(given: Inputs, result: WireDropResult): string {
  const worst = result.worstVolts === null ? '' : `, at most ${v(result.worstVolts)} with a cable to IEC 60228`;
  const allowed = result.allowed === false ? ` More than the ${v(given.allowedVolts ?? 0)} allowed.` : '';
  const drop = `${r(result.ohms)}: ${v(result.volts)} lost at ${a(given.amps)}${worst}.${allowed}`;
  const { reading } = result;
  if (reading === null) return drop;
  if (reading.says === 'contact')
    return `${r(reading.ohms)} read where ${r(result.ohms)} is expected: look for a bad contact. At ${a(given.amps)} it takes ${v(reading.excessVolts)} and burns ${w(reading.excessWatts)}.`;
  if (reading.says === 'less-than-wire')
    return `${r(reading.ohms)} read where ${r(result.ohms)} is expected: less than the wire alone. Another path lies beside it, or the leads were taken off twice.`;
  return `${r(reading.ohms)} read, as expected. ${drop}`;
}

function formulaOf(given: Inputs, result: WireDropResult): readonly string[] {
  const { squareMillimetres, ohmsPerMetre } = result;
  const lines: string[] = [];
  if (given.awg !== null) {
    const diameter = awgDiameterMetres(given.awg);
    lines.push(`AWG ${formatNumber(given.awg)}: d = ${formatNumber(diameter * 1000)} mm, A = ${mm2(squareMillimetres)}`);
  }
  lines.push(
    `1.7241 × 10⁻⁸ Ωm ÷ ${mm2(squareMillimetres)} = ${r(ohmsPerMetre)} a metre at 20 °C`,
    `R wire = ${r(ohmsPerMetre)} × ${m(given.metres)}${given.path === 'one-way' ? '' : ' × 2'} × ${formatNumber(copperFactor(given.celsius), 5)}${given.inParallel === 1 ? '' : ` ÷ ${formatNumber(given.inParallel)}`} = ${r(result.wireOhms)}`,
  );
  if (given.contacts > 0)
    lines.push(
      `R contacts = ${formatNumber(given.contacts)} × ${r(given.contactOhms)}${given.path === 'one-way' ? '' : ' × 2'}${given.inParallel === 1 ? '' : ` ÷ ${formatNumber(given.inParallel)}`} = ${r(result.contactOhms)}`,
    );
  lines.push(
    `V = ${a(given.amps)} × ${r(result.ohms)} = ${v(result.volts)}; P = ${w(result.watts)}, ${w(result.wattsPerMetre)} a metre of each wire`,
  );
  if (result.worstOhms !== null && result.worstVolts !== null)
    lines.push(`most by IEC 60228: ${r(result.worstOhms)}, ${v(result.worstVolts)}`);
  const { reading } = result;
  if (reading !== null)
    lines.push(
      `reading: ${r(given.readOhms ?? 0)} − ${r(given.leadOhms)} = ${r(reading.ohms)}; over what is expected: ${r(reading.excessOhms)}`,
    );
  if (result.fourWire)
    lines.push('below 1 Ω read with four wires: two leads have 0.2 to 0.5 Ω of their own, and how they are held changes that');
  return lines;
}

function plotOf(given: Inputs, result: WireDropResult): Plot {
  const far = 2 * given.metres;
  const contactVolts = given.amps * result.contactOhms;
  const line = (volts: number): readonly (readonly [number, number])[] => [
    [0, contactVolts],
    [far, contactVolts + 2 * (volts - contactVolts)],
  ];
  const { worstVolts } = result;
  const limit = given.allowedVolts;
  return {
    title: 'Drop over length',
    x: { title: 'Length', unit: 'm', scale: 'linear', from: 0, to: far },
    y: { title: 'Volts lost', unit: 'V', scale: 'linear', from: 0 },
    curves: [
      { label: 'copper', points: line(result.volts), role: 'main' },
      ...(worstVolts === null ? [] : [{ label: 'most by IEC 60228', points: line(worstVolts), role: 'bound' as const }]),
    ],
    points: [{ label: v(result.volts), x: given.metres, y: result.volts, role: 'answer' }],
    bands: [],
    limits: limit === null ? [] : [{ label: 'allowed', axis: 'y', at: limit }],
    words: `A straight line from ${v(contactVolts)} at no length to ${v(result.volts)} at ${m(given.metres)}.${limit === null ? '' : ` Allowed are ${v(limit)}, and the drop lies ${result.allowed === true ? 'below' : 'above'} them.`}`,
  };
}

/** Wire and return drop. */
export const sheet = defineSheet({
  id: 'wire-drop',
  title: 'Wire and return drop',
  question: 'What does this wire take away, and does its reading speak of a bad contact?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'AWG 10 to 30, ohms per 1000 ft: table of Floyd, Electric Circuit Fundamentals, as printed by HyperPhysics',
    'Classes 1, 2 and 5: IEC 60228, from four agreeing cable makers’ tables',
    'Drop of 100 ft of 12 AWG and of a No. 16 circuit: published worked examples',
  ],
  example: { squareMillimetres: 0.75, metres: 0.6, amps: 3, contacts: 2, contactOhms: 0.01, readOhms: 0.11 },
  compute(given): SheetAnswer<WireDropResult> | SheetRefusal {
    const squareMillimetres = sizeOf(given);
    if (typeof squareMillimetres !== 'number') return squareMillimetres;
    for (const field of ['inParallel', 'contacts'] as const)
      if (!Number.isInteger(given[field]))
        return { ok: false, field, say: `${field === 'contacts' ? 'Contacts' : 'In parallel'} must be a whole number.` };
    if (given.readOhms !== null && given.readOhms < given.leadOhms)
      return {
        ok: false,
        field: 'leadOhms',
        say: 'The leads alone must not read more than leads and wire together. Hold the probes together and read again.',
      };
    const ohmsPerMetre = copperOhmsPerMetre(squareMillimetres);
    const scale = metresOf(given) * copperFactor(given.celsius);
    const wireOhms = ohmsPerMetre * scale;
    const contactOhms = (given.contacts * given.contactOhms * (given.path === 'one-way' ? 1 : 2)) / given.inParallel;
    const most = mostOhmsPerMetre(squareMillimetres, given.kind);
    const ohms = wireOhms + contactOhms;
    const worstOhms = most === null ? null : most * scale + contactOhms;
    const volts = given.amps * ohms;
    const worstVolts = worstOhms === null ? null : given.amps * worstOhms;
    const share = given.amps / given.inParallel;
    const result: WireDropResult = {
      squareMillimetres,
      ohmsPerMetre,
      wireOhms,
      contactOhms,
      ohms,
      worstOhms,
      volts,
      worstVolts,
      watts: given.amps * volts,
      wattsPerMetre: share * share * ohmsPerMetre * copperFactor(given.celsius),
      allowed: given.allowedVolts === null ? null : (worstVolts ?? volts) <= given.allowedVolts * (1 + 1e-12),
      fourWire: ohms < FOUR_WIRE_BELOW_OHMS,
      reading: judge(given, ohms, worstOhms, wireOhms),
    };
    return {
      ok: true,
      result,
      headline: headlineOf(given, result),
      formula: formulaOf(given, result),
      caution,
      validity,
      source,
      plot: plotOf(given, result),
    };
  },
});
