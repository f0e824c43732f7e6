import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { nextSort } from '@/shared/ui/components/tableSort';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

interface Meter {
  name: string;
  until: string;
}

const rows: Meter[] = [
  { name: 'Meter A', until: '2027-03-01' },
  { name: 'Meter B', until: '2026-01-15' },
];
const columns: Column<Meter>[] = [
  { key: 'name', title: 'Instrument', sortable: true, cell: (m) => m.name },
  { key: 'until', title: 'Calibrated to', cell: (m) => m.until },
];
const common = { caption: 'Instruments', columns, rowKey: (m: Meter) => m.name };

describe('DataTable', () => {
  it('is a table with heads, rows and cells on a wide screen', () => {
    renderSheet(<DataTable {...common} rows={rows} blocks={false} />);
    const table = screen.getByRole('table', { name: 'Instruments' });
    expect(
      within(table)
        .getAllByRole('columnheader')
        .map((h) => h.textContent),
    ).toEqual(['Instrument', 'Calibrated to']);
    expect(
      within(table)
        .getAllByRole('cell')
        .map((c) => c.textContent),
    ).toEqual(['Meter A', '2027-03-01', 'Meter B', '2026-01-15']);
  });

  it('says in each block what a cell is on a phone', () => {
    renderSheet(<DataTable {...common} rows={rows} blocks />);
    expect(screen.getAllByRole('cell').map((c) => c.textContent)).toContain('Calibrated to2026-01-15');
  });

  it('makes of the first cell the way into a row', () => {
    const onPress = vi.fn();
    renderSheet(
      <DataTable {...common} rows={rows} blocks={false} rowTarget={(m) => ({ name: `Open ${m.name}`, onPress: () => onPress(m.name) })} />,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Open Meter B' }));
    expect(onPress).toHaveBeenCalledWith('Meter B');
  });

  it('tells its order and turns it from a head', () => {
    const onSort = vi.fn();
    renderSheet(<DataTable {...common} rows={rows} blocks={false} sort={{ column: 'name', direction: 'ascending' }} onSort={onSort} />);
    expect(screen.getByRole('columnheader', { name: 'Instrument' }).getAttribute('aria-sort')).toBe('ascending');
    expect(screen.getByRole('columnheader', { name: 'Calibrated to' }).getAttribute('aria-sort')).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Instrument' }));
    expect(onSort).toHaveBeenCalledWith({ column: 'name', direction: 'descending' });
  });

  it('says that there is nothing instead of showing bare heads', () => {
    renderSheet(<DataTable {...common} rows={[]} empty={<EmptyState title="No instrument yet" text="The keeper adds them." />} />);
    expect(screen.queryByRole('table')).toBeNull();
    expect(screen.getByRole('heading', { name: 'No instrument yet' })).toBeTruthy();
  });
});

describe('nextSort', () => {
  it('rises first, then turns round', () => {
    expect(nextSort(null, 'name')).toEqual({ column: 'name', direction: 'ascending' });
    expect(nextSort({ column: 'name', direction: 'descending' }, 'name').direction).toBe('ascending');
    expect(nextSort({ column: 'name', direction: 'descending' }, 'until')).toEqual({ column: 'until', direction: 'ascending' });
  });
});
