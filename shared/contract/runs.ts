/** Runs: starting one, and the whole bundle that a device needs to go on without the network. */
import { z } from 'zod';

import { idSchema } from '@/flows/document/ids';

import { fittedThing, profileDocument, settingsDocument, treeDocument } from './documents';
import { entrySchema } from './entries';
import { hashSchema, machineIdSchema, personIdSchema, runIdSchema, treeIdSchema, versionSchema } from './ids';
import { instrumentSchema } from './instruments';
import { personSchema } from './people';
import { headSchema, runSummarySchema } from './runSummary';

export const runsQuery = z.strictObject({
  /** `1` for the runs that the person signed in leads or is offered */
  mine: z.enum(['0', '1']).optional(),
  /** `1` for runs that are still open */
  open: z.enum(['0', '1']).optional(),
});

export const runsSchema = z.object({ runs: z.array(runSummarySchema) });

export const startRunBody = z.strictObject({
  id: runIdSchema,
  machine: machineIdSchema,
  tree: treeIdSchema,
  version: versionSchema,
  /** milliseconds of the device's clock that never goes back */
  monotonic: z.int().nonnegative(),
});

/** What a run starts from; with the entries it gives the state again, at any time and on any side. */
export const startSchema = z
  .object({
    run: runIdSchema,
    restorer: personIdSchema,
    restorerIsSenior: z.boolean(),
    /** epoch milliseconds */
    at: z.number(),
    release: z.boolean(),
    fitted: z.array(fittedThing),
    killers: z.array(z.object({ part: idSchema, killer: idSchema })),
  })
  .meta({ id: 'RunStart' });
export type RunStart = z.infer<typeof startSchema>;

export const pinsSchema = z
  .object({ treeHash: hashSchema, profileHash: hashSchema, profileRevision: z.number().int(), settingsHash: hashSchema, engine: z.string() })
  .meta({ id: 'RunPins' });

export const runBundleSchema = z
  .object({
    run: runSummarySchema,
    pins: pinsSchema,
    start: startSchema,
    tree: treeDocument,
    callees: z.array(treeDocument),
    profile: profileDocument,
    settings: settingsDocument,
    instruments: z.array(instrumentSchema),
    people: z.array(personSchema),
    entries: z.array(entrySchema),
    head: headSchema,
  })
  .meta({ id: 'RunBundle' });
export type RunBundle = z.infer<typeof runBundleSchema>;
