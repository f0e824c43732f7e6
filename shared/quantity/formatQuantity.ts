/** Prints a value with its unit the way that every screen, record and report prints it. */
import type { Prefix, Unit } from '@/shared/quantity/units';
import { PREFIXES, UNITS } from '@/shared/quantity/units';

/** U+2212, the sign that print uses; a hyphen is too short to be seen in front of a rail. */
export const MINUS = '\u2212';

/** How many figures to print, and whether zeros at the end stay (as typed) or go (as computed). */
export interface FormatOptions {
  /** Significant figures, 1 to 15; 4 unless said otherwise. */
  readonly digits?: number;
  readonly keepZeros?: boolean;
}

/** A value cut into the parts that print and speech share. */
export interface ScaledQuantity {
  readonly negative: boolean;
  /** Plain decimal figures, no sign, no exponent. */
  readonly figures: string;
  readonly prefix: Prefix;
}

const plain = (size: number, digits: number, keepZeros: boolean): string =>
  size.toLocaleString('en-US', {
    useGrouping: false,
    maximumSignificantDigits: digits,
    minimumSignificantDigits: keepZeros ? digits : 1,
  });

/**
 * Picks the prefix that leaves 1 to 999 in front of the decimal point and rounds to the figures asked for.
 * @param value finite, in the SI unit
 */
export function scaleQuantity(value: number, unit: Unit, options: FormatOptions = {}): ScaledQuantity {
  const digits = Math.min(15, Math.max(1, Math.trunc(options.digits ?? 4)));
  const keepZeros = options.keepZeros ?? false;
  const prefixes = UNITS[unit].prefixes;
  const size = Math.abs(value);
  // Round first: 999.96 at four figures is 1 kV and not 1000 V.
  const rounded = Number(size.toPrecision(digits));
  let prefix: Prefix = prefixes.includes('') ? '' : (prefixes[0] ?? '');
  if (rounded > 0) {
    prefix = prefixes[0] ?? '';
    for (const candidate of prefixes) {
      if (rounded >= Number(`1e${PREFIXES[candidate].exponent}`)) prefix = candidate;
    }
  }
  // Shift by rewriting the exponent: dividing by 1e-6 would leave 470.00000000000006.
  const [mantissa = '0', exponent = '0'] = size.toExponential().split('e');
  const shifted = Number(`${mantissa}e${Number(exponent) - PREFIXES[prefix].exponent}`);
  const figures = plain(shifted, digits, keepZeros);
  return { negative: value < 0 && Number(figures) !== 0, figures, prefix };
}

/**
 * Prints a value with an engineering prefix: `4.97 V`, `−12.1 V`, `470 μF`, `4.7 kΩ`; never an exponent.
 * What is not finite is printed in words, so that no screen ever shows NaN.
 * @param value in the SI unit
 * @param unit printed symbol
 */
export function formatQuantity(value: number, unit: Unit, options: FormatOptions = {}): string {
  if (Number.isNaN(value)) return 'no value';
  if (!Number.isFinite(value)) return value > 0 ? 'over range' : `${MINUS}over range`;
  const { negative, figures, prefix } = scaleQuantity(value, unit, options);
  return `${negative ? MINUS : ''}${figures} ${prefix}${unit}`.trimEnd();
}

/**
 * Prints a plain number (a ratio, a count) with the same minus sign and without an exponent.
 * @param value no unit
 */
export function formatNumber(value: number, digits = 4): string {
  if (!Number.isFinite(value)) return Number.isNaN(value) ? 'no value' : 'over range';
  const text = plain(Math.abs(value), digits, false);
  return value < 0 && Number(text) !== 0 ? `${MINUS}${text}` : text;
}

/**
 * Prints a length of time as a person waits it: `0.98 s`, `45 s`, `2 min 5 s`, `1 h 10 min`.
 * From ten seconds on it is rounded up to the whole second, from an hour on up to the whole minute,
 * since a wait that is printed too short is the dangerous one.
 * @param seconds zero or more
 */
export function formatDuration(seconds: number): string {
  if (!Number.isFinite(seconds)) return Number.isNaN(seconds) ? 'no value' : 'without end';
  if (seconds < 10) return formatQuantity(seconds, 's', { digits: 3 });
  const whole = Math.ceil(seconds - 1e-9);
  if (whole < 60) return `${whole} s`;
  if (whole < 3600) return whole % 60 === 0 ? `${whole / 60} min` : `${Math.floor(whole / 60)} min ${whole % 60} s`;
  const minutes = Math.ceil(whole / 60);
  const hours = Math.floor(minutes / 60);
  if (hours >= 48) return `${formatNumber(Math.ceil(hours / 24), 15)} days`;
  return minutes % 60 === 0 ? `${hours} h` : `${hours} h ${minutes % 60} min`;
}
