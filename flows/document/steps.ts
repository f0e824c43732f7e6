/** One schema for each kind of step. Unknown keys are refused. */
import { z } from 'zod';

import { HAZARD_KINDS } from './hazards';
import { AREAS, idSchema, QUANTITY_NAMES } from './ids';
import { EVIDENCE_WORDS, OUTCOMES, SHOWN_KINDS, VERDICTS } from './outcomes';

import { TEST_CONDITION_IDS } from './testConditions';

const text = (max: number) => z.string().trim().min(1).max(max);

export const claimSchema = z.enum([
  'out', 'dead', 'looked', 'earth', 'insulation', 'returns', 'trips', 'proving-regulator', 'proving-limited', 'proving-full', 'load-none', 'load-boards',
  'release', 'nothing-fitted',
]);
/** A bench fact that a tree states: what it needs, what it leaves, what a re-entry stands on. */
export type Claim = z.infer<typeof claimSchema>;

const evidence = z.strictObject({ suspect: idSchema, says: z.enum(EVIDENCE_WORDS) });

const exitSchema = z
  .strictObject({
    id: idSchema,
    label: text(60).optional(),
    /** outcomes of the step that leave by this exit; for an authored answer `answer`, at a call the callee's end ids */
    on: z.array(z.union([z.enum(OUTCOMES), idSchema])).min(1).max(12),
    to: idSchema,
    verdict: z.enum(VERDICTS).optional(),
    reason: text(200).optional(),
    /** a counted exit: taken at most this often, after that the run leaves by `then` */
    atMost: z.number().int().min(1).max(99).optional(),
    then: idSchema.optional(),
    evidence: z.array(evidence).max(64).optional(),
    /** what this answer of a look shows about the part that it speaks of */
    shows: z.enum(SHOWN_KINDS).optional(),
  })
  .refine((e) => (e.atMost === undefined) === (e.then === undefined), 'a counted exit says both `atMost` and `then`')
  .refine((e) => e.verdict !== 'find' || e.reason !== undefined, 'a find says its reason');

const nominalLimit = z.strictObject({ is: z.literal('nominal'), of: z.union([z.literal('row'), z.number()]), tolerance: z.union([z.literal('row'), z.number().positive().max(1)]) });
export const limitSchema = z.discriminatedUnion('is', [
  nominalLimit,
  z.strictObject({ is: z.literal('between'), low: z.number(), high: z.number() }).refine((l) => l.low < l.high, 'the low end lies above the high end'),
  z.strictObject({ is: z.literal('below'), high: z.number() }),
  z.strictObject({ is: z.literal('above'), low: z.number() }),
  /** like its twin: the same point of an identical circuit is read first, and this one lies within a share of it */
  z.strictObject({ is: z.literal('twin'), of: text(80), within: z.number().min(0.001).max(0.5) }),
  z.strictObject({ is: z.literal('workings'), sheet: idSchema, low: text(40).nullable(), high: text(40).nullable() }),
]);
export type Limit = z.infer<typeof limitSchema>;

export const WORKINGS_SHEETS = ['series-lamp', 'bleed-down', 'rail-limits', 'reading-limit', 'wire-drop', 'fuse-inrush', 'over-voltage-trip', 'refit-trip', 'lost-return', 'reforming', 'rail-load-plan', 'pass-element'] as const;
/** A sheet shown in the step for this machine, with what the author fixes; the rest comes from the profile. */
const workingsRef = z.strictObject({ sheet: z.enum(WORKINGS_SHEETS), lampWatts: z.number().positive().optional(), /** share of the plate watts that the load of this step draws */ loadShare: z.number().positive().max(1).optional(), store: idSchema.optional(), toolOhms: z.number().positive().optional(), toolWatts: z.number().positive().optional(), /** years without volts that a plan for reforming reckons with */ storageYears: z.number().nonnegative().max(150).optional(), rail: idSchema.optional(), conductor: idSchema.optional(), /** the board that goes in next */ board: idSchema.optional(), /** the counted exit that is taken once for each board that is in */ boardsIn: z.strictObject({ step: idSchema, exit: idSchema }).optional() });

const figureSchema = z.union([
  z.strictObject({ points: z.array(idSchema).min(1).max(12), caption: text(120).optional() }),
  z.strictObject({ photo: z.string().regex(/^[0-9a-f]{64}$/), marks: z.array(z.strictObject({ x: z.number(), y: z.number(), label: text(40) })).max(12), caption: text(120).optional() }),
]);

export const fittedSchema = z.strictObject({
  id: idSchema,
  name: text(80),
  class: z.enum(['link', 'bypass', 'series', 'clip', 'lifted']),
  area: z.enum(AREAS),
  /** an earthed instrument is never clipped to the primary */
  earthed: z.boolean().optional(),
  /** the point that a clip sits on */
  point: idSchema.optional(),
});
export type FittedThing = z.infer<typeof fittedSchema>;

const common = {
  id: idSchema,
  title: text(80),
  lines: z.array(text(240)).min(1).max(8),
  /** what you will see and hear */
  expect: text(240).optional(),
  /** why this step, for the novice who asks */
  why: text(400).optional(),
  contact: z.enum(['none', 'cover', 'probe', 'hands']),
  figure: figureSchema.optional(),
  workings: workingsRef.optional(),
  tools: z.array(idSchema).max(12),
  minutes: z.number().min(0).max(600),
  hazards: z.array(z.enum(HAZARD_KINDS)).max(8),
  exits: z.array(exitSchema).min(1).max(12),
};
const each = z.enum(['rails', 'returns', 'stores', 'points']).optional();
/** a look can go from connector to connector of the conductors, too */
const eachSeen = z.enum(['rails', 'returns', 'stores', 'points', 'connectors']).optional();
const power = z.enum(['live', 'dead']).optional();
const reading = {
  quantity: z.enum(QUANTITY_NAMES),
  /** the unit that the figures of the limit are in; only the SI unit of the quantity is taken, so that millivolts are never read as volts */
  unit: text(8).optional(),
  /** red and black probe; for a row-wise step the row's own point takes the place of red */
  points: z.strictObject({ red: idSchema.optional(), black: idSchema.optional(), twin: idSchema.optional() }).optional(),
  /** how the probe gets there: clipped by an earlier dead step, one insulated probe by hand, or no contact */
  probe: z.enum(['clipped', 'hand', 'none']),
  limit: limitSchema,
  each,
  power,
};
/** test conditions that have been confirmed before this step and still stand */
const asInService = z.array(z.enum(TEST_CONDITION_IDS)).min(1).max(2).optional();
/** a failed part that is opened: whose it is, the photo step before it, and the step in its place where a part may hold beryllium oxide */
const opens = z.strictObject({ suspect: idSchema, photo: idSchema, instead: idSchema.optional() }).optional();
const proveCommon = { ...common, contact: z.literal('hands') };

export const NODES = ['inlet', 'raw', 'rail', 'part'] as const;
export const LOADS = ['boards', 'none', 'light', 'full'] as const;
export type Load = (typeof LOADS)[number];

const powerFields = {
  source: idSchema,
  through: z.enum(['lamp', 'bench', 'mains', 'limited-ac']),
  node: z.enum(NODES),
  rail: idSchema.optional(),
  /** the lifted lead that parts the fed part from its circuit */
  lead: idSchema.optional(),
  /** fitted things that must be in the path, such as the series resistor of a trip test */
  throughItems: z.array(idSchema).max(4).optional(),
  load: z.enum(LOADS),
  mostVolts: z.number().positive().max(10_000),
  mostAmps: z.number().positive().max(1_000),
  longestMinutes: z.number().positive().max(1_440),
  lampWatts: z.number().positive().max(2_000).optional(),
  abort: idSchema,
};

export const stepSchema = z.discriminatedUnion('kind', [
  z.strictObject({ ...common, kind: z.literal('do'), fits: z.array(fittedSchema).max(8).optional(), removes: z.array(idSchema).max(8).optional(), trims: z.enum(AREAS).optional(), confirms: z.array(z.enum(TEST_CONDITION_IDS)).min(1).max(2).optional() }),
  z.strictObject({ ...common, kind: z.literal('observe'), asks: text(160), each: eachSeen, power, lookOver: z.boolean().optional(), opens }),
  z.strictObject({ ...common, kind: z.literal('measure'), ...reading }),
  z.strictObject({ ...common, kind: z.literal('soak'), ...reading, holdMinutes: z.number().positive().max(1_440), everyMinutes: z.number().positive().max(240), asInService }),
  z.strictObject({ ...common, kind: z.literal('photo'), of: text(120), power }),
  z.strictObject({ ...common, kind: z.literal('isolate') }),
  /** without a tool of its own the step takes the resistor that the workings choose for the machine */
  z.strictObject({ ...common, kind: z.literal('discharge'), toolOhms: z.number().positive().max(1e7).optional(), toolWatts: z.number().positive().max(1e4).optional() }),
  z.strictObject({ ...common, kind: z.literal('prove-dead') }),
  z.strictObject({ ...proveCommon, kind: z.literal('prove-earth') }),
  z.strictObject({ ...proveCommon, kind: z.literal('prove-insulation') }),
  z.strictObject({ ...proveCommon, kind: z.literal('prove-returns') }),
  z.strictObject({ ...common, kind: z.literal('prove-trip'), rail: idSchema, series: idSchema, probe: z.enum(['clipped', 'hand']), ceilingVolts: z.number().positive().max(1_000) }),
  z.strictObject({ ...common, kind: z.literal('connect-load'), contact: z.literal('hands'), load: z.enum(LOADS) }),
  z.strictObject({ ...common, kind: z.literal('energise'), contact: z.literal('none'), ...powerFields, asInService }),
  z.strictObject({ ...common, kind: z.literal('raise'), contact: z.enum(['none', 'probe']), ...powerFields, asInService }),
  z.strictObject({ ...common, kind: z.literal('prove-rails'), level: z.enum(['regulator', 'limited', 'full']), probe: z.enum(['clipped', 'hand']) }),
  z.strictObject({ ...common, kind: z.literal('work'), contact: z.literal('hands'), area: z.enum(AREAS), replaces: z.array(idSchema).max(8).optional(), for: z.array(idSchema).max(8).optional(), suspects: z.array(idSchema).max(8).optional(), cannotBeUndone: z.boolean().optional() }),
  z.strictObject({ ...common, kind: z.literal('hold'), contact: z.literal('none'), asks: text(200), names: z.array(idSchema).max(8).optional(), for: z.enum(['bench', 'limited', 'full', 'boards']).optional() }),
  z.strictObject({ ...common, kind: z.literal('call'), contact: z.literal('none'), tree: idSchema, version: z.number().int().positive().nullable(), needs: z.array(claimSchema).max(14).optional(), results: z.array(claimSchema).max(14).optional() }),
  z.strictObject({
    ...common,
    kind: z.literal('end'),
    contact: z.literal('none'),
    exits: z.array(z.never()).max(0),
    says: z.enum(['fault-found', 'supply-proven', 'cleared', 'stopped', 'referred', 'in-service']),
    suspect: idSchema.optional(),
    replace: text(200).optional(),
    retest: text(200).optional(),
  }),
]);

export type Step = z.infer<typeof stepSchema>;
export type StepOf<K extends Step['kind']> = Extract<Step, { kind: K }>;
export type Exit = z.infer<typeof exitSchema>;
