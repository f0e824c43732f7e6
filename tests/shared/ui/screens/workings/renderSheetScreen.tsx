/** Renders a sheet with a server in memory: who is signed in, machines with their profiles, open runs, and entries that it takes. */
import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import { vi } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import { createQueryClient } from '@/shared/ui/api/queryClient';
import { SheetScreen } from '@/shared/ui/screens/workings/SheetScreen';
import { ThemeProvider } from '@/shared/ui/theme/useTheme';
import { benchProfile } from '@/tests/flows/support/bench';

import { ANN } from '../../api/shop';
import { bundleOf } from '../run/atBench';

const hash = '0'.repeat(64);
export const MACHINE = '0198c0de-0000-4000-8000-0000000000c1';
const machine = {
  id: MACHINE,
  name: 'Corvane 12',
  serial: '0097',
  machineClass: 'Test',
  revision: 3,
  profileHash: hash,
  openRun: null,
  release: null,
  tags: 0,
};

export interface Bench {
  /** every request that changes something */
  posted: { url: string; body: { entries: { id: string; seq: number; event: Record<string, unknown> }[] } }[];
  machines: unknown[];
  runs: unknown[];
  away: boolean;
}

/** The network of the workshop; change it before or after the page is shown. */
export function workshop(): Bench {
  const bench: Bench = { posted: [], machines: [machine], runs: [bundleOf().run], away: false };
  const answers: [RegExp, () => unknown][] = [
    [
      /\/machines\/[^/]+$/,
      () => ({ machine, profile: { revision: 3, hash, document: benchProfile }, runs: [], releases: [], staysFitted: [] }),
    ],
    [/\/machines$/, () => ({ machines: bench.machines })],
    [/\/settings$/, () => ({ settings: defaultSettings, hash })],
    [/\/runs\?/, () => ({ runs: bench.runs })],
    [/\/entries/, () => ({ entries: [], head: { seq: 0, hash } })],
    [
      /./,
      () => ({
        person: { id: ANN, code: 'AB', name: 'Ann Bell', roles: ['restorer'] },
        roles: ['restorer'],
        workshop: { id: ANN, name: 'Bench' },
      }),
    ],
  ];
  vi.stubGlobal('fetch', async (url: string, init?: RequestInit) => {
    if (bench.away) throw new TypeError('Failed to fetch');
    if (init?.method === 'POST') {
      const body = JSON.parse(String(init.body)) as Bench['posted'][number]['body'];
      bench.posted.push({ url, body });
      const { run } = bundleOf();
      const at = '2026-01-05T10:00:00.000Z';
      const entries = body.entries.map(({ id, seq, event }) => ({
        id,
        seq,
        run: run.id,
        at,
        monotonic: 0,
        receivedAt: at,
        actor: ANN,
        kind: 'addendum',
        body: { event },
        prev: hash,
        hash,
      }));
      return new Response(JSON.stringify({ entries, head: { seq: entries.length, hash } }), { status: 200 });
    }
    const [, body] = answers.find(([path]) => path.test(url)) ?? [];
    return new Response(JSON.stringify(body?.()), { status: 200 });
  });
  return bench;
}

/** Shows the sheet at an address. */
export function renderSheetScreen(sheetId: string, given: Record<string, string> = {}) {
  return render(
    <QueryClientProvider client={createQueryClient()}>
      <ThemeProvider>
        <SheetScreen sheetId={sheetId} given={given} />
      </ThemeProvider>
    </QueryClientProvider>,
  );
}
