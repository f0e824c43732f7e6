/** Says a value in words, for screen readers and for reading a meter back across the bench. */
import { scaleQuantity } from '@/shared/quantity/formatQuantity';
import type { FormatOptions } from '@/shared/quantity/formatQuantity';
import type { Unit } from '@/shared/quantity/units';
import { PREFIXES, UNITS } from '@/shared/quantity/units';

const ONES = [
  'zero',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
  'thirteen',
  'fourteen',
  'fifteen',
  'sixteen',
  'seventeen',
  'eighteen',
  'nineteen',
] as const;
const TENS = ['', '', 'twenty', 'thirty', 'forty', 'fifty', 'sixty', 'seventy', 'eighty', 'ninety'] as const;

function wholeInWords(whole: number): string {
  if (whole < 20) return ONES[whole] ?? String(whole);
  if (whole < 100) {
    const rest = whole % 10;
    return `${TENS[Math.floor(whole / 10)] ?? ''}${rest === 0 ? '' : `-${ONES[rest] ?? ''}`}`;
  }
  if (whole < 1000) {
    const rest = whole % 100;
    return `${ONES[Math.floor(whole / 100)] ?? ''} hundred${rest === 0 ? '' : ` and ${wholeInWords(rest)}`}`;
  }
  if (whole < 1e6) {
    const rest = whole % 1000;
    const join = rest === 0 ? '' : rest < 100 ? ' and ' : ' ';
    return `${wholeInWords(Math.floor(whole / 1000))} thousand${join}${rest === 0 ? '' : wholeInWords(rest)}`;
  }
  return String(whole);
}

/** Kilohm and megohm lose a vowel (BIPM SI Brochure, 9th edition, section 5.4.4 allows the fused forms). */
function unitInWords(prefixWord: string, unitWord: string): string {
  if (unitWord.startsWith('ohm') && (prefixWord === 'kilo' || prefixWord === 'mega')) return `${prefixWord.slice(0, -1)}${unitWord}`;
  return `${prefixWord}${unitWord}`;
}

/**
 * Says a value in words: "five point oh four volts", "minus twelve point one volts", "four point seven kilohms".
 * @param value in the SI unit
 */
export function speakQuantity(value: number, unit: Unit, options: FormatOptions = {}): string {
  if (Number.isNaN(value)) return 'no value';
  if (!Number.isFinite(value)) return value > 0 ? 'over range' : 'minus over range';
  const { negative, figures, prefix } = scaleQuantity(value, unit, options);
  const [whole = '0', decimals = ''] = figures.split('.');
  const words = [wholeInWords(Number(whole))];
  if (decimals !== '') words.push('point', ...[...decimals].map((digit) => (digit === '0' ? 'oh' : (ONES[Number(digit)] ?? digit))));
  const info = UNITS[unit];
  if (unit !== '') words.push(unitInWords(PREFIXES[prefix].word, figures === '1' ? info.singular : info.plural));
  return `${negative ? 'minus ' : ''}${words.join(' ')}`;
}
