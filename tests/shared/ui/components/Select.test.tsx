import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { Select } from '@/shared/ui/components/Select';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

const options = [
  { value: 'c12', label: 'Corvane 12' },
  { value: 'b80', label: 'Brindle 80' },
];

describe('Select', () => {
  it('asks to choose until something is chosen', () => {
    const onChange = vi.fn();
    renderSheet(<Select label="Run on" options={options} value={null} onChange={onChange} />);
    expect(screen.getByRole('option', { name: 'Choose …', selected: true })).toBeTruthy();
    fireEvent.change(screen.getByRole('combobox', { name: 'Run on' }), { target: { value: 'b80' } });
    expect(onChange).toHaveBeenCalledWith('b80');
  });

  it('offers only real choices afterwards', () => {
    renderSheet(<Select label="Run on" options={options} value="c12" onChange={() => undefined} />);
    expect(screen.getAllByRole('option').map((o) => o.textContent)).toEqual(['Corvane 12', 'Brindle 80']);
  });
});
