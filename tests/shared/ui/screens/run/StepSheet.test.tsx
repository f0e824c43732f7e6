import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import type { MachineEvent } from '@/flows/machine/events';
import { BOOT, stamp } from '@/shared/ui/hooks/benchClock';
import { Bench, lampTreeJson, must, program } from '@/tests/flows/support/bench';

import { Shop } from '../../api/shop';
import { atBench } from './atBench';

const tree = must(
  parseTree({
    ...lampTreeJson,
    steps: lampTreeJson.steps.map((s) => (s.id === 'look' ? { ...s, workings: { sheet: 'rail-limits' }, expect: 'Nothing burnt.' } : s)),
  }),
);

afterEach(() => {
  cleanup();
  vi.useRealTimers();
});

/** A run that stands at the look-over, whose step shows the limits of the rail. */
async function atLook() {
  const shop = new Shop();
  const bench = new Bench(program(tree));
  bench.boot = BOOT;
  const once = bench.try.bind(bench);
  bench.stamp = (event) => stamp(event);
  bench.try = (event) => {
    const sent = bench.stamp(event);
    bench.stamp = () => sent;
    const taken = once(event);
    bench.stamp = (next) => stamp(next);
    if (taken.ok) shop.take(sent);
    return taken;
  };
  bench.pass();
  return atBench({ tree, shop });
}

// the whole machine is compiled and played, which takes its time on a busy computer
describe('the workings of a step', { timeout: 20_000 }, () => {
  it('stand folded to their headline, and open in place with formula and source', async () => {
    await atLook();
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Look it over');
    expect(screen.getByText(/4\.75 V to 5\.25 V\./)).toBeTruthy();
    expect(screen.queryByRole('region', { name: 'Rail limits' })).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Show the workings' }));
    const sheet = within(screen.getByRole('region', { name: 'Rail limits' }));
    expect(sheet.getByText('From the profile of this machine: Nominal volts 5 V, Tolerance 5 %.')).toBeTruthy();
    expect(sheet.getByRole('heading', { name: 'Source' })).toBeTruthy();
    // the step is still there, with its answers
    expect(within(screen.getByRole('group', { name: 'Answers' })).getByRole('button', { name: 'Sound' })).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Fold the workings' }));
    expect(screen.queryByRole('region', { name: 'Rail limits' })).toBeNull();
  });

  it('go into the record of the run, which stays where it is', async () => {
    const { shop } = await atLook();
    fireEvent.click(screen.getByRole('button', { name: 'Show the workings' }));
    fireEvent.click(screen.getByRole('button', { name: 'Note in the record' }));
    await waitFor(() => expect(screen.getByText('Noted in the record of this run.')).toBeTruthy());
    await waitFor(() =>
      expect((shop.entries.at(-1)?.body as unknown as { event: MachineEvent }).event).toMatchObject({
        type: 'NOTE',
        sheet: 'rail-limits',
        headline: '4.75 V to 5.25 V.',
      }),
    );
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Look it over');
  });
});
