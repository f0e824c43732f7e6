import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { sheetGroups, sheetsFor } from '@/shared/ui/screens/workings/groups';
import { WorkingsScreen } from '@/shared/ui/screens/workings/WorkingsScreen';
import { SHEETS } from '@/shared/workings/list';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('the list of workings', () => {
  it('leads to every sheet once, under what it answers', () => {
    renderSheet(<WorkingsScreen />);
    const links = screen.getAllByRole('link').map((link) => link.getAttribute('href'));
    expect([...links].sort()).toEqual(SHEETS.map((sheet) => `/workings/${sheet.id}`).sort());
    expect(screen.getByRole('heading', { level: 2, name: 'Safe to touch' })).toBeTruthy();
    expect(screen.queryByRole('heading', { name: 'Other workings' })).toBeNull();
  });

  it('keeps a sheet that no group names at the end, and leaves empty groups out', () => {
    const [first] = SHEETS;
    if (first === undefined) throw new Error('no sheet');
    expect(sheetGroups([{ ...first, id: 'new-one' }]).map((group) => group.title)).toEqual(['Other workings']);
  });

  it('finds a sheet by a word of its question or of what goes into it', () => {
    expect(sheetsFor(SHEETS, 'LAMP watts').map((sheet) => sheet.id)).toEqual(['series-lamp']);
    expect(sheetsFor(SHEETS, '')).toHaveLength(SHEETS.length);
    expect(sheetsFor(SHEETS, 'perpetual')).toEqual([]);
  });

  it.runIf(SHEETS.length >= 9)('says so when no sheet has the words', () => {
    renderSheet(<WorkingsScreen />);
    fireEvent.change(screen.getByLabelText('Find a sheet'), { target: { value: 'perpetual motion' } });
    expect(screen.getByRole('heading', { name: 'No sheet has these words' })).toBeTruthy();
    expect(screen.queryAllByRole('link')).toEqual([]);
  });
});
