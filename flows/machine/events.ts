/** Every event that can move a run. Machine, proof, server and client read this one table; time enters only here. */
import { z } from 'zod';

/** Keys of steps: an id, an id below calls (`call/step`, `call/call/step`), or one of the machine's own (`~isolate`). */
const key = z.string().min(1).max(400).regex(/^(~[a-z-]+|[a-z][a-z0-9-]*(\/[a-z][a-z0-9-]*)*)$/);
const person = z.string().min(1).max(60);
const note = z.string().trim().min(1).max(500);

const common = {
  /** wall clock of the device, epoch milliseconds */
  at: z.number().int().nonnegative(),
  /** milliseconds since the device's page was loaded */
  monotonic: z.number().nonnegative(),
  /** changes with each load of the page */
  boot: z.string().min(1).max(60),
};

const workingsValue = z.union([z.number(), z.string().max(200), z.boolean(), z.null()]);
/** Inputs of a sheet of workings in SI, rows of a list included. */
const workingsInputs = z.record(z.string().max(60), z.union([workingsValue, z.array(z.record(z.string().max(60), workingsValue)).max(100)]));

const instrument = z.strictObject({
  id: z.string().min(1).max(60),
  twoPole: z.boolean(),
  /** expanded uncertainty of this reading in its SI unit, from the instrument's specification */
  uncertainty: z.number().nonnegative(),
});

export const machineEventSchema = z.discriminatedUnion('type', [
  /** a row answered in a word */
  z.strictObject({ ...common, type: z.literal('ROW'), step: key, row: z.string().max(90), word: z.string().max(60) }),
  /** a row answered by an instrument; `over` is over range */
  z.strictObject({ ...common, type: z.literal('READING'), step: key, row: z.string().max(90), value: z.union([z.number(), z.literal('over')]), typed: z.string().max(40), instrument: instrument.nullable(), falling: z.boolean().optional() }),
  /** the answer of a step without rows: an authored answer's id, or the outcome in a word */
  z.strictObject({ ...common, type: z.literal('ANSWER'), step: key, answer: z.string().max(60), note: note.optional() }),
  z.strictObject({ ...common, type: z.literal('PHOTO'), step: key, photo: z.string().regex(/^[0-9a-f]{64}$/) }),
  z.strictObject({ ...common, type: z.literal('WARNING_READ'), step: key }),
  z.strictObject({ ...common, type: z.literal('GUARD_HELD'), step: key, heldMs: z.number().nonnegative() }),
  z.strictObject({ ...common, type: z.literal('HOLD_ASKED'), step: key }),
  z.strictObject({ ...common, type: z.literal('HOLD_GIVEN'), step: key, by: person, note: note.optional() }),
  z.strictObject({ ...common, type: z.literal('HOLD_REFUSED'), step: key, by: person, reason: note }),
  /** a second person signs in for live work above the limits */
  z.strictObject({ ...common, type: z.literal('SECOND_PRESENT'), by: person }),
  /** the restorer offers the run to somebody else, who takes it with a password of their own */
  z.strictObject({ ...common, type: z.literal('HANDED_OVER'), by: person, to: person, meaning: note, note: note.optional() }),
  z.strictObject({ ...common, type: z.literal('TAKEN_OVER'), by: person, senior: z.boolean(), meaning: note }),
  z.strictObject({ ...common, type: z.literal('ABORT') }),
  z.strictObject({ ...common, type: z.literal('STOP') }),
  z.strictObject({ ...common, type: z.literal('REENTER'), step: key }),
  z.strictObject({ ...common, type: z.literal('PAUSE'), reason: note.optional() }),
  z.strictObject({ ...common, type: z.literal('RESUME') }),
  /** the page was loaded anew: nothing of what was known of the sources still counts */
  z.strictObject({ ...common, type: z.literal('RESTART') }),
  /** nothing but the passing of time */
  z.strictObject({ ...common, type: z.literal('TICK') }),
  z.strictObject({ ...common, type: z.literal('CLOSE') }),
  /** workings put into the record; it moves nothing, so it may come from any page of the restorer's */
  z.strictObject({ ...common, type: z.literal('NOTE'), sheet: z.string().regex(/^[a-z][a-z0-9-]{0,39}$/), inputs: workingsInputs, headline: z.string().trim().min(1).max(500) }),
]);

export type MachineEvent = z.infer<typeof machineEventSchema>;
export type EventType = MachineEvent['type'];

/** Events that only the server may bring in, after it has checked a password: the restorer's device cannot send them. */
export const SIGNED_EVENTS: readonly EventType[] = ['HOLD_GIVEN', 'HOLD_REFUSED', 'SECOND_PRESENT', 'HANDED_OVER', 'TAKEN_OVER'];
