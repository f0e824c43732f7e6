/** The prefix in which a reading's scale is ruled. */
import { scaleQuantity } from '@/shared/quantity/formatQuantity';
import { PREFIXES } from '@/shared/quantity/units';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';

/** So that neither limit nor reading is written with a row of zeros: milliohms for an earth path, megohms for insulation. */
export function scaleOf({ low, high, needle, unit }: Pick<ReadingLine, 'low' | 'high' | 'needle' | 'unit'>): {
  factor: number;
  unit: string;
} {
  const limits = [low, high].filter((n) => n !== null).map(Math.abs);
  const anchor = Math.max(...limits, 0) || (needle !== null && Number.isFinite(needle) ? Math.abs(needle) : 1);
  const { prefix } = scaleQuantity(anchor, unit);
  return { factor: Number(`1e${-PREFIXES[prefix].exponent}`), unit: `${prefix}${unit}` };
}
