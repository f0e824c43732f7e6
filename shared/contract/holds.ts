/** Hold points that wait for a senior. */
import { z } from 'zod';

import { entrySchema } from './entries';
import { entryIdSchema, instantSchema, personIdSchema, sentence, seqSchema } from './ids';
import { bandSchema, headSchema, runSummarySchema } from './runSummary';

export const holdSchema = z
  .object({
    run: runSummarySchema,
    /** the `hold-asked` entry */
    entry: entryIdSchema,
    /** sequence that the answer has to take */
    nextSeq: seqSchema,
    step: z.object({ key: z.string(), title: z.string(), asks: z.string() }),
    /** what kind of power the countersign opens, in words */
    reason: z.string(),
    askedBy: personIdSchema,
    askedAt: instantSchema,
    band: bandSchema,
    /** bench facts in words, worst first */
    facts: z.array(z.object({ name: z.string(), value: z.string() })),
    /** the last readings before the hold, newest first */
    readings: z.array(entrySchema),
    /** false for the restorer of the run, who can never countersign it */
    mayAnswer: z.boolean(),
  })
  .meta({ id: 'Hold' });
export type Hold = z.infer<typeof holdSchema>;

export const holdsSchema = z.object({ holds: z.array(holdSchema) });

export const answerHoldBody = z
  .strictObject({
    id: entryIdSchema,
    /** `nextSeq` of the hold as it was read; anything that came between refuses the answer */
    seq: seqSchema,
    answer: z.enum(['given', 'refused']),
    reason: sentence(400).optional(),
    /** asked again, since this signs */
    password: z.string().min(1, 'the password is missing').max(200),
  })
  .refine((b) => b.answer === 'given' || b.reason !== undefined, { path: ['reason'], message: 'say why you refuse' });

/** A second person who is present signs in at the restorer's device, for live work above the limits. */
export const secondPersonBody = z.strictObject({
  id: entryIdSchema,
  seq: seqSchema,
  person: personIdSchema,
  /** the second person's own */
  password: z.string().min(1, 'the password is missing').max(200),
});

export const answeredHoldSchema = z.object({ entry: entrySchema, head: headSchema });
