import { act, cleanup, render, screen } from '@testing-library/react';
import { useLayoutEffect } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';

/** The device, as the browser tells of it: jsdom has no media queries. */
const device = vi.hoisted(() => {
  const listeners = new Set<(event: { matches: boolean }) => void>();
  const query = {
    matches: false,
    addListener: (listener: (event: { matches: boolean }) => void) => listeners.add(listener),
    removeListener: (listener: (event: { matches: boolean }) => void) => listeners.delete(listener),
  };
  Object.defineProperty(window, 'matchMedia', { value: () => query, configurable: true });
  return {
    listeners,
    turn(dark: boolean) {
      query.matches = dark;
      for (const listener of listeners) listener({ matches: dark });
    },
  };
});

const { useSystemScheme } = await import('@/shared/ui/theme/useSystemScheme');

afterEach(() => {
  cleanup();
  device.turn(false);
});

function Probe() {
  return <p>{useSystemScheme()}</p>;
}

describe('useSystemScheme', () => {
  it('follows the device, and lets go of it', () => {
    const { unmount } = render(<Probe />);
    expect(screen.getByText('light')).toBeTruthy();
    act(() => {
      device.turn(true);
    });
    expect(screen.getByText('dark')).toBeTruthy();
    unmount();
    expect(device.listeners.size).toBe(0);
  });

  it('sees a change that falls between the first drawing and the subscription', () => {
    function Dusk() {
      useLayoutEffect(() => {
        device.turn(true);
      }, []);
      return <Probe />;
    }
    render(<Dusk />);
    expect(screen.getByText('dark')).toBeTruthy();
  });
});
