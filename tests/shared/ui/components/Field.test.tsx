import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { Field } from '@/shared/ui/components/Field';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('Field', () => {
  it('is found by its name and passes on what is typed', () => {
    const onChangeText = vi.fn();
    renderSheet(<Field label="Machine" required value="" onChangeText={onChangeText} />);
    fireEvent.change(screen.getByRole('textbox', { name: 'Machine' }), { target: { value: 'Ostrel 16' } });
    expect(onChangeText).toHaveBeenCalledWith('Ostrel 16');
  });

  it('carries its error and hint as a description', () => {
    renderSheet(<Field label="Mail" value="x" error="A mail address has an @." hint="As on your badge." onChangeText={() => undefined} />);
    const field = screen.getByRole('textbox', { name: 'Mail', description: 'A mail address has an @. As on your badge.' });
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByRole('alert').textContent).toContain('has an @');
  });

  it('says which ones may stay empty', () => {
    renderSheet(<Field label="Remark" value="" onChangeText={() => undefined} />);
    expect(screen.getByText('Remark (may stay empty)')).toBeTruthy();
  });

  it('hides a secret', () => {
    renderSheet(<Field label="Password" required secret value="x" onChangeText={() => undefined} />);
    expect(screen.getByLabelText('Password').getAttribute('type')).toBe('password');
  });
});
