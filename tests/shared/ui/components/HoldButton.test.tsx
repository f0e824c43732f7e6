import { act, fireEvent, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { HoldButton } from '@/shared/ui/components/HoldButton';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

beforeEach(() => {
  // jsdom has no PointerEvent, and a plain Event has no button
  vi.stubGlobal('PointerEvent', MouseEvent);
  vi.useFakeTimers({ toFake: ['setInterval', 'clearInterval', 'performance'] });
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

function pass(ms: number): void {
  act(() => {
    vi.advanceTimersByTime(ms);
  });
}

function show(disabled = false) {
  const onConfirm = vi.fn();
  renderSheet(<HoldButton label="Put mains in" disabled={disabled} onConfirm={onConfirm} />);
  return { onConfirm, button: screen.getByRole('button', { name: 'Put mains in' }) };
}

describe('HoldButton', () => {
  it('confirms once when a pointer holds it for its time', () => {
    const { button, onConfirm } = show();
    fireEvent.pointerDown(button, { button: 0 });
    pass(1950);
    expect(onConfirm).not.toHaveBeenCalled();
    expect(screen.getByRole('status').textContent).toContain('Keep holding');
    pass(100);
    expect(onConfirm).toHaveBeenCalledTimes(1);
    fireEvent.pointerUp(button);
    fireEvent.click(button);
    fireEvent.pointerDown(button, { button: 0 });
    pass(5000);
    expect(onConfirm).toHaveBeenCalledTimes(1);
    expect(screen.getByRole('status').textContent).toBe('Confirmed.');
  });

  it.each(['pointerUp', 'pointerLeave', 'pointerCancel', 'blur'] as const)('does nothing after %s, and says so', (end) => {
    const { button, onConfirm } = show();
    fireEvent.pointerDown(button, { button: 0 });
    pass(1500);
    if (end === 'pointerLeave') fireEvent.pointerOut(button);
    else fireEvent[end](button);
    pass(5000);
    expect(onConfirm).not.toHaveBeenCalled();
    expect(screen.getByRole('status').textContent).toContain('nothing was done');
  });

  it.each([' ', 'Enter'])('confirms when the key "%s" is held, repeats or not', (key) => {
    const { button, onConfirm } = show();
    fireEvent.keyDown(button, { key });
    pass(1000);
    fireEvent.keyDown(button, { key, repeat: true });
    pass(1050);
    expect(onConfirm).toHaveBeenCalledTimes(1);
  });

  it('is called off when the key comes up early', () => {
    const { button, onConfirm } = show();
    fireEvent.keyDown(button, { key: ' ' });
    pass(1000);
    fireEvent.keyUp(button, { key: ' ' });
    pass(5000);
    expect(onConfirm).not.toHaveBeenCalled();
  });

  it('takes two spaced clicks from a reader that cannot hold, and no single one', () => {
    const { button, onConfirm } = show();
    fireEvent.click(button);
    pass(500);
    fireEvent.click(button);
    expect(onConfirm).not.toHaveBeenCalled();
    expect(screen.getByRole('status').textContent).toContain('then press again');
    pass(1600);
    fireEvent.click(button);
    expect(onConfirm).toHaveBeenCalledTimes(1);
  });

  it('ignores a second mouse button', () => {
    const { button, onConfirm } = show();
    fireEvent.pointerDown(button, { button: 2 });
    pass(5000);
    expect(onConfirm).not.toHaveBeenCalled();
  });

  it('cannot be held while it is not open', () => {
    const { button, onConfirm } = show(true);
    expect(button.getAttribute('aria-disabled')).toBe('true');
    fireEvent.pointerDown(button, { button: 0 });
    fireEvent.keyDown(button, { key: 'Enter' });
    fireEvent.click(button);
    pass(5000);
    expect(onConfirm).not.toHaveBeenCalled();
  });
});
