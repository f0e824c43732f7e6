/** The form of what goes into a sheet and of what comes out, as JSON Schema (2020-12). */
import { z } from 'zod';

import type { AnySheet } from '@/shared/workings/list';
import { runSheet } from '@/shared/workings/sheet';

const drawn = z.looseObject({ title: z.string(), words: z.string() });

/** A sheet that states no form of its result has at least the keys that its own example gives. */
function resultOf(sheet: AnySheet): z.ZodType {
  if (sheet.output !== undefined) return sheet.output;
  const answer = runSheet(sheet, sheet.example);
  const result = answer.ok ? (answer.result as Readonly<Record<string, unknown>>) : {};
  return z.looseObject(Object.fromEntries(Object.keys(result).map((key) => [key, z.unknown()])));
}

/** What `workings SHEET INPUT.json` takes. Bounds and choices are in it; what hangs together is checked by the sheet. */
export function inputSchemaOf(sheet: AnySheet): Record<string, unknown> {
  return { title: `${sheet.title}: inputs, in SI units`, ...z.toJSONSchema(sheet.inputs, { io: 'input' }) };
}

/** What `workings SHEET INPUT.json` prints. */
export function outputSchemaOf(sheet: AnySheet): Record<string, unknown> {
  const form = z.strictObject({
    sheet: z.literal(sheet.id),
    headline: z.string(),
    result: resultOf(sheet),
    formula: z.array(z.string()),
    caution: z.string().optional(),
    validity: z.string(),
    source: z.string(),
    plot: drawn.optional(),
    drawing: drawn.optional(),
  });
  return { title: `${sheet.title}: answer, in SI units`, ...z.toJSONSchema(form, { io: 'output' }) };
}
