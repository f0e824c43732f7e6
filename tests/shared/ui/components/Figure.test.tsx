import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { Figure } from '@/shared/ui/components/Figure';
import { figureRows, figureWords } from '@/shared/ui/components/figureWords';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

const points = [
  { id: 'a', name: '+5', highlight: 'red' },
  { id: 'b', name: '0V', highlight: 'black' },
  { id: 'c', name: 'E', highlight: null },
] as const;

describe('Figure', () => {
  it('says where the leads go', () => {
    renderSheet(<Figure title="Supply terminals" points={points} />);
    expect(screen.getByRole('img', { name: 'Supply terminals: red lead on +5, black lead on 0V' })).toBeTruthy();
  });

  it('draws every terminal with its name, and letters the leads', () => {
    const { container } = renderSheet(<Figure title="Supply terminals" points={points} />);
    const drawn = [...container.querySelectorAll('text')].map((t) => t.textContent);
    expect(drawn).toEqual(expect.arrayContaining(['+5', '0V', 'E', 'R', 'B']));
  });
});

describe('figureRows', () => {
  it.each([
    [6, 6, [6]],
    [6, 5, [3, 3]],
    [7, 3, [3, 3, 1]],
    [0, 4, []],
    [2, 0, [1, 1]],
  ])('cuts %s points at %s a row into %j', (count, perRow, lengths) => {
    expect(figureRows(Array.from({ length: count }), perRow).map((row) => row.length)).toEqual(lengths);
  });
});

describe('figureWords', () => {
  it('lists the terminals when no lead is placed', () => {
    expect(figureWords([{ id: 'c', name: 'E', highlight: null }])).toBe('terminals E');
  });
});
