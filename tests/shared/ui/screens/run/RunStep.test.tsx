import { act, cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import type { BareEvent } from '@/shared/ui/hooks/benchClock';
import { BOOT, stamp } from '@/shared/ui/hooks/benchClock';
import { Bench, lampTreeJson, must, program, lampTree } from '@/tests/flows/support/bench';
import { parseTree } from '@/flows/document/parseTree';
import type { Tree } from '@/flows/document/tree';

import { Shop, wordOf } from '../../api/shop';
import { atBench } from './atBench';

const title = () => screen.getByRole('heading', { level: 1 }).textContent;
const answers = () => within(screen.getByRole('group', { name: 'Answers' }));
const press = async (name: string | RegExp) => {
  await act(async () => {
    fireEvent.click(answers().getByRole('button', { name }));
    await Promise.resolve();
  });
};
const type = (text: string) => fireEvent.change(screen.getByRole('textbox'), { target: { value: text } });

const MINUTE_MS = 60_000;

/** A server that holds a run which `lead` has brought somewhere, in this very load of the page. */
function ledTo(lead: (bench: Bench) => void, tree: Tree = lampTree): Shop {
  const shop = new Shop();
  const bench = new Bench(program(tree));
  // led by the page's own two clocks: by others it would have lapsed
  bench.at = Date.now() - 5 * MINUTE_MS;
  bench.stamp = (event: BareEvent) =>
    ({ ...event, at: bench.at, monotonic: Math.round(performance.now() - (Date.now() - bench.at)), boot: BOOT }) as ReturnType<
      typeof stamp
    >;
  const once = bench.try.bind(bench);
  bench.try = (event) => {
    const taken = once(event);
    if (taken.ok) shop.take(bench.stamp(event));
    return taken;
  };
  lead(bench);
  return shop;
}

beforeEach(() => {
  localStorage.clear();
  vi.useFakeTimers({ toFake: ['Date', 'performance'] });
  // the page has been open for a while
  vi.advanceTimersByTime(10 * MINUTE_MS);
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
});

describe('RunStep', () => {
  it('opens the bench with the first caution, then asks one thing after the other', async () => {
    await atBench();
    expect(title()).toBe('Open the bench');
    expect(answers().getByText(/Local electrical codes, the maker’s data and licensed practice come first/)).toBeTruthy();
    await press('I have read this');
    await waitFor(() => expect(answers().getByText(/Emergency-off of this bench/)).toBeTruthy());
    await press('No');
    await waitFor(() => expect(screen.getByText(/You said No: Emergency-off of this bench/)).toBeTruthy());
    expect(answers().getByText(/Local electrical codes/)).toBeTruthy();
  });

  it('shows a refusal where the answer was given, with its house rule, and stays', async () => {
    const unsafe = must(
      parseTree({
        ...lampTreeJson,
        steps: lampTreeJson.steps.map((s) =>
          s.id === 'look'
            ? {
                ...s,
                exits: [
                  { id: 'sound', label: 'Sound', on: ['answer'], to: 'earth' },
                  { id: 'damaged', label: 'Damaged', on: ['answer'], to: 'dead1', verdict: 'fail' },
                  { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' },
                ],
              }
            : s,
        ),
      }),
    );
    await atBench({ tree: unsafe, shop: ledTo((bench) => bench.pass(), unsafe) });
    expect(title()).toBe('Look it over');
    await press('Sound');
    const alert = answers().getByRole('alert');
    expect(alert.textContent).toMatch(/House rule H1/);
    expect(alert.textContent).toMatch(/“Earth” may not be entered/);
    expect(title()).toBe('Look it over');
  });

  it('takes a reading as typed, asks back what it cannot read, and names the verdict before it is sent', async () => {
    const { shop } = await atBench({ shop: ledTo((bench) => bench.pass().answer('sound').dead()) });
    await act(async () => fireEvent.click(screen.getByRole('button', { name: 'I have read this' })));
    await waitFor(() => expect(screen.getByRole('textbox', { name: /Earth pin of the plug.*in Ω/ })).toBeTruthy());
    expect(answers().getByText('at most 150 mΩ')).toBeTruthy();

    type('4.97 V');
    expect(screen.getByText(/That is volts; this step reads ohms/)).toBeTruthy();
    expect(answers().getByRole('button', { name: 'Record' }).getAttribute('aria-disabled')).toBe('true');
    type('1,234');
    expect(screen.getByText(/Do you mean 1.234 or 1234/)).toBeTruthy();
    await press('1.234 Ω');
    expect(answers().getByText(/High: 1.08 Ω beyond the limit/)).toBeTruthy();

    type('80m');
    expect(answers().getByText(/In: clear of the limit/)).toBeTruthy();
    await press('Record 80 mΩ');
    await waitFor(() => expect(title()).toBe('Insulation'));
    const sent = shop.entries.at(-1)?.body['event'];
    expect(sent).toMatchObject({ type: 'READING', typed: '80m', value: 0.08, instrument: { twoPole: false } });
  });

  it('sets the reading against its limit with the instrument in hand, while it is typed', async () => {
    const withSheet = must(
      parseTree({
        ...lampTreeJson,
        steps: lampTreeJson.steps.map((s) => (s.id === 'earth' ? { ...s, workings: { sheet: 'reading-limit' } } : s)),
      }),
    );
    await atBench({
      tree: withSheet,
      shop: ledTo((bench) => bench.pass().answer('sound').dead().do({ type: 'WARNING_READ', step: 'earth' }), withSheet),
    });
    const words = () => screen.getByText('With this instrument:').parentElement?.textContent;
    expect(words()).toMatch(/^With this instrument: Clearly in up to 14\d\S* mΩ with this instrument\.$/);
    type('149m');
    expect(words()).toMatch(/^With this instrument: In, but close: this instrument cannot be sure\. 149 mΩ ± /);
    type('300m');
    expect(words()).toMatch(/^With this instrument: Out, high: 300 mΩ ± /);
  });

  it('names the instruments that cannot be used, with the reason', async () => {
    await atBench({ shop: ledTo((bench) => bench.pass().answer('sound').dead().do({ type: 'WARNING_READ', step: 'earth' })) });
    fireEvent.click(screen.getByRole('button', { name: /^Meter: M1/ }));
    const dialog = within(screen.getByRole('dialog', { name: 'Which instrument?' }));
    expect(dialog.getByText(/M3, Meter M3: Out of date since 2025-01-01/)).toBeTruthy();
    expect(dialog.queryByRole('radio', { name: /M3/ })).toBeNull();
    expect(screen.getAllByRole('button', { name: 'STOP, MAKE SAFE' }).length).toBeGreaterThan(0);
  });

  it('makes safe on Stop at once, with the network away, and says that the answer waits', async () => {
    const { shop, disk } = await atBench({ shop: ledTo((bench) => bench.pass()) });
    shop.away = true;
    await act(async () => fireEvent.click(screen.getByRole('button', { name: 'STOP, MAKE SAFE' })));
    expect(title()).toBe('Make safe: take every source out');
    await waitFor(() => expect(screen.getByText(/1 answer waits to be sent: no network/)).toBeTruthy());
    expect([...disk.kept.values()].map((q) => wordOf(q.event))).toEqual(['STOP']);
  });

  it('keeps the answer and the step when the device has no room', async () => {
    const { disk } = await atBench({ shop: ledTo((bench) => bench.pass()) });
    disk.full = true;
    await press('Sound');
    expect(answers().getByText(/no room left/)).toBeTruthy();
    expect(title()).toBe('Look it over');
  });

  it('asks a senior by name, waits, and opens the guard when the countersign comes', async () => {
    const at: { bench: Bench | null } = { bench: null };
    const { shop, outbox } = await atBench({
      shop: ledTo((bench) => {
        at.bench = bench;
        bench.pass().answer('sound').dead().pass().pass().dead().do({ type: 'WARNING_READ', step: 'lamp' });
      }),
    });
    expect(screen.getByText(/first limited mains power/)).toBeTruthy();
    await press('Ask for the countersign');
    await waitFor(() => expect(screen.getByText('Waiting for a senior')).toBeTruthy());
    expect(screen.getByText(/Sam Holt, on their own device/)).toBeTruthy();
    await waitFor(() => expect(outbox.saved().waiting).toBe(0));
    shop.take(stamp({ type: 'HOLD_GIVEN', step: 'lamp', by: '33333333-3333-4333-8333-333333333333' }));
    await act(() => outbox.poll());
    const hold = answers().getByRole('button', { name: 'Tick all three first' });
    expect(hold.getAttribute('aria-disabled')).toBe('true');
    for (const box of screen.getAllByRole('checkbox')) fireEvent.click(box);
    expect(answers().getByRole('button', { name: 'Hold: power in' }).getAttribute('aria-disabled')).not.toBe('true');
  });

  it('shows the end, closes the record and offers to hand it in', async () => {
    await atBench({ shop: ledTo((bench) => bench.pass().answer('damaged').dead()) });
    expect(title()).toBe('Ask a senior');
    expect(screen.getByText('The run ends: referred to a senior')).toBeTruthy();
    await press('Close the record');
    await waitFor(() => expect(answers().getByRole('button', { name: 'Submit for review' })).toBeTruthy());
    expect(screen.queryByRole('button', { name: 'STOP, MAKE SAFE' })).toBeNull();
  });
});
