import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { CircuitFigure } from '@/shared/ui/components/CircuitFigure';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

import { lostReturnCircuit } from './lostReturnCircuit';

describe('CircuitFigure', () => {
  it('is told in words that stand on the page', () => {
    renderSheet(<CircuitFigure circuit={lostReturnCircuit} />);
    const image = screen.getByRole('img', { name: 'With R2 opened' });
    expect(document.getElementById(image.getAttribute('aria-describedby') ?? '')?.textContent).toContain(
      'freewheel diode of +5 V at 9.1 A',
    );
  });

  it('says what is wrong first, then each number with its amps', () => {
    renderSheet(<CircuitFigure circuit={lostReturnCircuit} />);
    const key = within(screen.getByRole('list', { name: 'Key of With R2 opened' }));
    const items = key.getAllByRole('listitem').map((item) => item.textContent);
    expect(items[0]).toBe('+5 V: −710 mV, reversed');
    expect(items).toContain('3Freewheel D3, diode: 9.1 A, 3 times its rating');
    expect(items).toContain('6Return R2, wire: opened');
  });

  it('prints names and volts of the nodes in the drawing', () => {
    const { container } = renderSheet(<CircuitFigure circuit={lostReturnCircuit} />);
    const drawn = [...container.querySelectorAll('svg text')].map((text) => text.textContent);
    expect(drawn).toEqual(expect.arrayContaining(['+5 V', '−710 mV', '−12 V board', '−11.4 V']));
  });
});
