/** A row's reading as its scale is ruled: in the prefix of its limits. Pure. */
import type { ReadingRow } from '@/flows/machine/rows';
import { scaleQuantity } from '@/shared/quantity/formatQuantity';
import { QUANTITIES } from '@/shared/quantity/quantities';
import { PREFIXES } from '@/shared/quantity/units';
import type { ScaleInput } from '@/shared/ui/components/scaleModel';

/** Values in the scale's own unit, which is returned beside them. */
export function scaleShown(row: ReadingRow, value: number | 'over' | null, uncertainty: number): ScaleInput & { unit: string } {
  const { unit } = QUANTITIES[row.quantity];
  const limits = [row.low, row.high, row.nominal].filter((n): n is number => n !== null && Number.isFinite(n)).map(Math.abs);
  const { prefix } = scaleQuantity(Math.max(...limits, 0) || 1, unit);
  const factor = Number(`1e${-PREFIXES[prefix].exponent}`);
  const scaled = (n: number | null) => (n === null || !Number.isFinite(n) ? null : n * factor);
  const read = value === 'over' ? Infinity : value;
  return {
    value: read === null ? null : (row.bySize ? Math.abs(read) : read) * factor,
    low: scaled(row.low),
    high: scaled(row.high),
    nominal: scaled(row.nominal),
    guard: row.plain ? 0 : Math.hypot(uncertainty, row.twin?.is === 'like' ? row.twin.uncertainty : 0) * factor,
    unit: `${prefix}${unit}`,
  };
}
