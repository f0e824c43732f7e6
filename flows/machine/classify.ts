/** What a row's answer comes to, and what a step's rows come to together (A16: the worst row). */
import { classifyRail } from '@/shared/workings/railLimits';
import { decide } from '@/shared/workings/readingLimit';

import { ROW_ORDER } from '../document/outcomes';
import type { RowResult } from '../document/outcomes';
import type { ReadingRow } from './rows';

/** Result of a reading against its row. `over` is over range: beyond every upper limit, good where only a lower one is asked. */
export function classifyReading(row: ReadingRow, value: number | 'over', uncertainty: number, falling: boolean): RowResult {
  if (value === 'over') return row.high === null ? 'in' : 'high';
  if (row.mayFall && falling) return 'falling';
  const size = row.bySize ? Math.abs(value) : value;
  if (row.plain) return row.high === null || size <= row.high ? 'in' : 'high';
  const rail = railLimitsOf(row);
  // a twin that reads nothing at all is like everything: there is no share of it
  if (row.twin?.is === 'like' && row.nominal === 0) return 'cannot';
  const both = row.twin?.is === 'like' ? Math.hypot(uncertainty, row.twin.uncertainty) : uncertainty;
  const decision = rail === null ? decide(size, { low: row.low, high: row.high }, both) : classifyRail(value, rail, both);
  return decision === 'close-in' || decision === 'close-out' ? 'close' : decision;
}

/** Rows with a nominal are judged by size, a negative rail included, and a wrong sign is its own result. */
function railLimitsOf(row: ReadingRow): { lowVolts: number; highVolts: number } | null {
  if (row.nominal === null || row.bySize || row.low === null || row.high === null) return null;
  return row.nominal < 0 ? { lowVolts: row.high, highVolts: row.low } : { lowVolts: row.low, highVolts: row.high };
}

/** The worst of several row results. Authored answers of a row-wise observation are ranked by `rank`, worst first. */
export function worstOf(results: readonly string[], rank: readonly string[] = ROW_ORDER): string {
  const order = (r: string) => {
    const i = rank.indexOf(r);
    return i === -1 ? rank.length : i;
  };
  return results.reduce((worst, r) => (order(r) < order(worst) ? r : worst));
}
