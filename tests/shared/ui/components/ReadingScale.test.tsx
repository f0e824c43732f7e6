import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { ReadingScale } from '@/shared/ui/components/ReadingScale';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

describe('ReadingScale', () => {
  it('is told in words, in the form that the caller prints', () => {
    renderSheet(<ReadingScale value={4.9} low={4.75} high={5.25} guard={0.03} nominal={5} unit="V" format={(n) => n.toFixed(2)} />);
    expect(screen.getByRole('img', { name: '4.90 V; limits 4.75 to 5.25 V; guard band ±0.03 V; inside the limits' })).toBeTruthy();
  });

  it('labels its ticks with figures that a person reads', () => {
    const { container } = renderSheet(<ReadingScale value={-12.1} low={-12.6} high={-11.4} guard={0.05} unit="V" />);
    const labels = [...container.querySelectorAll('text')].map((t) => t.textContent);
    expect(labels).toContain('−12');
    expect(labels.length).toBeGreaterThan(2);
  });
});
