import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { ReadingEntry } from '@/shared/ui/components/ReadingEntry';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('ReadingEntry', () => {
  it('is named for what is read and its unit, and passes on every letter typed', () => {
    const onChangeText = vi.fn();
    renderSheet(<ReadingEntry label="R14" value="" unit="Ω" meter="Meter B, 60 kΩ" onChangeText={onChangeText} />);
    fireEvent.change(screen.getByRole('textbox', { name: 'R14, in Ω' }), { target: { value: '4k7' } });
    expect(onChangeText).toHaveBeenCalledWith('4k7');
    expect(screen.getByText('Meter B, 60 kΩ')).toBeTruthy();
  });

  it('starts with number keys and changes to letters on request, keeping the focus', () => {
    renderSheet(<ReadingEntry label="R14" value="4" unit="Ω" onChangeText={() => undefined} />);
    const entry = screen.getByRole('textbox');
    expect(entry.getAttribute('inputmode')).toBe('decimal');
    fireEvent.click(screen.getByRole('button', { name: 'Letters and sign' }));
    expect(entry.getAttribute('inputmode')).toBe('text');
    expect(document.activeElement).toBe(entry);
  });

  it('says at the field what is wrong', () => {
    renderSheet(<ReadingEntry label="R14" value="4k7x" unit="Ω" error="4k7x is not a resistance." onChangeText={() => undefined} />);
    const entry = screen.getByRole('textbox', { description: '4k7x is not a resistance.' });
    expect(entry.getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByRole('alert').textContent).toBe('4k7x is not a resistance.');
  });

  it('hands in on Enter', () => {
    const onSubmit = vi.fn();
    renderSheet(<ReadingEntry label="+5 V" value="4.97" unit="V" onChangeText={() => undefined} onSubmit={onSubmit} />);
    fireEvent.keyDown(screen.getByRole('textbox'), { key: 'Enter' });
    expect(onSubmit).toHaveBeenCalledTimes(1);
  });
});
