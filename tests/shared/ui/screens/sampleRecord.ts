/** Records made by playing a run, for tests of the pages that show them. */
import { defaultSettings } from '@/flows/document/settings';
import type { MachineEvent } from '@/flows/machine/events';
import type { Advanced } from '@/flows/machine/advance';
import type { Instrument } from '@/shared/contract/instruments';
import type { RecordView } from '@/shared/contract/records';
import { GENESIS, sealEntry } from '@/shared/record/chain';
import type { EntryKind, RecordEntry } from '@/shared/record/recordEntry';
import type { Json } from '@/shared/record/canonical';
import { Bench, benchProfile, lampTree, makeDeadTree, program } from '@/tests/flows/support/bench';
import type { BareEvent } from '@/tests/flows/support/bench';

export const people = {
  ann: '11111111-1111-4111-8111-111111111111',
  sam: '22222222-2222-4222-8222-222222222222',
  rita: '33333333-3333-4333-8333-333333333333',
} as const;

const run = '0198c0de-0000-7000-8000-000000000001';
const iso = (ms: number) => new Date(ms).toISOString();
const entryId = (seq: number) => `0198c0de-0000-7000-8000-${String(100_000_000_000 + seq)}`;

export const tester: Instrument = {
  id: 'tester',
  tag: 'T-1',
  name: 'Two-pole tester',
  kind: 'two-pole-tester',
  serial: '7',
  category: 'CAT III 600 V',
  twoPole: true,
  calibratedUntil: '2027-03-01',
  outOfDate: false,
  ranges: [],
};

/** A person at the bench who takes their time and whose entries are kept and chained. */
export class RecordedBench extends Bench {
  entries: RecordEntry[] = [];
  /** milliseconds that each answer takes besides the second that the bench itself takes */
  paceMs = 4000;

  constructor(senior = false) {
    super(program(lampTree), senior);
    this.keep('opened', people.ann, { start: this.start });
  }

  get start(): RecordView['start'] {
    return { run, restorer: 'ann', restorerIsSenior: false, at: Date.UTC(2026, 0, 5, 9, 0, 0), release: false, fitted: [], killers: [] };
  }

  keep(kind: EntryKind, actor: string, body: Record<string, unknown>): RecordEntry {
    const seq = this.entries.length + 1;
    const draft = {
      id: entryId(seq),
      run,
      seq,
      at: iso(this.at),
      monotonic: this.at,
      actor,
      kind,
      body: JSON.parse(JSON.stringify(body)) as Record<string, Json>,
    };
    const entry = sealEntry(draft, iso(this.at), this.entries.at(-1)?.hash ?? GENESIS);
    this.entries.push(entry);
    return entry;
  }

  override try(event: BareEvent): Advanced {
    this.at += this.paceMs;
    const title = this.view.title;
    const step = this.view.key;
    const taken = super.try(event);
    const stamped: MachineEvent = this.stamp(event);
    if (taken.ok) this.keep(taken.kind, 'by' in event ? people.sam : people.ann, { event: stamped, step, title });
    return taken;
  }

  /** The record as the server would hand it out to somebody who may do `may` with it. */
  record(over: Partial<RecordView> = {}, state: RecordView['run']['state'] = 'submitted'): RecordView {
    const last = this.entries.at(-1);
    const head = { seq: last?.seq ?? 0, hash: last?.hash ?? GENESIS };
    return {
      run: {
        id: run,
        machine: { id: '44444444-4444-4444-8444-444444444444', name: 'Corvane 12', serial: '0097' },
        tree: { id: 'lamp', title: lampTree.title, version: 3 },
        restorer: people.ann,
        state,
        ended: 'cleared',
        startedAt: iso(this.start.at),
        closedAt: iso(this.at),
        heardAt: iso(this.at),
        head,
        band: 'proved-dead',
        step: null,
        awaitsHold: false,
        former: [],
        offeredTo: null,
        stranded: false,
      },
      pins: { treeHash: 'a'.repeat(64), profileHash: 'b'.repeat(64), profileRevision: 6, settingsHash: 'c'.repeat(64), engine: 'e' },
      start: this.start,
      tree: lampTree,
      callees: [makeDeadTree],
      profile: benchProfile,
      settings: defaultSettings,
      instruments: [tester],
      people: [
        { id: people.ann, code: 'AN', name: 'Ann', roles: ['restorer'] },
        { id: people.sam, code: 'SA', name: 'Sam', roles: ['senior', 'reviewer'] },
        { id: people.rita, code: 'RI', name: 'Rita', roles: ['reviewer'] },
      ],
      entries: this.entries,
      head,
      findings: [],
      may: { submit: false, find: false, return: false, reply: false, accept: false, release: false },
      ...over,
    };
  }
}

/** Plays the whole tree well, up to its end, and closes. */
export function goodRun(): RecordedBench {
  const bench = new RecordedBench();
  bench.pass().answer('sound').dead().pass().pass().dead().pass().answer('on').answer('dim').dead();
  bench.do({ type: 'CLOSE' });
  return bench;
}
