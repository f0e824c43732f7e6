/** The restorer's device in a test: leads a run with the same engine, and sends what it did to the server. */
import { v7 as uuidv7 } from 'uuid';

import { advance } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import type { MachineEvent } from '@/flows/machine/events';
import { replay } from '@/server/entries/runState';
import type { SentEntry } from '@/shared/contract/entries';
import type { RunBundle } from '@/shared/contract/runs';
import { runBundleSchema } from '@/shared/contract/runs';
import { recordEntrySchema } from '@/shared/record/recordEntry';
import type { RecordEntry } from '@/shared/record/recordEntry';
import { Bench } from '@/tests/flows/support/bench';
import type { BareEvent } from '@/tests/flows/support/bench';

import type { Answer, HttpClient } from './HttpClient';
import type { TestServer } from './testServer';

export class BenchDevice extends Bench {
  readonly run: string;
  readonly client: HttpClient;
  readonly server: Pick<TestServer, 'time'>;
  readonly meter: string;
  seq: number;
  outbox: SentEntry[] = [];

  constructor(client: HttpClient, server: Pick<TestServer, 'time'>, bundle: RunBundle, meter: string) {
    const compiled = compile(bundle);
    if (!compiled.ok) throw new Error(JSON.stringify(compiled.faults));
    super(compiled.program, bundle.start.restorerIsSenior);
    this.run = bundle.run.id;
    this.client = client;
    this.server = server;
    this.meter = meter;
    this.at = server.time.now;
    this.seq = bundle.head.seq;
    this.state = replay(compiled.program, bundle.entries);
  }

  /** Starts a run and its device. */
  static async start(client: HttpClient, server: Pick<TestServer, 'time'>, wish: { machine: string; tree?: string; version?: number; id?: string }, meter: string): Promise<BenchDevice> {
    const answer = await client.post('/api/runs', { id: wish.id ?? uuidv7(), machine: wish.machine, tree: wish.tree ?? 'lamp', version: wish.version ?? 1, monotonic: 0 });
    if (answer.status !== 201) throw new Error(`${String(answer.status)} ${answer.text}`);
    return new BenchDevice(client, server, runBundleSchema.parse(answer.body), meter);
  }

  override try(event: BareEvent) {
    const taken = super.try(event);
    this.server.time.now = Math.max(this.server.time.now, this.at);
    if (taken.ok) {
      this.seq += 1;
      this.outbox.push({ id: uuidv7(), seq: this.seq, event: this.stamp(event) as SentEntry['event'] });
    }
    return taken;
  }

  override row(override: Record<string, number | 'over' | string> = {}, meter = this.meter): this {
    return super.row(override, meter);
  }

  /** Everything done since the last time, in one request. */
  async flush(): Promise<Answer> {
    const entries = this.outbox;
    const answer = await this.client.post(`/api/runs/${this.run}/entries`, { entries });
    if (answer.status === 200) this.outbox = [];
    return answer;
  }

  /** Sends what was done; throws when the server does not take it. */
  async send(): Promise<this> {
    for (; this.outbox.length > 0; ) {
      const answer = await this.client.post(`/api/runs/${this.run}/entries`, { entries: this.outbox.slice(0, 150) });
      if (answer.status !== 200) throw new Error(`${String(answer.status)} ${answer.text}`);
      this.outbox = this.outbox.slice(150);
    }
    return this;
  }

  /** Takes over what others have put into the run. */
  async fetch(): Promise<RecordEntry[]> {
    const answer = await this.client.get(`/api/runs/${this.run}/entries?after=${String(this.seq)}`);
    const entries = recordEntrySchema.array().parse(answer.body['entries']);
    for (const entry of entries) {
      const taken = advance(this.program, this.state, entry.body['event'] as unknown as MachineEvent);
      if (!taken.ok) throw new Error(taken.refusal.say);
      this.state = taken.state;
      this.seq = entry.seq;
    }
    return entries;
  }
}
