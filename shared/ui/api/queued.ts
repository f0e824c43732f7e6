/** The form of an answer on its way to the record. */
import type { MachineEvent } from '@/flows/machine/events';

/** Why an answer was not taken. */
export interface NotTaken {
  readonly say: string;
  readonly rule: string | null;
}

/** One answer on its way to the record. */
export interface Queued {
  /** UUIDv7, made once: sending twice is harmless */
  readonly id: string;
  readonly run: string;
  /** who answered; nobody else's session sends it */
  readonly person: string;
  readonly seq: number;
  readonly event: MachineEvent;
  /** set when it was refused; it is kept and shown, never dropped */
  readonly notTaken: NotTaken | null;
  /** the restorer has read the refusal */
  readonly seen: boolean;
}
