/** One run as lists show it. */
import { z } from 'zod';

import { hashSchema, instantSchema, machineIdSchema, personIdSchema, runIdSchema, treeIdSchema, versionSchema } from './ids';

export const RUN_STATES = ['open', 'closed', 'submitted', 'returned', 'accepted'] as const;
export const runStateSchema = z.enum(RUN_STATES);
export type RunState = z.infer<typeof runStateSchema>;

/** The supply state of the power band. */
export const BANDS = ['proved-dead', 'off', 'lamp', 'bench', 'mains', 'unknown'] as const;
export const bandSchema = z.enum(BANDS);

/** How a run ended; `stopped` is also the end of every Stop. */
export const ENDINGS = ['fault-found', 'supply-proven', 'cleared', 'stopped', 'referred', 'in-service'] as const;
export const endingSchema = z.enum(ENDINGS);

export const headSchema = z.object({ seq: z.number().int().nonnegative(), hash: hashSchema }).meta({ id: 'Head' });
export type Head = z.infer<typeof headSchema>;

export const runSummarySchema = z
  .object({
    id: runIdSchema,
    machine: z.object({ id: machineIdSchema, name: z.string(), serial: z.string() }),
    tree: z.object({ id: treeIdSchema, title: z.string(), version: versionSchema }),
    restorer: personIdSchema,
    /** everybody who led it before */
    former: z.array(personIdSchema),
    /** the person whom it is offered to, or null */
    offeredTo: personIdSchema.nullable(),
    /** open, and begun under rules that the server no longer runs: nobody can be led on, a senior closes it */
    stranded: z.boolean(),
    state: runStateSchema,
    ended: endingSchema.nullable(),
    startedAt: instantSchema,
    closedAt: instantSchema.nullable(),
    /** last time that the server heard of it */
    heardAt: instantSchema,
    head: headSchema,
    band: bandSchema,
    /** the step that it stands at, or null once it has ended */
    step: z.object({ key: z.string(), title: z.string(), stud: z.string(), total: z.number().int() }).nullable(),
    /** true while a senior's countersign is awaited */
    awaitsHold: z.boolean(),
  })
  .meta({ id: 'RunSummary' });
export type RunSummary = z.infer<typeof runSummarySchema>;
