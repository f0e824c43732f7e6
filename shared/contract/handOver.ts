/** Handing a run to another restorer: one offers and signs, the other takes and signs. */
import { z } from 'zod';

import { entryIdSchema, personIdSchema, sentence, seqSchema } from './ids';

/** What the signature of the one who gives says; it stands above the password and in the record. */
export const GIVES = 'I hand this run over. All that I have done at the bench is in its record. Every source is to be taken as live until the next restorer has proved it dead.';
/** What the signature of the one who takes says. */
export const TAKES = 'I take this run over. Before it goes on I open the bench, make it dead and prove it, and read back what is connected and what is fitted.';

const signed = {
  id: entryIdSchema,
  /** place that the entry takes: one more than the head */
  seq: seqSchema,
  /** asked again, since this signs */
  password: z.string().min(1, 'the password is missing').max(200),
};

export const handOverBody = z.strictObject({
  ...signed,
  /** a member who may lead runs */
  to: personIdSchema,
  /** word left for the next restorer */
  note: sentence(500).optional(),
});

export const takeOverBody = z.strictObject(signed);
