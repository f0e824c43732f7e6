/** Machines, their profiles, releases and what stays fitted on them. */
import { z } from 'zod';

import { idSchema } from '@/flows/document/ids';

import { fittedThing, profileDocument } from './documents';
import { hashSchema, instantSchema, machineIdSchema, personIdSchema, releaseIdSchema, runIdSchema } from './ids';
import { runSummarySchema } from './runSummary';

export const releaseSchema = z
  .object({
    id: releaseIdSchema,
    run: runIdSchema,
    givenAt: instantSchema,
    givenBy: personIdSchema,
    voidedAt: instantSchema.nullable(),
    voidedByRun: runIdSchema.nullable(),
    voidReason: z.string().nullable(),
    /** not void, and not older than the workshop allows */
    valid: z.boolean(),
  })
  .meta({ id: 'Release' });
export type Release = z.infer<typeof releaseSchema>;

/** What a run has left on the machine and starts its next run. */
export const machineTagSchema = z
  .discriminatedUnion('is', [
    z.object({ is: z.literal('fitted'), thing: fittedThing, since: instantSchema, run: runIdSchema }),
    z.object({ is: z.literal('killer'), part: idSchema, killer: idSchema, since: instantSchema, run: runIdSchema }),
  ])
  .meta({ id: 'MachineTag' });
export type MachineTag = z.infer<typeof machineTagSchema>;

export const machineSchema = z
  .object({
    id: machineIdSchema,
    name: z.string(),
    serial: z.string(),
    machineClass: z.string(),
    revision: z.number().int(),
    profileHash: hashSchema,
    openRun: runIdSchema.nullable(),
    release: releaseSchema.nullable(),
    tags: z.number().int(),
  })
  .meta({ id: 'Machine' });
export type Machine = z.infer<typeof machineSchema>;

export const machinesSchema = z.object({ machines: z.array(machineSchema) });

export const dossierSchema = z.object({
  machine: machineSchema,
  profile: z.object({ revision: z.number().int(), hash: hashSchema, document: profileDocument }),
  runs: z.array(runSummarySchema),
  releases: z.array(releaseSchema),
  staysFitted: z.array(machineTagSchema),
});
