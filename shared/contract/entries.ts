/** Entries of a record, and posting them. */
import { z } from 'zod';

import { entryIdSchema, hashSchema, personIdSchema, runIdSchema, seqSchema } from './ids';
import { headSchema } from './runSummary';

export const ENTRY_KINDS = [
  'opened', 'answer', 'reading', 'photo', 'part', 'tag', 'warning-read', 'energised', 'isolated', 'lapsed', 'hold-asked', 'hold-given', 'hold-refused', 'deviation',
  'paused', 'resumed', 'handed-over', 'taken-over', 'conflict', 'stopped', 'correction', 'closed', 'submitted', 'returned', 'reply', 'finding', 'accepted', 'addendum',
  'released', 'void',
] as const;

/** One entry as the server holds it: epoch milliseconds, hash made by the server on receipt. */
export const entrySchema = z
  .strictObject({
    id: entryIdSchema,
    run: runIdSchema,
    seq: seqSchema,
    at: z.number().int(),
    monotonic: z.number(),
    receivedAt: z.number().int(),
    actor: personIdSchema,
    kind: z.enum(ENTRY_KINDS),
    body: z.record(z.string(), z.unknown()),
    prev: hashSchema,
    hash: hashSchema,
  })
  .meta({ id: 'Entry' });
export type Entry = z.infer<typeof entrySchema>;

/** What the restorer's device sends for one event of the machine; the time is the event's own `at` and `monotonic`. */
export const sentEntrySchema = z
  .strictObject({
    id: entryIdSchema,
    seq: seqSchema,
    event: z.looseObject({ type: z.string(), at: z.number().int().nonnegative(), monotonic: z.number().nonnegative() }),
  })
  .meta({ id: 'SentEntry' });
export type SentEntry = z.infer<typeof sentEntrySchema>;

export const postEntriesBody = z.strictObject({ entries: z.array(sentEntrySchema).min(1, 'there is no entry in the request').max(200) });

/** The entries as the server holds them now, in the order sent; the ones held before are answered as the first time. */
export const postedEntriesSchema = z.object({ entries: z.array(entrySchema), head: headSchema });

export const entriesQuery = z.strictObject({ after: z.coerce.number<unknown>().int().nonnegative().default(0) });
export const entriesSchema = z.object({ entries: z.array(entrySchema), head: headSchema });

/** The answer to a gap or a stale sequence, beside `code` and `say`: what the server has from the first place that differs. */
export const outOfSequenceDetails = z.object({ head: headSchema, missing: z.array(entrySchema) });
