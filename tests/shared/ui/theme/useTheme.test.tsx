import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';

import { ThemeProvider, useTheme } from '@/shared/ui/theme/useTheme';

afterEach(() => {
  cleanup();
  localStorage.clear();
});

function Probe() {
  const { scheme, setChoice } = useTheme();
  return <button onClick={() => setChoice('dark')}>{scheme}</button>;
}

describe('ThemeProvider', () => {
  it('changes the scheme at once, tells the page, and keeps it for the next visit', () => {
    const { unmount } = render(
      <ThemeProvider>
        <Probe />
      </ThemeProvider>,
    );
    fireEvent.click(screen.getByRole('button', { name: 'light' }));
    expect(screen.getByRole('button', { name: 'dark' })).toBeTruthy();
    expect(document.documentElement.dataset['scheme']).toBe('dark');
    unmount();
    render(
      <ThemeProvider>
        <Probe />
      </ThemeProvider>,
    );
    expect(screen.getByRole('button', { name: 'dark' })).toBeTruthy();
  });
});
