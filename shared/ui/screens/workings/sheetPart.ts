/** The parts of a sheet's form: fields, and lists of rows of fields. */
import type { Unit } from '@/shared/quantity/units';

export interface SheetField {
  kind: 'number' | 'choice' | 'text';
  /** of the input, or of the column in a list */
  name: string;
  title: string;
  description: string;
  unit: Unit | null;
  /** may stay empty */
  optional: boolean;
  /** the named choices of a choice, else null */
  choices: readonly string[] | null;
  signed: boolean;
}

/** A list of alike rows. */
export interface SheetList {
  kind: 'rows';
  name: string;
  title: string;
  description: string;
  /** one row in a word or two */
  rowName: string;
  fewest: number;
  most: number;
  columns: readonly SheetField[];
}

export type SheetPart = SheetField | SheetList;

/** What is typed, field by field: `volts`, and `rails.0.volts` in a list, whose own name carries the number of its rows. The address carries the same. */
export type SheetTexts = Readonly<Record<string, string>>;
