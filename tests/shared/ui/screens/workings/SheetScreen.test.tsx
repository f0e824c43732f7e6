import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { SheetScreen } from '@/shared/ui/screens/workings/SheetScreen';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';
import { routeParams } from '@/tests/shared/ui/routerDouble';

const answer = () => within(screen.getByRole('status', { name: 'Answer' })).getByRole('heading').textContent;

describe('SheetScreen', () => {
  it('shows the answer of what stands in the address', () => {
    renderSheet(
      <SheetScreen sheetId="rail-limits" given={{ nominalVolts: '5', tolerancePercent: '5', guardVolts: '0', readingVolts: '' }} />,
    );
    expect(answer()).toBe('4.75 V to 5.25 V.');
  });

  it('works out again with every change and puts it into the address', () => {
    renderSheet(
      <SheetScreen sheetId="rail-limits" given={{ nominalVolts: '5', tolerancePercent: '5', guardVolts: '0', readingVolts: '' }} />,
    );
    fireEvent.change(screen.getByLabelText('Tolerance, %'), { target: { value: '10' } });
    expect(answer()).toBe('4.5 V to 5.5 V.');
    expect(routeParams['tolerancePercent']).toBe('10');
  });

  it('asks back at the field, keeps what was typed and shows no stale answer', () => {
    renderSheet(<SheetScreen sheetId="rail-limits" given={{}} />);
    fireEvent.change(screen.getByLabelText('Nominal volts, V'), { target: { value: '1,234' } });
    expect(screen.getByRole('alert').textContent).toContain('Do you mean 1.234 or 1234?');
    expect(answer()).toContain('No answer yet');
    expect((screen.getByLabelText('Nominal volts, V') as HTMLInputElement).value).toBe('1,234');
  });

  it('says so when there is no such sheet', () => {
    renderSheet(<SheetScreen sheetId="perpetual-motion" given={{}} />);
    expect(screen.getByRole('heading', { name: 'No such sheet' })).toBeTruthy();
  });
});
