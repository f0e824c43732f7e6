import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { WarningGate } from '@/shared/ui/components/WarningGate';
import type { Hazard } from '@/shared/ui/components/WarningGate';
import { worstSignal } from '@/shared/ui/components/warningVisual';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

const hot: Hazard = {
  id: 'hot',
  signal: 'caution',
  sign: 'hot',
  hazard: 'Load resistors',
  result: 'Hot for ten minutes.',
  avoid: ['Let them cool.'],
};
const mains: Hazard = {
  id: 'mains',
  signal: 'danger',
  sign: 'electricity',
  hazard: '230 V on the inlet',
  result: 'Shock can kill.',
  avoid: ['Hands off.', 'Second person present.'],
};

describe('WarningGate', () => {
  it('stands under the worst word of its hazards and names each with result and avoidance', () => {
    renderSheet(<WarningGate hazards={[hot, mains]} acknowledged={false} onAcknowledge={() => undefined} />);
    const gate = screen.getByRole('region', { name: 'DANGER: read before you go on' });
    expect(screen.getByRole('heading', { name: 'DANGER' })).toBeTruthy();
    for (const words of [hot.hazard, hot.result, ...hot.avoid, mains.hazard, mains.result, ...mains.avoid])
      expect(gate.textContent).toContain(words);
  });

  it('defers to local codes, the maker and licensed practice', () => {
    renderSheet(<WarningGate hazards={[mains]} acknowledged={false} onAcknowledge={() => undefined} />);
    expect(screen.getByRole('region').textContent).toContain('Local codes, the maker’s data and licensed practice come first.');
  });

  it('asks once that it has been read', () => {
    const onAcknowledge = vi.fn();
    renderSheet(<WarningGate hazards={[mains]} acknowledged={false} onAcknowledge={onAcknowledge} />);
    fireEvent.click(screen.getByRole('button', { name: 'I have read this' }));
    expect(onAcknowledge).toHaveBeenCalledTimes(1);
  });

  it('says that it was read, and asks no more', () => {
    renderSheet(<WarningGate hazards={[mains]} acknowledged onAcknowledge={() => undefined} />);
    expect(screen.queryByRole('button')).toBeNull();
    expect(screen.getByRole('status').textContent).toBe('Read');
  });
});

describe('worstSignal', () => {
  it('orders danger, warning, caution, notice, as ANSI Z535.4 does (from memory)', () => {
    expect(worstSignal(['notice', 'warning', 'caution'])).toBe('warning');
    expect(worstSignal(['caution', 'danger'])).toBe('danger');
    expect(worstSignal([])).toBe('notice');
  });
});
