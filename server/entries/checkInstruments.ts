/** Whether the instrument of a reading may be used for it. */
import type { Tx } from '@/db/createDb';
import type { InstrumentRow, RunHeadRow, RunRow } from '@/db/tables';
import { currentRows } from '@/flows/machine/answer';
import type { MachineEvent } from '@/flows/machine/events';
import { advance } from '@/flows/machine/advance';
import type { SentEntry } from '@/shared/contract/entries';
import { uncertaintyOf } from '@/shared/workings/readingLimit';

import { findInstruments } from '../instruments/queries';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { getStanding } from './runState';

type Reading = Extract<MachineEvent, { type: 'READING' }>;

/** The stated uncertainty may lose a last bit on its way through decimal text. */
const SLACK = 1e-6;

/** Checks every reading of a batch; throws `instrument` with a sentence at the first that does not hold. */
export async function checkInstruments(tx: Tx, parts: Parts, run: RunRow, head: RunHeadRow, sent: readonly SentEntry[]): Promise<void> {
  if (!sent.some(({ event }) => event.type === 'READING' && event.instrument !== null)) return;
  const instruments = await findInstruments(tx);
  const { program, state: before } = await getStanding(tx, parts, run, head);
  let state = before;
  for (const { id, event } of sent) {
    if (event.type === 'READING' && event.instrument !== null) {
      const row = currentRows(program.layout, state.context).find((r) => r.id === event.row);
      const fault = instrumentFault(instruments, event, row?.ask === 'reading' ? row.quantity : null);
      if (fault !== null) throw new ProblemError('instrument', fault, { entry: id });
    }
    const taken = advance(program, state, event);
    // A refusal is said by the one who takes the events, with its house rule.
    if (!taken.ok) return;
    state = taken.state;
  }
}

/** Why this instrument cannot give this reading, or null. `quantity` is null where the step does not ask for a reading. */
export function instrumentFault(instruments: readonly InstrumentRow[], event: Reading, quantity: string | null): string | null {
  const used = event.instrument;
  if (used === null) return null;
  const instrument = instruments.find((row) => row.id === used.id);
  if (instrument === undefined) return 'This workshop has no such instrument.';
  const name = `${instrument.tag} (${instrument.name})`;
  const day = new Date(event.at).toISOString().slice(0, 10);
  if (instrument.calibrated_until < day) return `${name} is out of date: its calibration ended on ${instrument.calibrated_until}. Take another instrument.`;
  if (used.twoPole !== instrument.two_pole) return `${name} is ${instrument.two_pole ? 'a' : 'no'} two-pole tester.`;
  if (quantity === null) return null;
  const ranges = instrument.ranges.filter((range) => range.quantity === quantity);
  if (ranges.length === 0) return `${name} does not read this quantity.`;
  if (event.value === 'over') return null;
  const value = event.value;
  const covering = ranges.filter((range) => Math.abs(value) <= range.fullScale);
  if (covering.length === 0) return `This reading lies beyond the largest range of ${name}. Enter over range, or take another instrument.`;
  const least = Math.min(...covering.map((range) => uncertaintyOf(range, value)));
  return used.uncertainty < least * (1 - SLACK) ? `${name} is not as exact as this reading says.` : null;
}
