/** Instruments of the workshop with their accuracy and calibration. */
import { z } from 'zod';

import { QUANTITY_NAMES } from '@/flows/document/ids';

import { instrumentIdSchema } from './ids';

/** Accuracy as makers state it: ± (percent of reading + counts × resolution), valid up to full scale. */
export const instrumentRangeSchema = z.strictObject({
  quantity: z.enum(QUANTITY_NAMES),
  /** full scale in the quantity's SI unit */
  fullScale: z.number().positive(),
  /** one count, in the quantity's SI unit */
  resolution: z.number().positive(),
  percent: z.number().nonnegative(),
  counts: z.number().int().nonnegative(),
});
export type InstrumentRange = z.infer<typeof instrumentRangeSchema>;

export const INSTRUMENT_KINDS = ['multimeter', 'two-pole-tester', 'low-ohm-meter', 'insulation-tester', 'earth-tester', 'oscilloscope', 'thermometer'] as const;

export const instrumentSchema = z
  .object({
    id: instrumentIdSchema,
    /** the number on its sticker */
    tag: z.string(),
    name: z.string(),
    kind: z.enum(INSTRUMENT_KINDS),
    serial: z.string(),
    ranges: z.array(instrumentRangeSchema),
    /** measurement category of IEC 61010-2-030, or null where it has none */
    category: z.string().nullable(),
    twoPole: z.boolean(),
    /** last day on which it may be used, `YYYY-MM-DD` */
    calibratedUntil: z.iso.date(),
    outOfDate: z.boolean(),
  })
  .meta({ id: 'Instrument' });
export type Instrument = z.infer<typeof instrumentSchema>;

export const instrumentsSchema = z.object({ instruments: z.array(instrumentSchema) });
