/** Any inputs that the form of a sheet admits, for properties that every sheet must have. */
import * as fc from 'fast-check';
import { z } from 'zod';

/** Whatever lies between two bounds: the bounds, nothing, and every size in between, not only the largest. */
function anyNumber(schema: z.ZodNumber): fc.Arbitrary<number> {
  const [least, most] = [schema.minValue ?? -1e12, schema.maxValue ?? 1e12];
  const admits = (value: number): boolean => schema.safeParse(value).success;
  const size = (from: number, to: number): fc.Arbitrary<number> =>
    fc.double({ min: Math.log10(from), max: Math.log10(to), noNaN: true }).map((power) => 10 ** power);
  const tiny = 1e-9;
  const ways: fc.Arbitrary<number>[] = [
    fc.constantFrom(least, most, 0, 1).filter(admits),
    fc.double({ min: least, max: most, noNaN: true }),
  ];
  if (most > 0) ways.push(size(Math.max(least, Math.min(tiny, most / 10)), most));
  if (least < 0) ways.push(size(tiny, -least).map((value) => -value));
  // Counts and the like are whole where their schema or their sheet says so.
  ways.push(
    fc.integer({
      min: Math.ceil(Math.max(least, -100)),
      max: Math.floor(Math.min(most, 100)) === 0 ? 1 : Math.max(Math.ceil(least), Math.floor(Math.min(most, 100))),
    }),
  );
  // Nothing is read or entered that is smaller than this; at the end of the doubles every quotient runs over.
  return fc
    .oneof(...ways)
    .map((value) => (Math.abs(value) < 1e-30 ? 0 : value))
    .filter(admits);
}

/** Any value that a schema of a field admits. */
export function anyOf(schema: z.core.$ZodType): fc.Arbitrary<unknown> {
  if (schema instanceof z.ZodDefault) return fc.oneof(fc.constant(undefined), anyOf(schema.def.innerType));
  if (schema instanceof z.ZodNullable) return fc.oneof(fc.constant(null), anyOf(schema.def.innerType));
  if (schema instanceof z.ZodEnum) return fc.constantFrom(...(schema.options as unknown[]));
  if (schema instanceof z.ZodLiteral) return fc.constantFrom(...schema.values);
  if (schema instanceof z.ZodUnion) return fc.oneof(...schema.options.map((option) => anyOf(option as z.core.$ZodType)));
  if (schema instanceof z.ZodArray) {
    const { fewest = 0, most = 4 } = (z.globalRegistry.get(schema as z.ZodType) ?? {}) as { fewest?: number; most?: number };
    return fc.array(anyOf(schema.element), { minLength: fewest, maxLength: Math.max(fewest, Math.min(most, 4)) });
  }
  if (schema instanceof z.ZodObject)
    return fc.record(
      Object.fromEntries(Object.entries(schema.shape as Record<string, z.core.$ZodType>).map(([name, field]) => [name, anyOf(field)])),
    );
  if (schema instanceof z.ZodString) return fc.constantFrom('a', 'b', 'c', 'n1', 'n2');
  if (schema instanceof z.ZodNumber) return anyNumber(schema);
  throw new Error(`No values are known for a schema of ${schema.constructor.name}.`);
}

/** Changes one or two inputs of an example: most of what a form admits at random is refused at once, and says little. */
export function nearExample(inputs: z.ZodObject, example: Readonly<Record<string, unknown>>): fc.Arbitrary<Record<string, unknown>> {
  const names = Object.keys(inputs.shape);
  return fc
    .subarray(names, { minLength: 1, maxLength: Math.min(3, names.length) })
    .chain((changed) =>
      fc
        .record(Object.fromEntries(changed.map((name) => [name, anyOf(inputs.shape[name] as z.core.$ZodType)])))
        .map((values) => ({ ...example, ...values })),
    );
}
