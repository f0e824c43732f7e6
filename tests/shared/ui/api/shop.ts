/** A server in memory that keeps the rules of the record (sequence, ids, batches whole or not at all), and a disk, for tests of the outbox. */
import type { MachineEvent } from '@/flows/machine/events';
import type { Entry } from '@/shared/contract/entries';
import type { Answer, ClientProblem, ClientProblemCode } from '@/shared/ui/api/answer';
import type { Client } from '@/shared/ui/api/client';
import type { OutboxStore, RecordPart } from '@/shared/ui/api/outboxStore';
import type { Queued } from '@/shared/ui/api/queued';

export const RUN = '0198c0de-0000-7000-8000-00000000000a';
export const ANN = '11111111-1111-4111-8111-111111111111';

let clock = 0;
/** An event with a time of its own. */
export function event(bare: { type: 'ANSWER'; answer: string } | { type: 'STOP' } | { type: 'RESTART' }): MachineEvent {
  clock += 1000;
  const common = { at: Date.UTC(2026, 0, 5) + clock, monotonic: clock, boot: 'boot-1' };
  return bare.type === 'ANSWER' ? { ...common, type: 'ANSWER', step: 'look', answer: bare.answer } : { ...common, type: bare.type };
}
export const say = (answer: string) => event({ type: 'ANSWER', answer });

const problem = (code: ClientProblemCode, details: Record<string, unknown> = {}): ClientProblem => ({
  kind: 'problem',
  code,
  say: `problem ${code}`,
  retryable: code === 'no-network',
  rule: code === 'refused' ? 'H7' : null,
  faults: [],
  details,
});

export class Shop {
  entries: Entry[] = [];
  away = false;
  signedOut = false;
  /** loses the next answer after having done what was asked */
  loseNext = false;
  /** this run is somebody else's by now */
  handedOver = false;
  /** answers that it refuses */
  refuses: string[] = [];
  /** does not name the entry that it refuses */
  mute = false;
  posts = 0;

  /** An answer by somebody else. */
  put(answer: string): Entry {
    return this.take(say(answer));
  }

  /** An event that did not come through the outbox. */
  take(of: MachineEvent): Entry {
    return this.seal(`other-${this.entries.length + 1}`, of);
  }

  private seal(id: string, of: MachineEvent): Entry {
    const seq = this.entries.length + 1;
    const prev = this.entries.at(-1)?.hash ?? '0'.repeat(64);
    const entry = {
      id,
      run: RUN,
      seq,
      at: of.at,
      monotonic: 0,
      receivedAt: 0,
      actor: ANN,
      kind: 'answer',
      body: { event: of },
      prev,
      hash: `h${seq}-${id}`,
    } as unknown as Entry;
    this.entries.push(entry);
    return entry;
  }

  readonly client: Pick<Client, 'call'> = {
    call: (async (
      name: string,
      input: { body?: { entries: { id: string; seq: number; event: MachineEvent }[] }; query?: { after: number } },
    ) => {
      await Promise.resolve();
      if (this.away) return problem('no-network');
      if (this.signedOut) return problem('session-expired');
      const answer = name === 'postEntries' ? this.post(input.body?.entries ?? []) : this.read(input.query?.after ?? 0);
      if (!this.loseNext) return answer;
      this.loseNext = false;
      return problem('no-network');
    }) as unknown as Client['call'],
  };

  private head() {
    return { seq: this.entries.length, hash: this.entries.at(-1)?.hash ?? '' };
  }

  private read(after: number): Answer<unknown> {
    return { kind: 'ok', data: { entries: this.entries.slice(after), head: this.head() } };
  }

  private post(sent: { id: string; seq: number; event: MachineEvent }[]): Answer<unknown> {
    this.posts += 1;
    if (this.handedOver) return problem('handed-over');
    const fresh = sent.filter((s) => !this.entries.some((e) => e.id === s.id));
    const first = fresh[0];
    if (first !== undefined && first.seq !== this.entries.length + 1) {
      return problem('out-of-sequence', { head: this.head(), missing: this.entries.slice(Math.min(first.seq - 1, this.entries.length)) });
    }
    const bad = fresh.find((s) => s.event.type === 'ANSWER' && this.refuses.includes(s.event.answer));
    if (bad !== undefined) return problem('refused', this.mute ? {} : { entry: bad.id });
    for (const s of fresh) this.seal(s.id, s.event);
    return { kind: 'ok', data: { entries: sent.map((s) => this.entries.find((e) => e.id === s.id)), head: this.head() } };
  }

  /** What the record says, in a word an entry. */
  words(): string[] {
    return this.entries.map((e) => wordOf((e.body as { event: MachineEvent }).event));
  }
}

/** The answer of an event, or its type. */
export function wordOf(of: MachineEvent): string {
  return of.type === 'ANSWER' ? of.answer : of.type;
}

/** A disk that outlives the page. */
export class Disk implements OutboxStore {
  kept = new Map<string, Queued>();
  full = false;

  async read(run: string) {
    return [...this.kept.values()].filter((q) => q.run === run);
  }

  /** what it holds of the record */
  record: Entry[] = [];

  async write(put: readonly Queued[], remove: readonly string[] = [], record?: RecordPart) {
    await Promise.resolve();
    if (this.full) throw new Error('QuotaExceededError');
    for (const q of put) this.kept.set(q.id, q);
    for (const id of remove) this.kept.delete(id);
    if (record !== undefined) this.record = [...this.record.filter((e) => e.seq <= record.after), ...record.entries];
  }

  words(): string[] {
    return [...this.kept.values()]
      .filter((q) => q.notTaken === null)
      .sort((a, b) => a.seq - b.seq)
      .map((q) => wordOf(q.event));
  }
}
