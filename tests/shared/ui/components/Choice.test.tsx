import { fireEvent, screen } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';

import { Choice } from '@/shared/ui/components/Choice';
import { choiceKey } from '@/shared/ui/components/choiceKeys';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

const options = ['None', 'Probe', 'Hands'].map((label) => ({ value: label.toLowerCase(), label }));

function Contact() {
  const [value, setValue] = useState<string | null>('probe');
  return <Choice label="Contact" options={options} value={value} onChange={setValue} />;
}

describe('Choice', () => {
  it('is one group in which one radio is chosen', () => {
    renderSheet(<Contact />);
    expect(screen.getByRole('radiogroup', { name: 'Contact' })).toBeTruthy();
    fireEvent.click(screen.getByRole('radio', { name: 'None' }));
    expect(screen.getAllByRole('radio', { checked: true }).map((r) => r.textContent)).toEqual(['None']);
  });

  it('moves choice and focus with the arrow keys, and has one tab stop', () => {
    renderSheet(<Contact />);
    fireEvent.keyDown(screen.getByRole('radio', { name: 'Probe' }), { key: 'ArrowDown' });
    const hands = screen.getByRole('radio', { name: 'Hands', checked: true });
    expect(document.activeElement).toBe(hands);
    expect(screen.getAllByRole('radio').map((r) => r.tabIndex)).toEqual([-1, -1, 0]);
  });
});

describe('choiceKey', () => {
  it.each([
    ['ArrowDown', 2, 0],
    ['ArrowRight', 0, 1],
    ['ArrowUp', 0, 2],
    ['ArrowUp', -1, 2],
    ['ArrowDown', -1, 0],
    ['Tab', 1, null],
  ] as const)('%s at %s leads to %s of three', (key, at, to) => {
    expect(choiceKey(key, at, 3)).toBe(to);
  });
});
