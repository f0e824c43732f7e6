/** The form of a bench calculation, read off its own schema, and what its fields say when they are read. */
import type { z } from 'zod';

import { formatNumber } from '@/shared/quantity/formatQuantity';
import { parseReading } from '@/shared/quantity/parseReading';
import { QUANTITIES } from '@/shared/quantity/quantities';
import type { Quantity } from '@/shared/quantity/quantities';
import type { Unit } from '@/shared/quantity/units';
import { PREFIXES, UNITS } from '@/shared/quantity/units';
import { fieldsOf } from '@/shared/workings/sheet';
import type { Sheet } from '@/shared/workings/sheet';

export interface SheetField {
  name: string;
  title: string;
  description: string;
  unit: Unit | null;
  /** may stay empty */
  optional: boolean;
  /** the named choices, or null for a number */
  choices: readonly string[] | null;
  signed: boolean;
}

/** What is typed, field by field; the address carries the same. */
export type SheetTexts = Readonly<Record<string, string>>;

/** The input of the sheet, and a sentence for each field that could not be read. */
export interface ReadSheet {
  inputs: Record<string, unknown>;
  errors: Record<string, string>;
  /** values as they were understood, such as `4.7 kΩ` for `4k7` */
  echoes: Record<string, string>;
}

/** The fields of a sheet in the order of its form. */
export function sheetFields(sheet: Pick<Sheet, 'inputs'>): SheetField[] {
  return fieldsOf(sheet.inputs).map(([name, { title, description, unit }]) => {
    const { core, optional } = unwrap(sheet.inputs.shape[name] as z.ZodType);
    const choices = core.type === 'enum' ? (core as unknown as z.ZodEnum).options.map(String) : null;
    const least = core.type === 'number' ? (core as z.ZodNumber).minValue : null;
    return { name, title, description, unit, optional, choices, signed: least === null || least < 0 };
  });
}

/** Looks through defaults and "may be null" to the schema of the value itself. */
function unwrap(schema: z.ZodType): { core: z.ZodType; optional: boolean } {
  let core = schema;
  let optional = false;
  while (core.type === 'default' || core.type === 'nullable' || core.type === 'optional') {
    if (core.type !== 'default') optional = true;
    core = (core as unknown as z.ZodDefault | z.ZodNullable | z.ZodOptional).unwrap() as z.ZodType;
  }
  return { core, optional };
}

/** What stands in the fields at first: the sheet's example with its defaults, written so that it reads back as itself. */
export function startTexts(sheet: Pick<Sheet, 'inputs' | 'example'>): Record<string, string> {
  const parsed = sheet.inputs.parse(sheet.example) as Record<string, unknown>;
  return Object.fromEntries(sheetFields(sheet).map((field) => [field.name, textOf(parsed[field.name], field.unit)]));
}

function textOf(value: unknown, unit: Unit | null): string {
  if (typeof value === 'string') return value;
  if (typeof value !== 'number') return '';
  if (unit === null) return formatNumber(value, 15).replace('−', '-');
  // the prefix that leaves the fewest figures, so that 0.0047 F stands as 4.7m
  const prefix =
    [...UNITS[unit].prefixes].reverse().find((p) => value !== 0 && Math.abs(value) >= Number(`1e${PREFIXES[p].exponent}`)) ?? '';
  const shifted = Number((value / Number(`1e${PREFIXES[prefix].exponent}`)).toPrecision(12));
  return `${String(shifted)}${prefix === 'μ' ? 'u' : prefix}`;
}

/** Reads the fields. What is asked back (`1,234`) is an error of its field; the sheet itself judges ranges. */
export function readSheet(fields: readonly SheetField[], texts: SheetTexts): ReadSheet {
  const read: ReadSheet = { inputs: {}, errors: {}, echoes: {} };
  for (const field of fields) {
    const text = (texts[field.name] ?? '').trim();
    if (field.choices !== null) {
      read.inputs[field.name] = text;
      continue;
    }
    if (text === '') {
      if (field.optional) read.inputs[field.name] = null;
      else read.errors[field.name] = `${field.title} is missing.`;
      continue;
    }
    const parsed = readNumber(field, text, texts);
    if ('say' in parsed) read.errors[field.name] = parsed.say;
    else {
      read.inputs[field.name] = parsed.value;
      read.echoes[field.name] = parsed.echo;
    }
  }
  return read;
}

/** The unit of a field without one of its own: that of the quantity chosen in the same form, where the field is read in it. */
export function unitOf(field: SheetField, texts: SheetTexts): Unit | null {
  if (field.unit !== null) return field.unit;
  const quantity = texts['quantity'];
  return quantity !== undefined && quantity in QUANTITIES && field.name !== 'counts' ? QUANTITIES[quantity as Quantity].unit : null;
}

function readNumber(field: SheetField, text: string, texts: SheetTexts): { value: number; echo: string } | { say: string } {
  const unit = unitOf(field, texts);
  // a plain number takes no prefix: percent is the one unit that has none either
  const parsed = parseReading(text, { unit: unit ?? '%', signed: field.signed });
  if (parsed.ok) {
    if (parsed.kind === 'over-range') return { say: `${field.title} must be a number.` };
    return { value: parsed.value, echo: unit === null ? '' : parsed.echo };
  }
  if (unit === null && parsed.why !== 'ambiguous')
    return {
      say: parsed.why === 'negative' ? `${field.title} has no minus sign.` : `“${text}” is not a plain number. Write it like 4.97.`,
    };
  return { say: parsed.say };
}
