/** The restorer's device of a demo run: leads it by the same engine and writes it down through the server's own services. */
import { inWorkshop } from '@/db/createDb';
import { advance } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import type { Program } from '@/flows/machine/compile';
import type { MachineEvent } from '@/flows/machine/events';
import { view } from '@/flows/machine/view';
import type { RunView } from '@/flows/machine/view';
import { lockHead } from '@/server/entries/queries';
import { eventOf, getStanding } from '@/server/entries/runState';
import { takeEvents } from '@/server/entries/takeEvents';
import type { TakenEvent } from '@/server/entries/takeEvents';
import { addSecondPerson, answerHold } from '@/server/holds/service';
import type { Parts } from '@/server/parts';
import { getRunFor } from '@/server/runs/access';
import type { RecordEntry } from '@/shared/record/recordEntry';

type Bare<E> = E extends MachineEvent ? Omit<E, 'at' | 'monotonic' | 'boot'> : never;
export type BareEvent = Bare<MachineEvent>;

/** Time that an answer takes at the bench. */
const ANSWER_MS = 14_000;
const BOOT = 'demo';

export class DemoDevice {
  readonly parts: Parts;
  readonly time: { now: number };
  readonly workshop: string;
  readonly run: string;
  readonly restorer: string;
  readonly newId: () => string;
  private readonly program: Program;
  private state: RunState;
  private seq: number;
  private outbox: TakenEvent[] = [];
  private readonly begin: number;

  private constructor(parts: Parts, time: { now: number }, of: { workshop: string; run: string; restorer: string; newId: () => string }, standing: { program: Program; state: RunState; seq: number }) {
    this.parts = parts;
    this.time = time;
    this.workshop = of.workshop;
    this.run = of.run;
    this.restorer = of.restorer;
    this.newId = of.newId;
    this.program = standing.program;
    this.state = standing.state;
    this.seq = standing.seq;
    this.begin = time.now;
  }

  /** Opens the device on a run that was just started. */
  static open(parts: Parts, time: { now: number }, of: { workshop: string; run: string; restorer: string; newId: () => string }): Promise<DemoDevice> {
    return inWorkshop(parts.db, of.workshop, async (tx) => {
      const head = await lockHead(tx, of.run);
      const standing = await getStanding(tx, parts, await getRunFor(tx, of.run), head);
      return new DemoDevice(parts, time, of, { ...standing, seq: head.seq });
    });
  }

  get view(): RunView {
    return view(this.program, this.state);
  }

  /** Waits at the bench, without an answer. */
  wait(ms: number): void {
    this.time.now += ms;
  }

  /** Does one thing; throws when the engine refuses it, which is a fault of the script. */
  do(bare: BareEvent): void {
    this.time.now += ANSWER_MS;
    const event = { ...bare, at: this.time.now, monotonic: this.time.now - this.begin, boot: BOOT } as MachineEvent;
    const taken = advance(this.program, this.state, event);
    if (!taken.ok) throw new Error(`${event.type} at ${this.view.key}/${this.view.phase} is refused: ${taken.refusal.rule ?? ''} ${taken.refusal.say}`);
    this.state = taken.state;
    this.outbox.push({ id: this.newId(), actor: this.restorer, event });
  }

  /** Writes down what was done since the last time. */
  async flush(): Promise<void> {
    const events = this.outbox;
    if (events.length === 0) return;
    this.outbox = [];
    await inWorkshop(this.parts.db, this.workshop, async (tx) => {
      const head = await lockHead(tx, this.run);
      await takeEvents(tx, this.parts, await getRunFor(tx, this.run), head, events);
      this.seq = head.seq;
    });
  }

  /** A senior answers the hold at which the run waits. */
  async answerHold(person: string, answer: 'given' | 'refused', reason?: string): Promise<void> {
    await this.flush();
    this.wait(4 * 60_000);
    const { entry } = await inWorkshop(this.parts.db, this.workshop, (tx) => answerHold(tx, this.parts, { person }, this.run, { id: this.newId(), seq: this.seq + 1, answer, reason }));
    this.takeOver(entry);
  }

  /** A second person signs in at this device. */
  async addSecond(person: string): Promise<void> {
    await this.flush();
    const { entry } = await inWorkshop(this.parts.db, this.workshop, (tx) => addSecondPerson(tx, this.parts, this.run, { id: this.newId(), seq: this.seq + 1, person }));
    this.takeOver(entry);
  }

  private takeOver(entry: RecordEntry): void {
    const event = eventOf(entry);
    const taken = event === null ? null : advance(this.program, this.state, event);
    if (taken?.ok !== true) throw new Error(`entry ${entry.seq} of another person is not taken`);
    this.state = taken.state;
    this.seq = entry.seq;
  }
}
