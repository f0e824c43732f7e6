/** What a row's answer comes to, and what a step's rows come to together (A16: the worst row). */
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
  if (row.nominal !== null && !row.bySize && value * row.nominal < 0 && Math.abs(value) > uncertainty) return 'reversed';
  const decision = decide(size, { low: row.low, high: row.high }, uncertainty);
  switch (decision) {
    case 'in':
      return 'in';
    case 'close-in':
    case 'close-out':
      return 'close';
    case 'low':
    case 'high': {
      // by size: a negative rail that is too deep is high, one that is too near 0 V is low
      const negative = row.nominal !== null && row.nominal < 0;
      return negative ? (decision === 'low' ? 'high' : 'low') : decision;
    }
  }
}

/** The worst of several row results. Authored answers of a row-wise observation are ranked by `rank`, worst first. */
export function worstOf(results: readonly string[], rank: readonly string[] = ROW_ORDER): string {
  const order = (r: string) => {
    const i = rank.indexOf(r);
    return i === -1 ? rank.length : i;
  };
  return results.reduce((worst, r) => (order(r) < order(worst) ? r : worst));
}
