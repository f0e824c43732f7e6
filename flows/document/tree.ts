/** The fault tree document, `format: 1`. `parseTree` checks also what no shape can say. */
import { z } from 'zod';

import { idSchema, QUANTITY_NAMES } from './ids';
import { claimSchema, stepSchema } from './steps';

const text = (max: number) => z.string().trim().min(1).max(max);

const instrument = z.strictObject({ id: idSchema, name: text(80), kind: z.enum(['multimeter', 'two-pole-tester', 'low-ohm-meter', 'insulation-tester', 'earth-tester', 'oscilloscope', 'thermometer']), reads: z.array(z.enum(QUANTITY_NAMES)).max(10), range: text(60).optional() });
const listed = z.strictObject({ id: idSchema, name: text(120) });

/** The shape alone; `treeSchema` in `parseTree` also checks references, exits and ids. */
export const treeShape = z.strictObject({
  format: z.literal(1),
  id: idSchema,
  title: text(80),
  symptom: text(200),
  about: text(600).optional(),
  /** what it is for, where that does not follow from what it does */
  purpose: z.enum(['checks', 'bring-up', 'fault-finding']).optional(),
  appliesTo: z.strictObject({
    protectiveClasses: z.array(z.enum(['I', 'II'])).min(1).max(2),
    supplyKinds: z.array(z.enum(['linear', 'switched-from-raw', 'switch-mode'])).min(1).max(3),
    fewestRails: z.number().int().min(1).max(16),
    mostRails: z.number().int().min(1).max(16),
    serials: z.array(text(40)).max(200).optional(),
    /** rails that its steps speak of by id */
    rails: z.array(idSchema).max(16).optional(),
    /** what else the profile must have for its rows */
    has: z.array(z.enum(['returns', 'raw', 'stores', 'devices', 'boards', 'heatsinks'])).max(6).optional(),
  }),
  needsAtStart: z.array(claimSchema).max(14),
  opening: z.strictObject({
    tools: z.array(listed).max(40),
    instruments: z.array(instrument).max(20),
    parts: z.array(listed).max(40),
    conditions: z.array(listed).max(20),
  }),
  suspects: z.array(
    z.strictObject({
      id: idSchema,
      part: text(80),
      mode: z.enum(['open', 'short', 'leaky', 'drift', 'no-contact', 'low-value', 'fires-early', 'dead']),
      /** weight before any check, relative to the other suspects */
      prior: z.number().positive().max(1e6),
      killedBy: z.array(idSchema).max(16),
    }),
  ).max(200),
  steps: z.array(stepSchema).min(1).max(12_000),
  /** places at which a run may go on after Stop, with exactly the facts that must hold there */
  reentries: z.array(z.strictObject({ step: idSchema, needs: z.array(claimSchema).max(14) })).max(40),
});

export type Tree = z.infer<typeof treeShape>;
export type Suspect = Tree['suspects'][number];
