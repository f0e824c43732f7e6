import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { PowerBand } from '@/shared/ui/components/PowerBand';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('PowerBand', () => {
  it.each([
    ['proved-dead', 'Proved dead'],
    ['off', 'Off, not proved'],
    ['lamp', 'Lamp'],
    ['bench', 'Bench supply'],
    ['mains', 'Mains'],
    ['unknown', 'Not known, treat as live'],
  ] as const)('says %s in words', (state, word) => {
    renderSheet(<PowerBand state={state} detail="since 09:12" />);
    expect(screen.getByRole('status', { name: 'Supply' }).textContent).toBe(`${word}since 09:12`);
  });

  it('leads to the way through the tree from its place', () => {
    const onPressPlace = vi.fn();
    renderSheet(<PowerBand state="lamp" place="14/31" onPressPlace={onPressPlace} />);
    fireEvent.click(screen.getByRole('button', { name: 'Step 14 of 31: show the way' }));
    expect(onPressPlace).toHaveBeenCalledTimes(1);
  });

  it('only prints the place when it leads nowhere', () => {
    renderSheet(<PowerBand state="lamp" place="14/31" />);
    expect(screen.queryByRole('button')).toBeNull();
    expect(screen.getByRole('img', { name: 'Step 14 of 31' })).toBeTruthy();
  });
});
