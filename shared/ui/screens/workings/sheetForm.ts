/** The form of a bench calculation, read off its own schema, and what its fields say when they are read. */
import { formatNumber } from '@/shared/quantity/formatQuantity';
import { parseReading } from '@/shared/quantity/parseReading';
import { QUANTITIES } from '@/shared/quantity/quantities';
import type { Quantity } from '@/shared/quantity/quantities';
import type { Unit } from '@/shared/quantity/units';
import { PREFIXES, UNITS } from '@/shared/quantity/units';
import type { SheetField, SheetPart, SheetTexts } from '@/shared/ui/screens/workings/sheetPart';
import { cellName, rowCount } from '@/shared/ui/screens/workings/sheetRows';
import type { FieldInfo, Sheet } from '@/shared/workings/sheet';
import { fieldsOf } from '@/shared/workings/sheet';
import type { z } from 'zod';

/** The input of the sheet, and a sentence for each field that could not be read. */
export interface ReadSheet {
  inputs: Record<string, unknown>;
  errors: Record<string, string>;
  /** values as they were understood, such as `4.7 kΩ` for `4k7` */
  echoes: Record<string, string>;
}

/** The fields of a sheet in the order of its form. */
export function sheetFields(sheet: Pick<Sheet, 'inputs'>): SheetPart[] {
  return fieldsOf(sheet.inputs).map(([name, info]): SheetPart => {
    const { title, description, rows } = info;
    if (rows === null) return fieldOf(name, info, sheet.inputs);
    const element = elementOf(sheet.inputs.shape[name] as z.ZodType);
    const { rowName, fewest, most, columns } = rows;
    return {
      kind: 'rows',
      name,
      title,
      description,
      rowName,
      fewest,
      most,
      columns: columns.map(([column, of]) => fieldOf(column, of, element)),
    };
  });
}

function fieldOf(name: string, { kind, title, description, unit, mayBeEmpty, choices }: FieldInfo, inside: z.ZodObject | null): SheetField {
  const core = inside === null ? null : unwrap(inside.shape[name] as z.ZodType);
  const least = core?.type === 'number' ? (core as z.ZodNumber).minValue : null;
  return {
    kind: kind === 'rows' ? 'text' : kind,
    name,
    title,
    description,
    unit,
    optional: mayBeEmpty,
    choices,
    signed: least === null || least < 0,
  };
}

/** Looks through defaults and "may be null" to the schema of the value itself. */
function unwrap(schema: z.ZodType): z.ZodType {
  let core = schema;
  while (core.type === 'default' || core.type === 'nullable' || core.type === 'optional')
    core = (core as unknown as z.ZodDefault | z.ZodNullable | z.ZodOptional).unwrap() as z.ZodType;
  return core;
}

function elementOf(schema: z.ZodType): z.ZodObject | null {
  const core = unwrap(schema);
  return core.type === 'array' ? ((core as unknown as z.ZodArray).element as z.ZodObject) : null;
}

/** What stands in the fields at first: the sheet's example with its defaults, written so that it reads back as itself. */
export function startTexts(sheet: Pick<Sheet, 'inputs' | 'example'>): Record<string, string> {
  return textsOf(sheet, sheet.inputs.parse(sheet.example) as Record<string, unknown>);
}

/** Inputs in SI as they would be typed. Only what is there; a list comes whole. */
export function textsOf(sheet: Pick<Sheet, 'inputs'>, values: Readonly<Record<string, unknown>>): Record<string, string> {
  const texts: Record<string, string> = {};
  for (const part of sheetFields(sheet)) {
    const value = values[part.name];
    if (value === undefined) continue;
    if (part.kind !== 'rows') texts[part.name] = textOf(value, part.unit);
    else if (Array.isArray(value)) {
      texts[part.name] = String(value.length);
      (value as Record<string, unknown>[]).forEach((row, at) => {
        for (const column of part.columns) texts[cellName(part, at, column)] = textOf(row[column.name], column.unit);
      });
    }
  }
  return texts;
}

function textOf(value: unknown, unit: Unit | null): string {
  if (typeof value === 'string') return value;
  if (typeof value !== 'number') return '';
  if (unit === null) return formatNumber(value, 15).replace('−', '-');
  // the prefix that leaves the fewest figures, so that 0.0047 F stands as 4.7m; 0.9 V stands as it is said
  if (Math.abs(value) >= 0.1 && Math.abs(value) < 1) return String(Number(value.toPrecision(12)));
  const prefix =
    [...UNITS[unit].prefixes].reverse().find((p) => value !== 0 && Math.abs(value) >= Number(`1e${PREFIXES[p].exponent}`)) ?? '';
  const shifted = Number((value / Number(`1e${PREFIXES[prefix].exponent}`)).toPrecision(12));
  // 10m of time is milliseconds or minutes: written out
  const suffix = unit === 's' && prefix === 'm' ? ' ms' : prefix === 'μ' ? 'u' : prefix;
  return `${String(shifted)}${suffix}`;
}

/** Reads the fields. What is asked back (`1,234`) is an error of its field; the sheet itself judges ranges. */
export function readSheet(parts: readonly SheetPart[], texts: SheetTexts): ReadSheet {
  const read: ReadSheet = { inputs: {}, errors: {}, echoes: {} };
  for (const part of parts) {
    if (part.kind !== 'rows') {
      readField(part, part.name, texts, read, read.inputs);
      continue;
    }
    read.inputs[part.name] = Array.from({ length: rowCount(part, texts) }, (_, at) => {
      const row: Record<string, unknown> = {};
      for (const column of part.columns) readField(column, cellName(part, at, column), texts, read, row);
      return row;
    });
  }
  return read;
}

function readField(field: SheetField, key: string, texts: SheetTexts, read: ReadSheet, into: Record<string, unknown>): void {
  const text = (texts[key] ?? '').trim();
  if (text === '') {
    if (field.optional) into[field.name] = null;
    else read.errors[key] = `${field.title} is missing.`;
    return;
  }
  if (field.kind !== 'number') {
    into[field.name] = text;
    return;
  }
  const parsed = readNumber(field, text, texts);
  if ('say' in parsed) read.errors[key] = parsed.say;
  else {
    into[field.name] = parsed.value;
    read.echoes[key] = parsed.echo;
  }
}

/** The unit of a field without one of its own: that of the quantity chosen in the same form, where the field is read in it. */
export function unitOf(field: SheetField, texts: SheetTexts): Unit | null {
  if (field.unit !== null || field.kind !== 'number') return field.unit;
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
