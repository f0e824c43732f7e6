/** One value that was published outside the project, with where it was read and what a sheet must give for it. */

/** What is said of every outside value. */
interface Published {
  /** Id of the sheet that must give it. */
  readonly sheet: string;
  /** The case in a few words; no two of a sheet are alike. */
  readonly what: string;
  /** Document, page or standard; or “common practice, no source”; with “from memory” where the document was not at hand. */
  readonly source: string;
  /** The figure as published, or the word that the sheet must say. */
  readonly expected: number | string;
  /** How far off a figure may be, in the unit of `expected`; half a unit of the last figure printed, unless the source says more. */
  readonly within?: number;
}

/** A value that the whole sheet gives for some inputs; nothing but data, so that it cannot go round the sheet. */
export interface SheetValue extends Published {
  readonly given: Readonly<Record<string, unknown>>;
  /** Path into the result, such as `volts` or `reading.says`. */
  readonly read: string;
  /** Multiplies what is read, where the source prints another unit than SI. */
  readonly times?: number;
}

/** A value that one function behind a sheet gives. */
export interface FunctionValue extends Published {
  readonly gives: () => number | string;
}

/** One published value. */
export type OutsideValue = SheetValue | FunctionValue;
