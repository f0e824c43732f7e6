import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { Checkbox } from '@/shared/ui/components/Checkbox';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('Checkbox', () => {
  it('says its state and asks for the other one', () => {
    const onChange = vi.fn();
    renderSheet(<Checkbox label="RCD tested today" checked={false} onChange={onChange} />);
    fireEvent.click(screen.getByRole('checkbox', { name: 'RCD tested today', checked: false }));
    expect(onChange).toHaveBeenCalledWith(true);
  });

  it('cannot be ticked while disabled', () => {
    const onChange = vi.fn();
    renderSheet(<Checkbox label="Proving unit" detail="none here" checked={false} disabled onChange={onChange} />);
    fireEvent.click(screen.getByRole('checkbox', { name: 'Proving unit: none here' }));
    expect(onChange).not.toHaveBeenCalled();
  });
});
