/** One run as this device holds it: what the server has, what waits to be sent, what was not taken. Pure. */
import { machineEventSchema, SIGNED_EVENTS } from '@/flows/machine/events';
import type { MachineEvent } from '@/flows/machine/events';
import type { Entry } from '@/shared/contract/entries';
import type { NotTaken, Queued } from '@/shared/ui/api/queued';

export interface Ledger {
  /** entries that the server has said it has, without a gap */
  readonly held: readonly Entry[];
  /** answers in the order in which they were given, numbered behind `held` */
  readonly waiting: readonly Queued[];
  readonly notTaken: readonly Queued[];
}

/** Plays what the server holds, then the waiting answers; says which of them the engine takes no more, and why. */
export type Replays = (held: readonly Entry[], waiting: readonly Queued[]) => { at: number; why: NotTaken } | null;

/** The machine's event in an entry, or null in one that is about something else. */
export function eventOf(entry: Entry): MachineEvent | null {
  const parsed = machineEventSchema.safeParse(entry.body['event']);
  return parsed.success ? parsed.data : null;
}

/** Place of the last entry that the server has. */
export function headSeq(ledger: Ledger): number {
  return ledger.held.at(-1)?.seq ?? 0;
}

/** All events in order: held, then waiting. */
export function eventsOf({ held, waiting }: Pick<Ledger, 'held' | 'waiting'>): MachineEvent[] {
  return [...held.flatMap((entry) => eventOf(entry) ?? []), ...waiting.map((q) => q.event)];
}

/** Numbers what waits behind what is held. */
export function renumber(ledger: Ledger): Ledger {
  const head = headSeq(ledger);
  return { ...ledger, waiting: ledger.waiting.map((q, i) => (q.seq === head + 1 + i ? q : { ...q, seq: head + 1 + i })) };
}

/** What a part of the server's record gives together with what is held, or null when the two do not join and all has to be fetched. */
export function joined(held: readonly Entry[], tail: readonly Entry[]): readonly Entry[] | null {
  const first = tail[0];
  if (first === undefined) return held;
  const before = held[first.seq - 2];
  if (first.seq > 1 && before?.hash !== first.prev) return null;
  const known = held.slice(first.seq - 1, first.seq - 1 + tail.length);
  // an answer that was overtaken by a later one
  if (known.length === tail.length && known.at(-1)?.hash === tail.at(-1)?.hash) return held;
  return [...held.slice(0, first.seq - 1), ...tail];
}

/**
 * Takes over the server's whole record. Answers that it has already are no longer waiting; own entries that it has lost wait again;
 * what the engine takes no more is kept as not taken together with what was built upon it. A Stop is never dropped.
 */
export function takeOver(ledger: Ledger, server: readonly Entry[], replays: Replays, owner: { run: string; person: string }): Ledger {
  const has = new Set(server.map((entry) => entry.id));
  const lost = ledger.held.flatMap((entry) => {
    const event = has.has(entry.id) ? null : eventOf(entry);
    return event === null || SIGNED_EVENTS.includes(event.type)
      ? []
      : [{ ...owner, id: entry.id, seq: entry.seq, event, notTaken: null, seen: false }];
  });
  const waiting = [...lost, ...ledger.waiting].filter((q) => !has.has(q.id));
  const refused = replays(server, waiting);
  const next: Ledger = { ...ledger, held: server, waiting };
  return renumber(refused === null ? next : setAside(next, refused.at, refused.why));
}

/** Sets the waiting answer at `at` aside as not taken, and all later ones with it, but for Stops. */
export function setAside(ledger: Ledger, at: number, why: NotTaken): Ledger {
  const later = ledger.waiting.slice(at);
  const after: NotTaken = { say: 'It was given after an answer that was not taken.', rule: null };
  const stops = later.filter((q, i) => i > 0 && q.event.type === 'STOP');
  const aside = later.filter((q) => !stops.includes(q)).map((q, i): Queued => ({ ...q, notTaken: i === 0 ? why : after }));
  return renumber({ ...ledger, waiting: [...ledger.waiting.slice(0, at), ...stops], notTaken: [...ledger.notTaken, ...aside] });
}

/** Moves answers that the server has just taken from waiting to held. Null when they do not join on. */
export function acknowledge(ledger: Ledger, entries: readonly Entry[]): Ledger | null {
  const held = joined(ledger.held, entries);
  if (held === null) return null;
  const has = new Set(entries.map((entry) => entry.id));
  return { ...ledger, held, waiting: ledger.waiting.filter((q) => !has.has(q.id)) };
}
