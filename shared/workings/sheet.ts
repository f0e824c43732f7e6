/** The common form of every bench calculation: typed inputs in SI, one answer line, its formula with the numbers in it. */
import { z } from 'zod';

import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Unit } from '@/shared/quantity/units';
import { UNITS } from '@/shared/quantity/units';
import type { Circuit, Plot } from '@/shared/workings/plot';

/** How an input is entered: `numberField`, `choiceField`, `textField` and `rowsField` make one each. */
export type FieldKind = 'number' | 'choice' | 'text' | 'rows';

/** What a form needs to know about a list of rows; its columns are inputs like any other. */
export interface RowsInfo {
  /** One row in a word or two, such as `rail`; a form writes “rail 2” and “add a rail” with it. */
  readonly rowName: string;
  readonly fewest: number;
  readonly most: number;
  readonly columns: readonly (readonly [string, FieldInfo])[];
}

/** What a form needs to know about one input besides its schema; read it with `fieldsOf`. */
export interface FieldInfo {
  readonly kind: FieldKind;
  readonly title: string;
  readonly description: string;
  /** Null for a plain number or a choice. */
  readonly unit: Unit | null;
  /** The choices of a choice, else null. */
  readonly choices: readonly string[] | null;
  /** The rows of a list, else null. */
  readonly rows: RowsInfo | null;
  /** Whether it may be left empty (null). */
  readonly mayBeEmpty: boolean;
  /** What stands in when it is not given; undefined where it must be given. */
  readonly fallback: unknown;
}

/** A worked answer. Nothing in `result` is rounded. */
export interface SheetAnswer<Result> {
  readonly ok: true;
  readonly result: Result;
  /** The answer in one big line. */
  readonly headline: string;
  /** The formulas with the numbers in them, one a line. */
  readonly formula: readonly string[];
  readonly caution?: string;
  readonly validity: string;
  readonly source: string;
  /** The answer drawn, where a curve says more than the line. */
  readonly plot?: Plot;
  /** The circuit with its volts and amps. */
  readonly drawing?: Circuit;
}

/**
 * A refused input: the field that it belongs to and a sentence for the person who typed it. A cell of a list is named
 * `list.row.column`, rows counted from zero (`rails.1.volts`); a whole row is `rails.1`. The sentence counts from one.
 */
export interface SheetRefusal {
  readonly ok: false;
  readonly field: string;
  readonly say: string;
}

/** One bench calculation. */
export interface Sheet<Inputs extends z.ZodObject = z.ZodObject, Result = unknown> {
  readonly id: string;
  readonly title: string;
  /** The question that it answers, in one sentence. */
  readonly question: string;
  readonly inputs: Inputs;
  /** The form of `result`, for the schemas in docs and whoever reads the command line's output. */
  readonly output: z.ZodType<Result>;
  /** The formulas in symbols, one a line. */
  readonly law: readonly string[];
  readonly validity: string;
  readonly source: string;
  readonly caution: string;
  /** What its numbers were held against outside the project, one a line. */
  readonly checks: readonly string[];
  /** A sensible set of inputs, for the first look at the sheet and for its page. */
  readonly example: z.input<Inputs>;
  compute(inputs: z.output<Inputs>): SheetAnswer<Result> | SheetRefusal;
}

/** Keeps the exact types of a sheet while checking that it has the common form. */
export function defineSheet<Inputs extends z.ZodObject, Result>(sheet: Sheet<Inputs, Result>): Sheet<Inputs, Result> {
  return sheet;
}

interface NumberFieldOptions {
  readonly title: string;
  readonly description: string;
  readonly unit: Unit | null;
  readonly min: number;
  readonly max: number;
  /** True when `min` itself is refused, as with "more than zero". */
  readonly aboveMin?: boolean;
}

const show = (value: number, unit: Unit | null): string => (unit === null ? String(value) : formatQuantity(value, unit, { digits: 6 }));

/**
 * A number in SI with its bounds said in a sentence.
 * @returns a schema whose every refusal names the field and what it takes
 */
export function numberField(options: NumberFieldOptions): z.ZodNumber {
  const { title, description, unit, min, max, aboveMin = false } = options;
  const inUnit = unit === null ? '' : ` in ${UNITS[unit].plural}`;
  const low = aboveMin ? `${title} must be more than ${show(min, unit)}.` : `${title} must be ${show(min, unit)} or more.`;
  const number = z.number({
    error: (issue) => (issue.input === undefined ? `${title} is missing.` : `${title} must be a number${inUnit}.`),
  });
  const bounded = aboveMin ? number.gt(min, low) : number.gte(min, low);
  return bounded.lte(max, `${title} must be ${show(max, unit)} or less.`).meta({ title, description, unit });
}

/** One of a few named choices, with a sentence that lists them. */
export function choiceField<const Choice extends readonly [string, ...string[]]>(
  title: string,
  description: string,
  choices: Choice,
): z.ZodEnum<{ [K in Choice[number]]: K }> {
  return z.enum(choices, `${title} must be one of: ${choices.join(', ')}.`).meta({ title, description, unit: null });
}

/** A short text, such as the name by which other rows speak of this one; spaces at its ends are dropped. */
export function textField(title: string, description: string, most = 60): z.ZodString {
  return z
    .string({ error: (issue) => (issue.input === undefined ? `${title} is missing.` : `${title} must be a text.`) })
    .trim()
    .min(1, `${title} is missing.`)
    .max(most, `${title} must be ${String(most)} characters or fewer.`)
    .meta({ title, description, unit: null });
}

interface RowsFieldOptions<Row extends z.ZodObject> {
  readonly title: string;
  readonly description: string;
  /** One row in a word or two, without article: `rail`, `capacitor`, `reading`. */
  readonly rowName: string;
  /** A strict object of `numberField`, `choiceField` and `textField`, each with `.nullable().default(…)` where it may stay empty. */
  readonly row: Row;
  readonly fewest: number;
  readonly most: number;
}

/**
 * A list of alike rows: rails, capacitors, the readings of a logged curve. In JSON it is an array of objects, in a form a
 * table whose columns `fieldsOf` describes under `rows.columns`; a list in a list is not made. A refused cell is named
 * `list.row.column` (see SheetRefusal), also where the sheet itself refuses it; `runSheet` puts “Rail 2: ” before a
 * sentence of a column's own schema.
 */
export function rowsField<Row extends z.ZodObject>(options: RowsFieldOptions<Row>): z.ZodArray<Row> {
  const { title, description, rowName, row, fewest, most } = options;
  return z
    .array(row, { error: (issue) => (issue.input === undefined ? `${title} is missing.` : `${title} must be a list.`) })
    .min(fewest, `${title} must be a list of ${String(fewest)} or more.`)
    .max(most, `${title} must be a list of ${String(most)} or fewer.`)
    .meta({ title, description, unit: null, rowName, fewest, most });
}

function rowsInfo(schema: z.core.$ZodType, meta: Readonly<Record<string, unknown>>): RowsInfo | null {
  if (!(schema instanceof z.ZodArray) || !(schema.element instanceof z.ZodObject)) return null;
  const count = (value: unknown, fallback: number): number => (typeof value === 'number' ? value : fallback);
  const rowName = typeof meta['rowName'] === 'string' ? meta['rowName'] : 'row';
  return { rowName, fewest: count(meta['fewest'], 0), most: count(meta['most'], Infinity), columns: fieldsOf(schema.element) };
}

function kindOf(schema: z.core.$ZodType): FieldKind {
  if (schema instanceof z.ZodEnum) return 'choice';
  if (schema instanceof z.ZodArray) return 'rows';
  return schema instanceof z.ZodString ? 'text' : 'number';
}

function fieldInfo(name: string, schema: z.core.$ZodType): FieldInfo {
  let [inner, mayBeEmpty, fallback]: [z.core.$ZodType, boolean, unknown] = [schema, false, undefined];
  for (;;) {
    if (inner instanceof z.ZodDefault) {
      fallback = inner.def.defaultValue;
      inner = inner.def.innerType;
    } else if (inner instanceof z.ZodNullable) {
      mayBeEmpty = true;
      inner = inner.def.innerType;
    } else break;
  }
  const meta = z.globalRegistry.get(inner as z.ZodType) ?? {};
  const unit = typeof meta['unit'] === 'string' && meta['unit'] in UNITS ? (meta['unit'] as Unit) : null;
  const choices = inner instanceof z.ZodEnum ? inner.options.map(String) : null;
  const words = { title: meta.title ?? name, description: meta.description ?? '' };
  return { kind: kindOf(inner), ...words, unit, choices, rows: rowsInfo(inner, meta), mayBeEmpty, fallback };
}

/** What a form needs to know about every input of a sheet, in the order of the form. */
export function fieldsOf(inputs: z.ZodObject): readonly (readonly [string, FieldInfo])[] {
  return Object.entries(inputs.shape).map(([name, schema]) => [name, fieldInfo(name, schema)] as const);
}

/**
 * Parses raw inputs and works the sheet out.
 * @param input anything: a form's values, a query string's, a JSON file's
 * @returns the answer, or the first field that is wrong with a sentence
 */
export function runSheet<Inputs extends z.ZodObject, Result>(
  sheet: Sheet<Inputs, Result>,
  input: unknown,
): SheetAnswer<Result> | SheetRefusal {
  const parsed = sheet.inputs.safeParse(input);
  if (parsed.success) return sheet.compute(parsed.data);
  const [issue] = parsed.error.issues;
  return issue === undefined ? { ok: false, field: '', say: 'The inputs cannot be read.' } : refusalOf(sheet, issue);
}

function refusalOf(sheet: Pick<Sheet, 'title' | 'inputs'>, issue: z.core.$ZodIssue): SheetRefusal {
  const path = issue.path.map(String);
  const [list = '', row] = path;
  const rows = fieldsOf(sheet.inputs).find(([name]) => name === list)?.[1].rows ?? null;
  const where = rows === null || row === undefined ? null : `${rows.rowName} ${String(Number(row) + 1)}`;
  const Where = where === null ? '' : `${where.charAt(0).toUpperCase()}${where.slice(1)}`;
  if (issue.code === 'unrecognized_keys') {
    const [key = ''] = issue.keys;
    return { ok: false, field: [...path, key].join('.'), say: `${where === null ? sheet.title : Where} has no input “${key}”.` };
  }
  const field = path.join('.');
  if (field === '') return { ok: false, field, say: `${sheet.title} takes an object with its inputs.` };
  if (where === null) return { ok: false, field, say: issue.message };
  return { ok: false, field, say: path.length === 2 ? `${Where} must be a row with its columns.` : `${Where}: ${issue.message}` };
}
