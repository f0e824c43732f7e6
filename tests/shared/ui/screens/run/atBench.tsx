/** A run on the page with its real machine and outbox, a server and a disk in memory. */
import { render } from '@testing-library/react';

import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import type { Program } from '@/flows/machine/compile';
import type { Entry } from '@/shared/contract/entries';
import type { RunBundle } from '@/shared/contract/runs';
import { headSeq } from '@/shared/ui/api/ledger';
import { createOutbox } from '@/shared/ui/api/outbox';
import type { Outbox } from '@/shared/ui/api/outbox';
import { useRunMachine } from '@/shared/ui/hooks/useRunMachine';
import { RunStep } from '@/shared/ui/screens/run/RunStep';
import { ThemeProvider } from '@/shared/ui/theme/useTheme';
import { benchProfile, lampTree, makeDeadTree, program } from '@/tests/flows/support/bench';

import { ANN, Disk, RUN, Shop } from '../../api/shop';

const range = (quantity: RunBundle['instruments'][number]['ranges'][number]['quantity'], fullScale: number, resolution: number) => ({
  quantity,
  fullScale,
  resolution,
  percent: 0.5,
  counts: 3,
});
const instrument = (tag: string, more: Partial<RunBundle['instruments'][number]>): RunBundle['instruments'][number] => ({
  id: `0198c0de-0000-4000-8000-00000000000${tag.slice(1)}`,
  tag,
  name: `Meter ${tag}`,
  kind: 'multimeter',
  serial: tag,
  ranges: [],
  category: 'CAT III 600 V',
  twoPole: false,
  calibratedUntil: '2099-01-01',
  outOfDate: false,
  ...more,
});

const person = (id: string, name: string, roles: RunBundle['people'][number]['roles']) => ({
  id,
  code: name.slice(0, 2).toUpperCase(),
  name,
  roles,
});

/** The bundle of a run of the lamp tree. */
export function bundleOf(tree: Tree = lampTree): RunBundle {
  const hash = '0'.repeat(64);
  const at = new Date(Date.UTC(2026, 0, 5)).toISOString();
  return {
    run: {
      id: RUN,
      machine: { id: ANN, name: 'Corvane 12', serial: '0097' },
      tree: { id: tree.id, title: tree.title, version: 1 },
      restorer: ANN,
      former: [],
      offeredTo: null,
      stranded: false,
      state: 'open',
      ended: null,
      startedAt: at,
      closedAt: null,
      heardAt: at,
      head: { seq: 0, hash },
      band: 'unknown',
      step: null,
      awaitsHold: false,
    },
    pins: { treeHash: hash, profileHash: hash, profileRevision: 1, settingsHash: hash, engine: 'test' },
    start: { run: RUN, restorer: ANN, restorerIsSenior: false, at: Date.UTC(2026, 0, 5), release: false, fitted: [], killers: [] },
    tree,
    callees: [makeDeadTree],
    profile: benchProfile,
    settings: defaultSettings,
    instruments: [
      instrument('M1', { ranges: [range('ohms', 2, 0.0001), range('ohms', 6e7, 1e4), range('volts-dc', 60, 0.01)] }),
      instrument('M2', { kind: 'two-pole-tester', twoPole: true, ranges: [range('volts-dc', 690, 0.1), range('volts-ac', 690, 0.1)] }),
      instrument('M3', { kind: 'multimeter', outOfDate: true, calibratedUntil: '2025-01-01', ranges: [range('ohms', 2, 0.0001)] }),
    ],
    people: [person(ANN, 'Ann Bell', ['restorer']), person('33333333-3333-4333-8333-333333333333', 'Sam Holt', ['senior'])],
    entries: [],
    head: { seq: 0, hash },
  };
}

function Stage({ outbox, bundle, compiled }: { outbox: Outbox; bundle: RunBundle; compiled: Program }) {
  const machine = useRunMachine(compiled, bundle.start, { outbox, again: () => undefined });
  return <RunStep run={{ ...machine, program: compiled, bundle, poll: outbox.poll, headSeq: () => headSeq(outbox.ledger()) }} />;
}

export interface AtBench {
  shop: Shop;
  disk: Disk;
  outbox: Outbox;
}

/** Shows a run that stands where `held` has brought it. */
export async function atBench({ tree = lampTree, shop = new Shop() }: { tree?: Tree; shop?: Shop } = {}): Promise<AtBench> {
  const disk = new Disk();
  const outbox = createOutbox({
    run: RUN,
    person: ANN,
    store: disk,
    client: shop.client,
    sendPhoto: () => Promise.resolve(null),
    replays: () => null,
    toSafety: () => [],
    pause: (_ms, kicked) => kicked,
  });
  const held: Entry[] = [...shop.entries];
  await outbox.open(held);
  render(
    <ThemeProvider>
      <Stage outbox={outbox} bundle={bundleOf(tree)} compiled={program(tree)} />
    </ThemeProvider>,
  );
  return { shop, disk, outbox };
}
