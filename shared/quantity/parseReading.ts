/** Understands a reading the way that a person at the bench types it, and asks back where it could mean two things. */
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Quantity } from '@/shared/quantity/quantities';
import { QUANTITIES } from '@/shared/quantity/quantities';
import { prefixOfLetter, readSuffix } from '@/shared/quantity/readingUnit';
import type { SuffixMeaning } from '@/shared/quantity/readingUnit';
import type { Prefix, Unit } from '@/shared/quantity/units';
import { PREFIXES, UNITS } from '@/shared/quantity/units';

/** What is asked for: a kind of reading (a step), or a plain unit (a field of a sheet). */
export type Wanted = { readonly quantity: Quantity } | { readonly unit: Unit; readonly signed?: boolean };

/** Why an entry was not taken. */
export type ReadingFault = 'empty' | 'not-a-number' | 'ambiguous' | 'wrong-unit' | 'wrong-prefix' | 'negative' | 'absurd';

/** One thing that an ambiguous entry could mean. */
export interface ReadingChoice {
  readonly value: number;
  readonly echo: string;
}

/** A value in SI, an over-range display, or a sentence that says what to mend. */
export type ParsedReading =
  | { readonly ok: true; readonly kind: 'value'; readonly value: number; readonly echo: string }
  | { readonly ok: true; readonly kind: 'over-range'; readonly sign: 1 | -1; readonly echo: string }
  | { readonly ok: false; readonly why: ReadingFault; readonly say: string; readonly choices: readonly ReadingChoice[] };

interface Asked {
  readonly unit: Unit;
  readonly name: string;
  readonly takes: string;
  readonly prefixes: readonly Prefix[];
  readonly signed: boolean;
  readonly current: 'ac' | 'dc' | null;
}

const MOST_CHARACTERS = 40;
const OVER_RANGE = /^([+-]?)\s*(?:OL|O\.L\.?|0L|0\.L\.?|OFL|OVLD|over(?:[\s-]?(?:load|range))?|∞)(?![A-Za-z0-9])\s*(.*)$/i;

function askedFor(wanted: Wanted): Asked {
  if ('quantity' in wanted) {
    const info = QUANTITIES[wanted.quantity];
    return { ...info, takes: `this step reads ${info.name}` };
  }
  const info = UNITS[wanted.unit];
  const signed = wanted.signed ?? false;
  return { unit: wanted.unit, name: info.plural, takes: `this field takes ${info.plural}`, prefixes: info.prefixes, signed, current: null };
}

function tidy(text: string): string {
  return text
    .replace(/[\u00a0\u2000-\u200a\u202f\u3000\t\r\n]/g, ' ')
    .replace(/[\u2212\u2010\u2011\u2012\u2013\ufe63\uff0d]/g, '-')
    .replace(/\u00b5/g, 'μ')
    .replace(/\u2126/g, 'Ω')
    .replace(/\u2103/g, '°C')
    .replace(/º/g, '°')
    .trim();
}

const refuse = (why: ReadingFault, say: string, choices: readonly ReadingChoice[] = []): ParsedReading => ({
  ok: false,
  why,
  say,
  choices,
});

/** `4.970` has four significant figures; the echo shows as many as were typed. */
const figuresTyped = (digits: string): number => Math.max(1, digits.replace('.', '').replace(/^0+/, '').length);

function choiceOf(digits: string, prefix: Prefix, factor: number, unit: Unit, negative: boolean): ReadingChoice {
  // The decimal text carries the prefix, so that 470u is the double nearest to 0.00047 and not a product of two roundings.
  const size = Number(`${digits}e${PREFIXES[prefix].exponent}`) * factor;
  const value = negative && size !== 0 ? -size : size;
  const asTyped = { digits: figuresTyped(digits), keepZeros: true };
  return { value, echo: formatQuantity(value, unit, factor === 1 ? asTyped : { digits: 15 }) };
}

/** The decimal readings that the figures allow: one when they are clear, several when a mark could group thousands. */
function readFigures(body: string): readonly string[] {
  if (/^\d+$/.test(body)) return [body];
  if (/^\d*\.\d*$/.test(body) && /\d/.test(body)) return [body.replace(/^\./, '0.').replace(/\.$/, '')];
  if (/^\d*,\d+$/.test(body)) {
    const decimal = body.replace(',', '.').replace(/^\./, '0.');
    // No one groups thousands behind a zero or behind four figures.
    return /^[1-9]\d{0,2},\d{3}$/.test(body) ? [decimal, body.replace(',', '')] : [decimal];
  }
  if (/^\d{1,3} \d{3}$/.test(body)) return [body.replace(' ', '.'), body.replace(' ', '')];
  const grouped = /^(\d{1,3})(?:([.,'’ ])\d{3})(?:\2\d{3})*(?:([.,])\d+)?$/.exec(body);
  if (grouped !== null && grouped[2] !== grouped[3]) {
    const mark = grouped[3];
    const [whole = '', decimals] =
      mark === undefined ? [body] : [body.slice(0, body.lastIndexOf(mark)), body.slice(body.lastIndexOf(mark) + 1)];
    const joined = whole.replace(/[.,'’ ]/g, '');
    // Listed twice: a grouped number is never taken without asking.
    const digits = decimals === undefined ? joined : `${joined}.${decimals}`;
    return [digits, digits];
  }
  return [];
}

function ambiguous(readings: readonly string[], meaning: SuffixMeaning, asked: Asked, negative: boolean): ParsedReading {
  const unique = [...new Set(readings)];
  const choices = unique.map((digits) => choiceOf(digits, meaning.prefix, meaning.factor, asked.unit, negative));
  const question = unique.map((digits) => `${negative ? '\u2212' : ''}${digits}`).join(' or ');
  return refuse('ambiguous', `Do you mean ${question}? Write it with a decimal point and without a mark for thousands.`, choices);
}

function refuseUnit(meaning: SuffixMeaning, asked: Asked): ParsedReading | null {
  if (meaning.unit !== null && meaning.unit !== asked.unit) {
    return refuse('wrong-unit', `That is ${UNITS[meaning.unit].plural}; ${asked.takes}.`);
  }
  if (meaning.current !== null && asked.current !== null && meaning.current !== asked.current) {
    return refuse('wrong-unit', `That is ${UNITS[asked.unit].plural} ${meaning.current.toUpperCase()}; ${asked.takes}.`);
  }
  if (!asked.prefixes.includes(meaning.prefix)) {
    const { word } = PREFIXES[meaning.prefix];
    const hint = meaning.prefix === 'M' && asked.prefixes.includes('m') ? ' For milli write a small m.' : '';
    return refuse('wrong-prefix', `${meaning.prefix} is ${word}, which makes no sense for ${asked.name}.${hint}`);
  }
  return null;
}

/** Entries whose suffix has two common meanings a thousand or sixty thousand apart. */
function twoMeanings(suffix: string, digits: string, asked: Asked): ParsedReading | null {
  if (asked.unit === 's' && suffix === 'm') {
    const choices = [choiceOf(digits, 'm', 1, 's', false), choiceOf(digits, '', 60, 's', false)];
    return refuse('ambiguous', `Do you mean ${digits} ms or ${digits} min? Write ms or min.`, choices);
  }
  if (asked.unit === 'F' && ['MF', 'Mf', 'mf'].includes(suffix)) {
    const choices = [choiceOf(digits, 'μ', 1, 'F', false), choiceOf(digits, 'm', 1, 'F', false)];
    return refuse('ambiguous', `Do you mean ${digits} μF, as ${suffix} on an old part does, or ${digits} mF? Write uF or mF.`, choices);
  }
  return null;
}

function settle(readings: readonly string[], suffix: string, negative: boolean, asked: Asked, rkm: Prefix | null): ParsedReading | null {
  const [digits] = readings;
  if (digits === undefined) return null;
  if (asked.unit === '°C' && /^(°\s*f|f|deg\s*f|fahrenheit)$/i.test(suffix)) {
    return refuse('wrong-unit', `That is degrees Fahrenheit; ${asked.takes}.`);
  }
  if (rkm === null) {
    const two = twoMeanings(suffix, digits, asked);
    if (two !== null) return two;
  }
  const read = readSuffix(suffix, asked.unit);
  if (read === null || (rkm !== null && read.prefix !== '')) return null;
  const meaning = rkm === null ? read : { ...read, prefix: rkm };
  const wrong = refuseUnit(meaning, asked);
  if (wrong !== null) return wrong;
  if (readings.length > 1) return ambiguous(readings, meaning, asked, negative);
  const { value, echo } = choiceOf(digits, meaning.prefix, meaning.factor, asked.unit, negative);
  if (value < 0 && !asked.signed) {
    return refuse('negative', `${echo} cannot be right: ${asked.name} have no minus sign. Check the leads and the meter's zero.`);
  }
  const { absurdAbove } = UNITS[asked.unit];
  if (!(Math.abs(value) <= absurdAbove)) {
    return refuse(
      'absurd',
      `${echo} is more than any bench reading (${formatQuantity(absurdAbove, asked.unit)} at most). Check the figures and the prefix.`,
    );
  }
  return { ok: true, kind: 'value', value, echo };
}

function readOverRange(text: string, asked: Asked): ParsedReading | null {
  const over = OVER_RANGE.exec(text);
  if (over === null) return null;
  const [, sign = '', suffix = ''] = over;
  const meaning = readSuffix(suffix.trim(), asked.unit);
  if (meaning === null) return null;
  const wrong = refuseUnit(meaning, asked);
  if (wrong !== null) return wrong;
  if (sign === '-' && !asked.signed)
    return refuse('negative', `Over range with a minus sign cannot be right: ${asked.name} have none. Check the leads.`);
  return { ok: true, kind: 'over-range', sign: sign === '-' ? -1 : 1, echo: sign === '-' ? '\u2212over range' : 'over range' };
}

/**
 * Understands an entry. Takes a decimal point or comma, a prefix with or without the unit, RKM codes (4k7, 4R7), any minus
 * sign, and the over-range display of a meter; refuses with a sentence what is another unit or could mean two things.
 * @param text as typed
 * @param wanted the kind of reading or the unit asked for
 * @returns the value in the SI unit with what was understood; `choices` holds the possible values of an ambiguous entry
 */
export function parseReading(text: string, wanted: Wanted): ParsedReading {
  const asked = askedFor(wanted);
  const clean = tidy(text);
  if (clean === '') return refuse('empty', `Nothing is entered; ${asked.takes}.`);
  const shown = clean.length > MOST_CHARACTERS ? `${clean.slice(0, MOST_CHARACTERS)}…` : clean;
  const notNumber = refuse('not-a-number', `“${shown}” is not a number; ${asked.takes}. Write it like 4.97, 470m or 4k7.`);
  if (clean.length > MOST_CHARACTERS) return notNumber;
  const over = readOverRange(clean, asked);
  if (over !== null) return over;

  const signed = /^([+-]?)\s*(.*)$/.exec(clean);
  const negative = signed?.[1] === '-';
  const unsigned = signed?.[2] ?? '';
  const rkm = /^(\d*)([A-Za-zμΩ])(\d+)\s*(\D*)$/.exec(unsigned);
  if (rkm !== null) {
    const [, whole = '', letter = '', decimals = '', rest = ''] = rkm;
    const digits = `${whole === '' ? '0' : whole}.${decimals}`;
    const pointUnit = (Object.keys(UNITS) as Unit[]).find((unit) => UNITS[unit].pointLetter === letter.toUpperCase());
    const prefix = prefixOfLetter(letter);
    if (prefix !== null && whole !== '') return settle([digits], rest.trim(), negative, asked, prefix) ?? notNumber;
    if (pointUnit !== undefined) return settle([digits], rest.trim() === '' ? pointUnit : rest.trim(), negative, asked, null) ?? notNumber;
    return notNumber;
  }
  const plain = /^([\d.,'’ ]*[\d.,])\s*(.*)$/.exec(unsigned);
  if (plain === null) return notNumber;
  return settle(readFigures(plain[1] ?? ''), plain[2] ?? '', negative, asked, null) ?? notNumber;
}
