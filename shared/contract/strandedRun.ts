/** Closing a run that was begun under rules which the server no longer runs. */
import { z } from 'zod';

import { entryIdSchema, sentence, seqSchema } from './ids';

/** What the senior’s signature says; it stands above the password and in the record. */
export const CLOSES = 'I close this run as stopped. I have seen to it that every source of the machine is out and that it was proved dead, and that what stays fitted is written down.';

export const closeStrandedBody = z.strictObject({
  id: entryIdSchema,
  /** place that the entry takes: one more than the head */
  seq: seqSchema,
  reason: sentence(500),
  /** asked again, since this signs */
  password: z.string().min(1, 'the password is missing').max(200),
});
