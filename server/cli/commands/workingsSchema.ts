/** The form of what goes into a sheet and of what comes out, as JSON Schema (2020-12). */
import { z } from 'zod';

import type { AnySheet } from '@/shared/workings/list';

const drawn = z.looseObject({ title: z.string(), words: z.string() });

/** What `workings SHEET INPUT.json` takes. Bounds and choices are in it; what hangs together is checked by the sheet. */
export function inputSchemaOf(sheet: AnySheet): Record<string, unknown> {
  return { title: `${sheet.title}: inputs, in SI units`, ...z.toJSONSchema(sheet.inputs, { io: 'input' }) };
}

/** What `workings SHEET INPUT.json` prints. */
export function outputSchemaOf(sheet: AnySheet): Record<string, unknown> {
  const form = z.strictObject({
    sheet: z.literal(sheet.id),
    headline: z.string(),
    result: sheet.output,
    formula: z.array(z.string()),
    caution: z.string().optional(),
    validity: z.string(),
    source: z.string(),
    plot: drawn.optional(),
    drawing: drawn.optional(),
  });
  return { title: `${sheet.title}: answer, in SI units`, ...z.toJSONSchema(form, { io: 'output' }) };
}
