import { QueryClientProvider } from '@tanstack/react-query';
import { act, cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import type { MachineEvent } from '@/flows/machine/events';
import { GIVES, TAKES } from '@/shared/contract/handOver';
import type { RunBundle } from '@/shared/contract/runs';
import { createQueryClient } from '@/shared/ui/api/queryClient';
import { BOOT } from '@/shared/ui/hooks/benchClock';
import { handOverBar } from '@/shared/ui/screens/run/handOverBar';
import { StrandedRun } from '@/shared/ui/screens/run/StrandedRun';
import { TakeOver } from '@/shared/ui/screens/run/TakeOver';
import { ThemeProvider } from '@/shared/ui/theme/useTheme';
import { Bench, program } from '@/tests/flows/support/bench';
import { dead, fit, hands, look, treeOf } from '@/tests/flows/support/steps';

import { ANN, Shop } from '../../api/shop';
import { atBench, bundleOf } from './atBench';

// what is looked for by role takes its time on a busy machine
vi.setConfig({ testTimeout: 20_000 });

const SAM = '33333333-3333-4333-8333-333333333333';
const CLIP = { id: 'own-clip', name: 'clip on C1', class: 'clip', area: 'clip', point: 'raw' };
const tree = treeOf([look('d1'), dead('d1', 'clip'), fit('clip', CLIP, 'touch'), hands('touch', 'done')]);
const MINUTE_MS = 60_000;

/** A server that holds a run which Ann has led to the step that touches. */
function led(lead: (bench: Bench) => void): Shop {
  const shop = new Shop();
  const bench = new Bench(program(tree));
  bench.state = { ...bench.state, context: { ...bench.state.context, restorer: ANN, restorers: [ANN] } };
  bench.at = Date.now() - 5 * MINUTE_MS;
  bench.stamp = (event) => ({ ...event, at: bench.at, monotonic: Math.round(performance.now() - (Date.now() - bench.at)), boot: BOOT }) as MachineEvent;
  const once = bench.try.bind(bench);
  bench.try = (event) => {
    const taken = once(event);
    if (taken.ok) shop.take(bench.stamp(event));
    return taken;
  };
  bench.pass().answer('good').dead().answer('done');
  lead(bench);
  return shop;
}
const offered = (note?: string) => led((b) => b.do({ type: 'HANDED_OVER', by: ANN, to: SAM, meaning: GIVES, ...(note === undefined ? {} : { note }) }));

const title = () => screen.getByRole('heading', { level: 1 }).textContent;
const press = (name: string) =>
  act(async () => {
    fireEvent.click(screen.getByRole('button', { name }));
    await Promise.resolve();
  });
const fill = (label: string, text: string) => fireEvent.change(screen.getByLabelText(label), { target: { value: text } });

let sent: { url: string; body: Record<string, unknown> }[] = [];
let answer: { status: number; body: unknown } = { status: 500, body: {} };
const notTheNetwork = { code: 'wrong-password', say: 'The password is not right. Nothing was signed.' };

beforeEach(() => {
  sent = [];
  answer = { status: 422, body: notTheNetwork };
  vi.useFakeTimers({ toFake: ['Date', 'performance'] });
  vi.advanceTimersByTime(10 * MINUTE_MS);
  vi.stubGlobal('fetch', async (url: string, init?: RequestInit) => {
    sent.push({ url, body: JSON.parse(String(init?.body)) as Record<string, unknown> });
    return new Response(JSON.stringify(answer.body), { status: answer.status });
  });
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

describe('what bars a hand-over', () => {
  const trouble = (code: 'no-network' | 'session-expired') => ({ kind: 'problem', code, say: `problem ${code}.`, retryable: true, rule: null, faults: [], details: {} }) as const;
  it('is a live bench, a missing network, or answers that have not arrived', () => {
    const fine = { live: false, online: true, saved: { waiting: 0, trouble: null } };
    expect(handOverBar(fine)).toBeNull();
    expect(handOverBar({ ...fine, saved: { waiting: 2, trouble: null } })).toBeNull();
    expect(handOverBar({ ...fine, live: true, online: false })).toMatch(/^The bench may be live. Press Stop/);
    expect(handOverBar({ ...fine, online: false })).toMatch(/^There is no network. Both of you sign/);
    expect(handOverBar({ ...fine, saved: { waiting: 0, trouble: trouble('no-network') } })).toMatch(/^There is no network/);
    expect(handOverBar({ ...fine, saved: { waiting: 1, trouble: trouble('session-expired') } })).toBe('What you answered has to reach the server first: problem session-expired.');
  });
});

describe('offering a run', () => {
  const openForm = async () => {
    await atBench({ tree, shop: led(() => undefined) });
    fireEvent.click(screen.getByRole('button', { name: /show the way/ }));
    await press('Hand it over');
    return within(screen.getByRole('dialog', { name: 'Hand this run over' }));
  };
  it('names who may take it, what is signed, and asks for both before anything is sent', async () => {
    const form = await openForm();
    expect(form.getByText(GIVES)).toBeTruthy();
    expect(within(form.getByLabelText('Who takes it')).getAllByRole('option').map((o) => o.textContent)).toEqual(expect.arrayContaining(['Sam Holt, SA']));
    expect(form.queryByText(/Ann Bell/)).toBeNull();
    await press('Sign and offer the run');
    expect(form.getByText('Choose who takes the run.')).toBeTruthy();
    expect(form.getByText('Your password signs this.')).toBeTruthy();
    expect(sent).toEqual([]);
  });
  it('takes the next place in the record; a wrong password is said at its field', async () => {
    const form = await openForm();
    fireEvent.change(form.getByLabelText('Who takes it'), { target: { value: SAM } });
    fill('Word for them, if you like', ' C1 reads low. ');
    fill('Your password', 'a guess');
    await press('Sign and offer the run');
    expect(await form.findByText(notTheNetwork.say)).toBeTruthy();
    expect(sent).toMatchObject([{ url: expect.stringMatching(/\/hand-over$/), body: { to: SAM, note: 'C1 reads low.', password: 'a guess' } }]);
    expect(sent[0]?.body['seq']).toBeGreaterThan(10);
  });
  it('is barred without a network, with the reason in place of the form', async () => {
    vi.stubGlobal('navigator', { ...globalThis.navigator, onLine: false });
    const form = await openForm();
    expect(form.getByText(/There is no network. Both of you sign on the server/)).toBeTruthy();
    expect(form.queryByLabelText('Your password')).toBeNull();
    expect(screen.getAllByRole('button', { name: 'STOP, MAKE SAFE' }).length).toBeGreaterThan(0);
  });
});

describe('a run that is offered', () => {
  it('says to whom, and can be taken back', async () => {
    await atBench({ tree, shop: offered() });
    expect(title()).toBe('Offered to Sam Holt');
    await press('Take it back and go on');
    await waitFor(() => expect(title()).toBe('Make safe: take every source out'));
  });
});

describe('reading back', () => {
  const atReadBack = () =>
    led((b) => {
      b.do({ type: 'HANDED_OVER', by: ANN, to: SAM, meaning: GIVES }).do({ type: 'TAKEN_OVER', by: SAM, senior: false, meaning: TAKES });
      b.pass().dead().do({ type: 'WARNING_READ', step: '~read-back' });
    });
  it('asks for one thing after the other, as the record has it, and comes back to the step', async () => {
    await atBench({ tree, shop: atReadBack() });
    expect(title()).toBe('Read back what is on and what is in');
    for (const label of ['Load: nothing is connected to the rails', 'clip on C1: is in', 'Nothing else temporary is in']) {
      await waitFor(() => expect(within(screen.getByRole('group', { name: 'Answers' })).getByText(label)).toBeTruthy());
      await press('Yes, it is so');
    }
    await waitFor(() => expect(title()).toBe('touch'));
  });
  it('ends the run as stopped when something is not as the record has it', async () => {
    await atBench({ tree, shop: atReadBack() });
    await press('Yes, it is so');
    await waitFor(() => expect(screen.getByText('clip on C1: is in')).toBeTruthy());
    await press('No, it is not');
    await waitFor(() => expect(screen.getByText('Nothing else temporary is in')).toBeTruthy());
    await press('Yes, it is so');
    await waitFor(() => expect(screen.queryByText('Nothing else temporary is in')).toBeNull());
    await press('I have read this');
    await press('It stays as it is');
    await waitFor(() => expect(title()).toBe('Safe: every source out, proved dead'));
    expect(screen.getByText(/this run can only be closed as stopped/)).toBeTruthy();
  });
});

const inPage = (what: React.ReactNode) =>
  render(
    <QueryClientProvider client={createQueryClient()}>
      <ThemeProvider>{what}</ThemeProvider>
    </QueryClientProvider>,
  );

describe('a run that is offered to me', () => {
  const bundle = (): RunBundle => {
    const { entries } = offered('The fan is loose.');
    const plain = bundleOf(tree);
    return { ...plain, entries, run: { ...plain.run, offeredTo: SAM, head: { ...plain.run.head, seq: entries.length }, step: { key: 'touch', title: 'Offered', stud: '4', total: 4 } } };
  };
  it('shows who gives it, their word, what will be read back, and what is signed', () => {
    inPage(<TakeOver bundle={bundle()} onTaken={() => Promise.resolve()} />);
    expect(title()).toBe('Ann Bell offers you this run');
    for (const words of ['The fan is loose.', 'It was paused at “touch”.', 'Load: nothing is connected to the rails', 'clip on C1: is in', TAKES]) expect(screen.getByText(words)).toBeTruthy();
    expect(screen.getByText(/Nothing that was proved dead counts for you/)).toBeTruthy();
  });
  it('is signed with the own password, behind the record as it was read', async () => {
    const taken = vi.fn(() => Promise.resolve());
    const shown = bundle();
    inPage(<TakeOver bundle={shown} onTaken={taken} />);
    await press('Sign and take the run over');
    expect(screen.getByText('Your password signs this.')).toBeTruthy();
    fill('Your password', 'a guess');
    await press('Sign and take the run over');
    expect(await screen.findByText(notTheNetwork.say)).toBeTruthy();
    expect(taken).not.toHaveBeenCalled();
    expect(sent).toMatchObject([{ url: expect.stringMatching(/\/take-over$/), body: { seq: shown.entries.length + 1, password: 'a guess' } }]);
    answer = { status: 409, body: { code: 'not-offered', say: 'This run is not offered to you, or the offer was taken back.' } };
    fill('Your password', 'secret');
    await press('Sign and take the run over');
    // the page looks again at where the run stands
    await waitFor(() => expect(taken).toHaveBeenCalledTimes(1));
    expect(sent[1]?.body['id']).toBe(sent[0]?.body['id']);
  });
});

describe('a run of another engine', () => {
  it('is closed by a senior, with a reason and a signature; everybody reads first how the bench is made safe', async () => {
    inPage(<StrandedRun bundle={bundleOf(tree)} senior onClosed={() => Promise.resolve()} />);
    expect(title()).toBe('This run cannot go on');
    expect(screen.getByText(/Take every source as live/)).toBeTruthy();
    await press('Sign and close the run');
    expect(screen.getByText('Say why, and what you found at the bench.')).toBeTruthy();
    expect(sent).toEqual([]);
    fill('Why, and what you found', 'Rules changed; bench is dead.');
    fill('Your password', 'a guess');
    await press('Sign and close the run');
    expect(await screen.findByText(notTheNetwork.say)).toBeTruthy();
    expect(sent).toMatchObject([{ url: expect.stringMatching(/\/close$/), body: { seq: 1, reason: 'Rules changed; bench is dead.' } }]);
  });
  it('offers nothing to anybody else', () => {
    inPage(<StrandedRun bundle={bundleOf(tree)} senior={false} onClosed={() => Promise.resolve()} />);
    expect(screen.getByText(/A senior has to close this run/)).toBeTruthy();
    expect(screen.queryByRole('button')).toBeNull();
    expect(screen.getByText(/Take every source as live/)).toBeTruthy();
  });
});
