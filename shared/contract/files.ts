/** Photos and papers as they cross the wire. */
import { z } from 'zod';

import { hashSchema, runIdSchema } from './ids';

/** The most bytes of one upload. */
export const FILE_LIMIT_BYTES = 25_000_000;

/** For what a file is sent. A file of a run is read by those who may read that run. */
export const fileQuery = z.strictObject({
  run: runIdSchema.optional().describe('the run for whose record the photo is'),
  as: z.enum(['photo', 'paper']).default('photo').describe('a paper may be a PDF'),
});

export const keptFileSchema = z
  .object({
    hash: hashSchema.describe('SHA-256 of what is kept; a plain JPEG is kept as it was sent'),
    media: z.enum(['image/jpeg', 'application/pdf']),
    bytes: z.number().int().positive(),
    width: z.number().int().positive().nullable(),
    height: z.number().int().positive().nullable(),
  })
  .meta({ id: 'KeptFile' });

export type KeptFile = z.infer<typeof keptFileSchema>;

export const fileParams = z.strictObject({ hash: hashSchema });
export const fileSizeQuery = z.strictObject({ size: z.enum(['full', 'small']).default('full').describe('small: at most 480 pixels, for lists') });
