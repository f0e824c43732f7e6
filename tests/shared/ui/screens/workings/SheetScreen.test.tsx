import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { SHEETS } from '@/shared/workings/list';
import { routeParams } from '@/tests/shared/ui/routerDouble';

import type { Bench } from './renderSheetScreen';
import { renderSheetScreen, workshop } from './renderSheetScreen';

const answer = () => within(screen.getByRole('status', { name: 'Answer' })).getByRole('heading').textContent;
const field = (name: string) => screen.getByLabelText<HTMLInputElement>(name);
const type = (name: string, value: string) => fireEvent.change(field(name), { target: { value } });
const press = (name: string) => fireEvent.click(screen.getByRole('button', { name }));
const said = () => screen.getByRole('status', { name: 'Done' }).textContent;
const five = { nominalVolts: '5', tolerancePercent: '5', guardVolts: '0', readingVolts: '' };

let bench: Bench;
beforeEach(() => {
  for (const key of Object.keys(routeParams)) delete routeParams[key];
  bench = workshop();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('SheetScreen', () => {
  it.each(SHEETS.map((sheet) => [sheet.id, sheet] as const))(
    'shows %s with question, answer, formula, source and validity',
    (id, sheet) => {
      renderSheetScreen(id);
      expect(answer()).not.toContain('No answer yet');
      expect(screen.getByText(sheet.question)).toBeTruthy();
      for (const part of ['Formula, with these numbers', 'In symbols', 'Holds for', 'Source'])
        expect(screen.getByRole('heading', { name: part })).toBeTruthy();
      expect(screen.queryByText(/NaN|undefined|\[object/)).toBeNull();
    },
  );

  it('shows the answer of what stands in the address', () => {
    renderSheetScreen('rail-limits', five);
    expect(answer()).toBe('4.75 V to 5.25 V.');
  });

  it('works out again with every change and puts it into the address', () => {
    renderSheetScreen('rail-limits', five);
    type('Tolerance, %', '10');
    expect(answer()).toBe('4.5 V to 5.5 V.');
    expect(routeParams['tolerancePercent']).toBe('10');
  });

  it('asks back at the field, keeps what was typed in the address too, and shows no stale answer', () => {
    renderSheetScreen('rail-limits');
    type('Nominal volts, V', '1,234');
    expect(screen.getByRole('alert').textContent).toContain('Do you mean 1.234 or 1234?');
    expect(answer()).toContain('No answer yet. Nominal volts: Do you mean');
    expect(field('Nominal volts, V').value).toBe('1,234');
    expect(routeParams['nominalVolts']).toBe('1,234');
  });

  it('opens a link with a fault in it at that fault', () => {
    renderSheetScreen('rail-limits', { ...five, tolerancePercent: '12 Ω' });
    expect(field('Tolerance, %').value).toBe('12 Ω');
    expect(field('Tolerance, %').getAttribute('aria-invalid')).toBe('true');
    expect(screen.queryByRole('button', { name: 'Note in a record' })).toBeNull();
  });

  it('says so when there is no such sheet', () => {
    renderSheetScreen('perpetual-motion');
    expect(screen.getByRole('heading', { name: 'No such sheet' })).toBeTruthy();
  });
});

describe('the link of a sheet', () => {
  it('carries what is typed', async () => {
    const writeText = vi.fn(async (_: string) => undefined);
    vi.stubGlobal('navigator', { ...navigator, clipboard: { writeText } });
    renderSheetScreen('rail-limits', five);
    type('Nominal volts, V', '-12');
    press('Copy the link');
    await waitFor(() => expect(said()).toContain('The link is copied'));
    const url = new URL(writeText.mock.calls[0]?.[0] ?? '');
    expect(url.pathname).toBe('/workings/rail-limits');
    expect(Object.fromEntries(url.searchParams)).toEqual({ ...five, nominalVolts: '-12' });
  });

  it('is shown where the browser does not copy', async () => {
    vi.stubGlobal('navigator', { ...navigator, clipboard: undefined });
    renderSheetScreen('rail-limits', five);
    press('Copy the link');
    await waitFor(() => expect(field('Link to this sheet').value).toContain('/workings/rail-limits?nominalVolts=5'));
  });
});

describe('taking a sheet from a machine', () => {
  const choose = async (label: string, option: RegExp) => {
    const select = await screen.findByLabelText<HTMLSelectElement>(label);
    const found = [...select.options].find((o) => option.test(o.textContent));
    fireEvent.change(select, { target: { value: found?.value } });
  };

  it('says what it will fill in, fills it, marks the fields and lets them be changed', async () => {
    renderSheetScreen('rail-limits', { ...five, guardVolts: '30m' });
    press('Take from a machine');
    await choose('Machine', /Corvane 12/);
    await choose('Which rail', /\+5 V/);
    expect(await screen.findByText(/Will be filled in: Nominal volts 5 V, Tolerance 5 %/)).toBeTruthy();
    press('Fill in');
    expect(said()).toBe('Filled in from Corvane 12, serial 0097, profile revision 3.');
    expect(field('Guard band, V').value).toBe('30m');
    expect(screen.getAllByText(/from the profile of Corvane 12/)).toHaveLength(2);
    expect(routeParams['from-machine']).toContain('Corvane 12');
    type('Tolerance, %', '2');
    expect(screen.getAllByText(/from the profile of Corvane 12/)).toHaveLength(1);
    expect(routeParams['from-fields']).toBe('nominalVolts');
  });

  it('says so when the workshop has no machine, and when the network is away', async () => {
    bench.machines = [];
    renderSheetScreen('rail-limits', five);
    press('Take from a machine');
    expect(await screen.findByText(/This workshop has no machine yet/)).toBeTruthy();
    cleanup();
    bench.away = true;
    renderSheetScreen('rail-limits', five);
    press('Take from a machine');
    expect(await within(screen.getByRole('dialog')).findByRole('alert', {}, { timeout: 20_000 })).toBeTruthy();
    press('Not now');
    expect(answer()).toBe('4.75 V to 5.25 V.');
  }, 30_000);
});

describe('noting a sheet in a record', () => {
  it('sends inputs in SI and the headline to the only open run', async () => {
    renderSheetScreen('rail-limits', five);
    press('Note in a record');
    expect(await screen.findByRole('radio', { name: /Corvane 12, serial 0097/, checked: true })).toBeTruthy();
    await waitFor(() => expect(screen.getByRole('button', { name: 'Note it' }).getAttribute('aria-disabled')).not.toBe('true'));
    press('Note it');
    await waitFor(() => expect(said()).toBe('Noted in the record of Corvane 12, serial 0097.'));
    expect(bench.posted).toHaveLength(1);
    expect(bench.posted[0]?.body.entries[0]?.event).toMatchObject({
      type: 'NOTE',
      sheet: 'rail-limits',
      inputs: { nominalVolts: 5, tolerancePercent: 5, guardVolts: 0, readingVolts: null },
      headline: '4.75 V to 5.25 V.',
    });
  });

  it('says what to do where no run is open', async () => {
    bench.runs = [];
    renderSheetScreen('rail-limits', five);
    press('Note in a record');
    expect(await screen.findByText(/You have no open run/)).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Note it' }).getAttribute('aria-disabled')).toBe('true');
  });
});
