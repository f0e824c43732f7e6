/**
 * Notes for a run that is not on the screen. A note moves nothing, so it needs no engine here: it is on the disk first, like every answer, is sent
 * when the network allows, and what the run's own outbox finds on the disk later is sent by that one.
 */
import type { MachineEvent } from '@/flows/machine/events';
import type { Client } from '@/shared/ui/api/client';
import { createOutbox } from '@/shared/ui/api/outbox';
import type { Added, Outbox, Saved } from '@/shared/ui/api/outbox';
import type { OutboxStore } from '@/shared/ui/api/outboxStore';

type Note = Extract<MachineEvent, { type: 'NOTE' }>;

export interface NoteOutbox {
  add(note: Note): Promise<Added>;
  saved(): Saved;
  onSaved(listener: () => void): () => void;
  /** tries at once */
  kick(): void;
  close(): void;
}

interface Parts {
  run: string;
  person: string;
  store: OutboxStore | null;
  client: Pick<Client, 'call'>;
  pause: (ms: number, kicked: Promise<void>) => Promise<void>;
}

/** Opens the notes of a run; those that wait from earlier are sent too. */
export async function openNoteOutbox({ store, ...parts }: Parts): Promise<NoteOutbox> {
  const box: Outbox = createOutbox({
    ...parts,
    store: store === null ? null : notesOnly(store),
    // the server's engine judges; a note that is refused leaves the bench as it is
    replays: () => null,
    // a note names no photo
    sendPhoto: () => Promise.resolve(null),
    toSafety: () => [],
  });
  await box.open([]);
  return { add: (note) => box.add(note), saved: box.saved, onSaved: box.onSaved, kick: box.kick, close: box.close };
}

/** Answers that wait are the business of the run's own outbox, which knows what they lead to. */
function notesOnly(store: OutboxStore): OutboxStore {
  return {
    read: async (run) => (await store.read(run)).filter((queued) => queued.event.type === 'NOTE'),
    write: (put, remove) => store.write(put, remove),
  };
}
