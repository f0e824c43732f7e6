/** The inputs of a sheet on one line, as a person reads them. */
import type { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { FieldInfo } from '@/shared/workings/sheet';
import { fieldsOf } from '@/shared/workings/sheet';

function valueWords(value: unknown, unit: FieldInfo['unit']): string {
  if (typeof value === 'number') return unit === null || unit === '' ? formatNumber(value, 6) : formatQuantity(value, unit, { digits: 6 });
  if (Array.isArray(value)) return value.length === 1 ? '1 row' : `${value.length} rows`;
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return typeof value === 'string' ? value.replaceAll('-', ' ') : 'none';
}

/**
 * `Mains volts 120 V, Lamp watts 100 W, …` in the order of the form; what was left empty or not given is left out.
 * @param values inputs in SI as a sheet takes them
 */
export function inputWords(inputs: z.ZodObject, values: Readonly<Record<string, unknown>>): string {
  return fieldsOf(inputs)
    .flatMap(([name, { title, unit }]) => {
      const value = values[name];
      return value === undefined || value === null || value === '' ? [] : [`${title} ${valueWords(value, unit)}`];
    })
    .join(', ');
}
