import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import type { Hold } from '@/shared/contract/holds';
import { createQueryClient } from '@/shared/ui/api/queryClient';
import { HoldSheet } from '@/shared/ui/screens/holds/HoldSheet';
import { ThemeProvider } from '@/shared/ui/theme/useTheme';

import { ANN } from '../../api/shop';
import { bundleOf } from '../run/atBench';

const bundle = bundleOf();
const hold: Hold = {
  run: bundle.run,
  entry: '0198c0de-0000-7000-8000-0000000000aa',
  nextSeq: 31,
  step: { key: 'lamp', title: 'Through the lamp', asks: 'Switch on.' },
  reason: 'Your countersign opens the first limited mains power.',
  askedBy: ANN,
  askedAt: '2026-01-05T10:00:00.000Z',
  band: 'proved-dead',
  facts: [{ name: 'Earth', value: 'proved' }],
  readings: [
    {
      id: '0198c0de-0000-7000-8000-0000000000ab',
      run: bundle.run.id,
      seq: 20,
      at: '2026-01-05T09:50:00.000Z',
      monotonic: 0,
      receivedAt: '2026-01-05T09:50:00.000Z',
      actor: ANN,
      kind: 'reading',
      body: {
        event: {
          type: 'READING',
          step: 'earth',
          row: 'earth',
          value: 0.08,
          typed: '80m',
          instrument: null,
          at: 1,
          monotonic: 1,
          boot: 'b',
        },
      },
      prev: '0'.repeat(64),
      hash: '1'.repeat(64),
    },
  ],
  mayAnswer: true,
};

/** The network: holds are read, answers are refused or taken. */
let answered: { url: string; body: Record<string, unknown> }[] = [];
let answer: { status: number; body: unknown } = { status: 500, body: {} };
let open: Hold[] = [];

beforeEach(() => {
  answered = [];
  open = [hold];
  vi.stubGlobal('fetch', async (url: string, init?: RequestInit) => {
    if (init?.method === 'GET') return new Response(JSON.stringify({ holds: open }), { status: 200 });
    answered.push({ url, body: JSON.parse(String(init?.body)) as Record<string, unknown> });
    return new Response(JSON.stringify(answer.body), { status: answer.status });
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

async function shown() {
  render(
    <QueryClientProvider client={createQueryClient()}>
      <ThemeProvider>
        <HoldSheet bundle={bundle} />
      </ThemeProvider>
    </QueryClientProvider>,
  );
  await screen.findByRole('heading', { name: 'Countersign wanted: Through the lamp' });
}
const fill = (label: string, text: string) => fireEvent.change(screen.getByLabelText(label), { target: { value: text } });
const press = (name: string) => fireEvent.click(screen.getByRole('button', { name }));

describe('HoldSheet', () => {
  it('shows what is signed: who asks, the facts, and the readings as they were asked for', async () => {
    await shown();
    expect(screen.getByText(/Asked by Ann Bell/)).toBeTruthy();
    expect(screen.getByText(/Your countersign opens the first limited mains power/)).toBeTruthy();
    expect(screen.getByText(/^Earth pin of the plug to bare metal of the case \(Earth/)).toBeTruthy();
    expect(screen.getByText('80 mΩ')).toBeTruthy();
  });

  it('asks for the password, and for a reason to refuse, before anything is sent', async () => {
    await shown();
    press('Refuse');
    expect(screen.getByText(/Say why you refuse/)).toBeTruthy();
    expect(screen.getByText(/Your password signs this/)).toBeTruthy();
    expect(answered).toHaveLength(0);
  });

  it('says a wrong password at its field and signs nothing', async () => {
    answer = { status: 422, body: { code: 'wrong-password', say: 'The password is not right. Nothing was signed.' } };
    await shown();
    fill('Your password', 'wrong');
    press('Give the countersign');
    expect(await screen.findByText('The password is not right. Nothing was signed.')).toBeTruthy();
    expect(answered[0]?.body).toMatchObject({ answer: 'given', seq: 31 });
  });

  it('sends the reason with a refusal, under the same id on a second try', async () => {
    answer = { status: 500, body: { code: 'internal', say: 'Something broke on the server. Nothing was written; try again.' } };
    await shown();
    fill('Reason or remark', ' Fit the fan first. ');
    fill('Your password', 'secret');
    press('Refuse');
    expect(await screen.findByText(/Nothing was written; try again/)).toBeTruthy();
    fill('Your password', 'secret');
    press('Refuse');
    await waitFor(() => expect(answered).toHaveLength(2));
    expect(answered[1]?.body).toMatchObject({ answer: 'refused', reason: 'Fit the fan first.' });
    expect(answered[1]?.body['id']).toBe(answered[0]?.body['id']);
  });

  it('lets nobody countersign the own run', async () => {
    open = [{ ...hold, mayAnswer: false }];
    await shown();
    expect(screen.getByText(/This is your own run/)).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Give the countersign' })).toBeNull();
  });

  it('says when the run has gone on', async () => {
    answer = { status: 409, body: { code: 'no-hold', say: 'No countersign is awaited here any more.' } };
    await shown();
    fill('Your password', 'secret');
    open = [];
    press('Give the countersign');
    expect(await screen.findByRole('heading', { name: 'No countersign is awaited here' })).toBeTruthy();
  });
});
