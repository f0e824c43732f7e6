/** A ruled table; on a phone each of its rows becomes a ruled block. */
import type { ReactNode } from 'react';
import { useWindowDimensions, View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Label } from '@/shared/ui/components/Label';
import { TableHeader } from '@/shared/ui/components/TableHeader';
import { TableRowLink } from '@/shared/ui/components/TableRowLink';
import type { RowTarget } from '@/shared/ui/components/TableRowLink';
import type { TableSort } from '@/shared/ui/components/tableSort';
import { isWide, line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

export interface Column<Row> {
  key: string;
  title: string;
  /** share of the width; 1 unless told */
  grow?: number;
  align?: 'left' | 'right';
  sortable?: boolean;
  /** words are set as a line of text; anything else is drawn as it is */
  cell: (row: Row) => ReactNode;
}

interface Props<Row> {
  /** what the table lists; its accessible name */
  caption: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** where a row leads; its first cell becomes the link or button */
  rowTarget?: ((row: Row) => RowTarget) | undefined;
  sort?: TableSort | null | undefined;
  onSort?: ((sort: TableSort) => void) | undefined;
  /** shown in place of rows when there are none */
  empty?: ReactNode;
  /** blocks instead of columns; by the window's width unless told */
  blocks?: boolean | undefined;
}

/** Rows in the order in which they are given: the caller sorts. */
export function DataTable<Row>({ caption, columns, rows, rowKey, rowTarget, sort = null, onSort, empty, blocks }: Props<Row>) {
  const { colors } = useTheme();
  const { width } = useWindowDimensions();
  const stacked = blocks ?? !isWide(width);
  if (rows.length === 0 && empty !== undefined) return <>{empty}</>;
  return (
    <View role="table" aria-label={caption} style={{ alignSelf: 'stretch' }}>
      {stacked ? null : (
        <View role="rowgroup">
          <View role="row" style={{ flexDirection: 'row', borderBottomWidth: line.rule, borderBottomColor: colors.ink }}>
            {columns.map((column) => (
              <TableHeader
                key={column.key}
                id={column.key}
                title={column.title}
                grow={column.grow ?? 1}
                align={column.align ?? 'left'}
                sort={sort}
                onSort={column.sortable ? onSort : undefined}
              />
            ))}
          </View>
        </View>
      )}
      <View role="rowgroup">
        {rows.map((row) => {
          const to = rowTarget?.(row);
          return (
            <View
              key={rowKey(row)}
              role="row"
              style={{
                flexDirection: stacked ? 'column' : 'row',
                alignItems: stacked ? 'stretch' : 'center',
                paddingVertical: stacked ? space.m : space.xs,
                gap: stacked ? space.xs : 0,
                minHeight: 52,
                borderBottomWidth: line.hair,
                borderBottomColor: colors.rule,
              }}
            >
              {columns.map((column, index) => (
                <Cell key={column.key} column={column} row={row} stacked={stacked} first={index === 0} to={index === 0 ? to : undefined} />
              ))}
            </View>
          );
        })}
      </View>
    </View>
  );
}

interface CellProps<Row> {
  column: Column<Row>;
  row: Row;
  stacked: boolean;
  first: boolean;
  to: RowTarget | undefined;
}

function Cell<Row>({ column, row, stacked, first, to }: CellProps<Row>) {
  const made = column.cell(row);
  const words = typeof made === 'string' || typeof made === 'number';
  const align = stacked ? 'left' : (column.align ?? 'left');
  const drawn = words ? (
    <BodyText bold={first} align={align}>
      {made}
    </BodyText>
  ) : (
    made
  );
  const content = to ? <TableRowLink to={to}>{drawn}</TableRowLink> : drawn;
  if (!stacked) {
    return (
      <View
        role="cell"
        style={{
          flexGrow: column.grow ?? 1,
          flexShrink: 1,
          flexBasis: 0,
          minWidth: 0,
          paddingHorizontal: space.s,
          paddingVertical: space.xs,
        }}
      >
        {content}
      </View>
    );
  }
  return (
    <View role="cell" style={{ flexDirection: 'row', alignItems: first ? 'center' : 'baseline', gap: space.m }}>
      {first ? null : (
        <View style={{ width: 112 }}>
          <Label>{column.title}</Label>
        </View>
      )}
      <View style={{ flex: 1, minWidth: 0 }}>{content}</View>
    </View>
  );
}
