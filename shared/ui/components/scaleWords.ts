/** A reading on its scale, in words. */
import type { ScaleInput } from '@/shared/ui/components/scaleModel';

/** A number as it is printed: true minus sign, at most `decimals` places, or four significant figures. */
export function plainNumber(n: number, decimals?: number): string {
  if (!Number.isFinite(n)) return n > 0 ? 'over range' : n < 0 ? 'under range' : 'not a number';
  const rounded =
    decimals === undefined ? String(Number(n.toPrecision(4))) : (Math.round(n * 10 ** decimals) / 10 ** decimals + 0).toFixed(decimals);
  return rounded.replace('-', '−');
}

/** Where a value lies against its limits; a reading right on the edge of a guard band counts as close. */
export function scalePlace({ value, low, high, guard }: ScaleInput): string | null {
  if (value === null || (low === null && high === null)) return null;
  const sides = [
    { name: 'low', inside: low === null ? Infinity : value - low, outside: 'below' },
    { name: 'high', inside: high === null ? Infinity : high - value, outside: 'above' },
  ] as const;
  const tight = sides[0].inside <= sides[1].inside ? sides[0] : sides[1];
  const close = guard > 0 && Math.abs(tight.inside) <= guard;
  if (tight.inside < 0) return close ? `outside, but close to the ${tight.name} limit` : `${tight.outside} the ${tight.name} limit`;
  return close ? `inside, but close to the ${tight.name} limit` : 'inside the limits';
}

/** The whole scale for a person who does not see it. */
export function scaleWords(input: ScaleInput, unit: string, format: (n: number) => string = plainNumber): string {
  const { value, low, high, guard } = input;
  const reading = value === null ? 'No reading yet' : `${format(value)} ${unit}`;
  const limits =
    low !== null && high !== null
      ? `limits ${format(low)} to ${format(high)} ${unit}`
      : low !== null
        ? `at least ${format(low)} ${unit}`
        : high !== null
          ? `at most ${format(high)} ${unit}`
          : 'no limit';
  const band = guard > 0 && (low !== null || high !== null) ? `guard band ±${format(guard)} ${unit}` : null;
  return [reading, limits, band, scalePlace(input)].filter((part) => part !== null).join('; ');
}
