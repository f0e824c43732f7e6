/** Reads what stands behind the figures of an entry: prefix, unit, kind of current. */
import type { Prefix, Unit } from '@/shared/quantity/units';
import { UNITS } from '@/shared/quantity/units';

/** One way to understand a suffix. */
export interface SuffixMeaning {
  /** Null when only a prefix or nothing was typed: the unit that was asked for is meant. */
  readonly unit: Unit | null;
  readonly prefix: Prefix;
  /** Multiplies the SI value where the unit is a non-SI one (minutes, hours). */
  readonly factor: number;
  readonly current: 'ac' | 'dc' | null;
}

const PREFIX_SPELLINGS: readonly (readonly [string, Prefix])[] = [
  ['', ''],
  ['p', 'p'],
  ['n', 'n'],
  ['u', 'μ'],
  ['μ', 'μ'],
  ['m', 'm'],
  ['k', 'k'],
  ['K', 'k'],
  ['M', 'M'],
  ['G', 'G'],
  ['pico', 'p'],
  ['nano', 'n'],
  ['micro', 'μ'],
  ['milli', 'm'],
  ['kilo', 'k'],
  ['mega', 'M'],
  ['meg', 'M'],
  ['giga', 'G'],
];

/** Minutes and hours are taken for seconds; a lone `m` never is. */
const TIME_SPELLINGS: Readonly<Record<string, number>> = {
  min: 60,
  mins: 60,
  minute: 60,
  minutes: 60,
  h: 3600,
  hr: 3600,
  hrs: 3600,
  hour: 3600,
  hours: 3600,
};

/** Other lengths are taken for metres; foot and inch are exact since the international yard of 1959. */
const LENGTH_SPELLINGS: Readonly<Record<string, number>> = {
  mm: 0.001,
  cm: 0.01,
  ft: 0.3048,
  foot: 0.3048,
  feet: 0.3048,
  in: 0.0254,
  inch: 0.0254,
  inches: 0.0254,
};

/** Markings of old capacitors: MFD is microfarads, MMF and UUF are picofarads. Common practice, no source. */
const OLD_CAPACITOR_SPELLINGS: Readonly<Record<string, Prefix>> = {
  mfd: 'μ',
  ufd: 'μ',
  μfd: 'μ',
  mmf: 'p',
  mmfd: 'p',
  uuf: 'p',
  μμf: 'p',
  uufd: 'p',
  μμfd: 'p',
};

function isUnit(text: string, unit: Unit): boolean {
  const info = UNITS[unit];
  return info.exactCase.includes(text) || info.anyCase.includes(text.toLowerCase());
}

/** The letter of an RKM code (4k7, 2u2) as a prefix, or null when it is none. */
export function prefixOfLetter(letter: string): Prefix | null {
  const found = PREFIX_SPELLINGS.find(([spelling]) => spelling !== '' && spelling === letter);
  return found === undefined ? null : found[1];
}

function meaningOf(suffix: string, unit: Unit, current: 'ac' | 'dc' | null): SuffixMeaning | null {
  if (unit === 's') {
    const factor = TIME_SPELLINGS[suffix.toLowerCase()];
    // A capital H is the henry.
    if (factor !== undefined && suffix !== 'H') return { unit, prefix: '', factor, current };
  }
  if (unit === 'm') {
    const factor = LENGTH_SPELLINGS[suffix.toLowerCase()];
    if (factor !== undefined && !suffix.startsWith('M')) return { unit, prefix: '', factor, current };
  }
  if (unit === 'F') {
    const prefix = OLD_CAPACITOR_SPELLINGS[suffix.toLowerCase()];
    if (prefix !== undefined) return { unit, prefix, factor: 1, current };
  }
  for (const [spelling, prefix] of PREFIX_SPELLINGS) {
    if (!suffix.startsWith(spelling)) continue;
    const rest = suffix.slice(spelling.length).trimStart();
    if (rest !== '' && isUnit(rest, unit)) return { unit, prefix, factor: 1, current };
  }
  return null;
}

/**
 * Understands the text behind the figures, the unit that was asked for first.
 * @param suffix trimmed, with μ U+03BC and Ω U+03A9
 * @returns null when nothing known is written there
 */
export function readSuffix(suffix: string, wanted: Unit): SuffixMeaning | null {
  if (suffix === '') return { unit: null, prefix: '', factor: 1, current: null };
  const lone = prefixOfLetter(suffix);
  const others = (Object.keys(UNITS) as Unit[]).filter((unit) => unit !== wanted);
  const direct = meaningOf(suffix, wanted, null);
  if (direct !== null) return direct;
  if (lone !== null) return { unit: null, prefix: lone, factor: 1, current: null };
  const marked = /^(.*?)[\s.]*(ac|dc|rms|~|⎓)$/i.exec(suffix);
  if (marked !== null) {
    const [, before = '', mark = ''] = marked;
    const current = mark.toLowerCase() === 'dc' || mark === '⎓' ? 'dc' : 'ac';
    if (before === '') return wanted === 'V' || wanted === 'A' ? { unit: null, prefix: '', factor: 1, current } : null;
    for (const unit of ['V', 'A'] as const) {
      const meaning = meaningOf(before, unit, current);
      if (meaning !== null) return meaning;
    }
  }
  for (const unit of others) {
    const meaning = meaningOf(suffix, unit, null);
    if (meaning !== null) return meaning;
  }
  return null;
}
