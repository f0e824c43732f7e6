import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { Button } from '@/shared/ui/components/Button';
import { StopBar } from '@/shared/ui/components/StopBar';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

/** Least height that a button's own style gives it, in CSS pixels. */
function leastHeight(button: HTMLElement): number {
  return Number.parseFloat(getComputedStyle(button).minHeight);
}

describe('Button', () => {
  it('does its thing once a press, and nothing while disabled', () => {
    const onPress = vi.fn();
    renderSheet(
      <>
        <Button label="Return" onPress={onPress} />
        <Button label="Sign" disabled onPress={onPress} />
      </>,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Return' }));
    fireEvent.click(screen.getByRole('button', { name: 'Sign' }));
    expect(onPress).toHaveBeenCalledTimes(1);
  });

  it('can be hit with a glove: 48 px, an answer 64 px', () => {
    renderSheet(
      <>
        <Button label="Return" onPress={() => undefined} />
        <BigAnswer label="Not sure" onPress={() => undefined} />
      </>,
    );
    expect(leastHeight(screen.getByRole('button', { name: 'Return' }))).toBeGreaterThanOrEqual(48);
    expect(leastHeight(screen.getByRole('button', { name: 'Not sure' }))).toBeGreaterThanOrEqual(64);
  });
});

describe('BigAnswer', () => {
  it('reads its second line with its first', () => {
    const onPress = vi.fn();
    renderSheet(<BigAnswer label="Bright" detail="stays bright after 2 s" onPress={onPress} />);
    fireEvent.click(screen.getByRole('button', { name: 'Bright: stays bright after 2 s' }));
    expect(onPress).toHaveBeenCalledTimes(1);
  });
});

describe('StopBar', () => {
  it('is one touch', () => {
    const onPress = vi.fn();
    renderSheet(<StopBar onPress={onPress} />);
    fireEvent.click(screen.getByRole('button', { name: 'STOP, MAKE SAFE' }));
    expect(onPress).toHaveBeenCalledTimes(1);
  });
});
