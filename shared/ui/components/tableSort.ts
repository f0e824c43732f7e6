/** Order of a table: which way a header's press turns it. */

export interface TableSort {
  column: string;
  direction: 'ascending' | 'descending';
}

/** The order after a header was pressed: a new column rises first, the same one turns round. */
export function nextSort(now: TableSort | null, column: string): TableSort {
  if (now?.column !== column) return { column, direction: 'ascending' };
  return { column, direction: now.direction === 'ascending' ? 'descending' : 'ascending' };
}
