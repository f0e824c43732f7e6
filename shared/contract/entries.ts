/** Entries of a record, and posting them. */
import { z } from 'zod';

import { machineEventSchema, SIGNED_EVENTS } from '@/flows/machine/events';
import { recordEntrySchema } from '@/shared/record/recordEntry';
import type { RecordEntry } from '@/shared/record/recordEntry';

import { entryIdSchema, seqSchema } from './ids';
import { headSchema } from './runSummary';

/** One entry as the server holds it. */
export const entrySchema = recordEntrySchema.meta({ id: 'Entry' });
export type Entry = RecordEntry;

/** The last millisecond that has a four-figure year. */
const LAST_TIME_MS = 253_402_300_799_999;

/** An event as a device sends it: not one of those that only the server may bring in, and at a time that can be written down. */
const sentEventSchema = machineEventSchema
  .refine((event) => !SIGNED_EVENTS.includes(event.type), { path: ['type'], message: 'is signed by its person and does not come from this device' })
  .refine((event) => event.at <= LAST_TIME_MS, { path: ['at'], message: 'is not a time' })
  .refine((event) => event.monotonic <= Number.MAX_SAFE_INTEGER, { path: ['monotonic'], message: 'is not a time' });

/** What the restorer's device sends for one event of the machine; the time is the event's own `at` and `monotonic`. */
export const sentEntrySchema = z.strictObject({ id: entryIdSchema, seq: seqSchema, event: sentEventSchema }).meta({ id: 'SentEntry' });
export type SentEntry = z.infer<typeof sentEntrySchema>;

export const postEntriesBody = z.strictObject({ entries: z.array(sentEntrySchema).min(1, 'there is no entry in the request').max(200) });

/** The entries as the server holds them now, in the order sent; the ones held before are answered as the first time. */
export const postedEntriesSchema = z.object({ entries: z.array(entrySchema), head: headSchema });

export const entriesQuery = z.strictObject({ after: z.coerce.number<unknown>().int().nonnegative().default(0) });
export const entriesSchema = z.object({ entries: z.array(entrySchema), head: headSchema });

/** The answer to a gap or a stale sequence, beside `code` and `say`: what the server has from the first place that differs. */
export const outOfSequenceDetails = z.object({ head: headSchema, missing: z.array(entrySchema) });
