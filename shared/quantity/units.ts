/** The units that readings and workings use: how each is printed, spoken, spelled on entry and scaled. */

/** SI prefixes that the product prints and reads, smallest first; the empty one is the unit itself. */
export type Prefix = 'p' | 'n' | 'μ' | 'm' | '' | 'k' | 'M' | 'G';

/** Power of ten and spoken word of each prefix (BIPM SI Brochure, 9th edition, table 7). */
export const PREFIXES: Readonly<Record<Prefix, { readonly exponent: number; readonly word: string }>> = {
  p: { exponent: -12, word: 'pico' },
  n: { exponent: -9, word: 'nano' },
  μ: { exponent: -6, word: 'micro' },
  m: { exponent: -3, word: 'milli' },
  '': { exponent: 0, word: '' },
  k: { exponent: 3, word: 'kilo' },
  M: { exponent: 6, word: 'mega' },
  G: { exponent: 9, word: 'giga' },
};

/** Printed symbols of the units, always with Ω U+03A9; the empty one is a plain number. */
export type Unit = '' | 'V' | 'A' | 'Ω' | 'F' | 'W' | 'VA' | 'J' | 'C' | 'Hz' | 'H' | 's' | '°C' | '%' | 'm' | 'mm²' | 'A²s';

/** What is known about one unit. */
export interface UnitInfo {
  readonly singular: string;
  readonly plural: string;
  /** Prefixes that make sense for it, smallest first. */
  readonly prefixes: readonly Prefix[];
  /** Spellings taken on entry; what stands in `exactCase` is compared letter for letter, the rest without case. */
  readonly exactCase: readonly string[];
  readonly anyCase: readonly string[];
  /** Letter that may stand in place of the decimal mark, as in 4R7 or 3V3 (IEC 60062 for R). */
  readonly pointLetter: string | null;
  /** Size above which a reading is taken for a slip of the finger. */
  readonly absurdAbove: number;
}

/** Every unit by its printed symbol. The absurd limits are bench sense: common practice, no source. */
export const UNITS: Readonly<Record<Unit, UnitInfo>> = {
  V: {
    singular: 'volt',
    plural: 'volts',
    prefixes: ['n', 'μ', 'm', '', 'k'],
    exactCase: ['V', 'v'],
    anyCase: ['volt', 'volts'],
    pointLetter: 'V',
    absurdAbove: 100e3,
  },
  A: {
    singular: 'amp',
    plural: 'amps',
    prefixes: ['p', 'n', 'μ', 'm', '', 'k'],
    exactCase: ['A', 'a'],
    anyCase: ['amp', 'amps', 'ampere', 'amperes'],
    pointLetter: 'A',
    absurdAbove: 10e3,
  },
  Ω: {
    singular: 'ohm',
    plural: 'ohms',
    prefixes: ['μ', 'm', '', 'k', 'M', 'G'],
    exactCase: ['Ω', 'R', 'r'],
    anyCase: ['ohm', 'ohms'],
    pointLetter: 'R',
    absurdAbove: 1e12,
  },
  F: {
    singular: 'farad',
    plural: 'farads',
    prefixes: ['p', 'n', 'μ', 'm', ''],
    exactCase: ['F', 'f'],
    anyCase: ['farad', 'farads', 'fd'],
    pointLetter: 'F',
    absurdAbove: 10,
  },
  W: {
    singular: 'watt',
    plural: 'watts',
    prefixes: ['n', 'μ', 'm', '', 'k', 'M'],
    exactCase: ['W', 'w'],
    anyCase: ['watt', 'watts'],
    pointLetter: 'W',
    absurdAbove: 10e6,
  },
  VA: {
    singular: 'volt-amp',
    plural: 'volt-amps',
    prefixes: ['m', '', 'k', 'M'],
    exactCase: [],
    anyCase: ['va', 'voltamp', 'voltamps', 'volt-amp', 'volt-amps'],
    pointLetter: null,
    absurdAbove: 10e6,
  },
  J: {
    singular: 'joule',
    plural: 'joules',
    prefixes: ['n', 'μ', 'm', '', 'k', 'M'],
    exactCase: ['J', 'j'],
    anyCase: ['joule', 'joules'],
    pointLetter: null,
    absurdAbove: 1e9,
  },
  C: {
    singular: 'coulomb',
    plural: 'coulombs',
    prefixes: ['p', 'n', 'μ', 'm', ''],
    exactCase: ['C'],
    anyCase: ['coulomb', 'coulombs'],
    pointLetter: null,
    absurdAbove: 1e6,
  },
  Hz: {
    singular: 'hertz',
    plural: 'hertz',
    prefixes: ['m', '', 'k', 'M', 'G'],
    exactCase: [],
    anyCase: ['hz', 'hertz'],
    pointLetter: null,
    absurdAbove: 1e12,
  },
  H: {
    singular: 'henry',
    plural: 'henries',
    prefixes: ['n', 'μ', 'm', ''],
    exactCase: ['H'],
    anyCase: ['henry', 'henries', 'henrys'],
    pointLetter: 'H',
    absurdAbove: 10e3,
  },
  s: {
    singular: 'second',
    plural: 'seconds',
    prefixes: ['n', 'μ', 'm', ''],
    exactCase: ['s', 'S'],
    anyCase: ['sec', 'secs', 'second', 'seconds'],
    pointLetter: null,
    absurdAbove: 3.2e8,
  },
  '°C': {
    singular: 'degree Celsius',
    plural: 'degrees Celsius',
    prefixes: [''],
    exactCase: ['C', 'c'],
    anyCase: ['°c', 'degc', 'deg c', 'celsius', 'degrees celsius', 'degrees'],
    pointLetter: null,
    absurdAbove: 1500,
  },
  m: {
    singular: 'metre',
    plural: 'metres',
    // No milli: `350m` must be 350 metres on entry, and so a printed length never takes it.
    prefixes: ['', 'k'],
    exactCase: ['m'],
    anyCase: ['metre', 'metres', 'meter', 'meters'],
    pointLetter: null,
    absurdAbove: 100e3,
  },
  'mm²': {
    singular: 'square millimetre',
    plural: 'square millimetres',
    prefixes: [''],
    exactCase: [],
    anyCase: ['mm²', 'mm2', 'sqmm', 'sq mm', 'square millimetre', 'square millimetres'],
    pointLetter: null,
    absurdAbove: 10e3,
  },
  'A²s': {
    singular: 'amp-squared second',
    plural: 'amp-squared seconds',
    prefixes: ['μ', 'm', '', 'k', 'M'],
    exactCase: [],
    anyCase: ['a²s', 'a2s', 'a²·s'],
    pointLetter: null,
    absurdAbove: 1e9,
  },
  '': {
    singular: 'plain number',
    plural: 'plain numbers',
    prefixes: [''],
    exactCase: [],
    anyCase: [],
    pointLetter: null,
    absurdAbove: 1e12,
  },
  '%': {
    singular: 'percent',
    plural: 'percent',
    prefixes: [''],
    exactCase: ['%'],
    anyCase: ['percent', 'per cent'],
    pointLetter: null,
    absurdAbove: 1e6,
  },
};
