/** One hold point as a senior is shown it. */
import type { Tx } from '@/db/createDb';
import { bandOf } from '@/flows/facts/band';
import type { PowerKind } from '@/flows/facts/facts';
import { powerKind } from '@/flows/facts/power';
import type { Hold } from '@/shared/contract/holds';

import { findEntries } from '../entries/queries';
import { getStanding } from '../entries/runState';
import type { Parts } from '../parts';
import type { RunSummaryRow } from '../runs/queries';
import { everLed } from '../runs/access';
import { findRun } from '../runs/queries';
import { isStranded } from '../runs/stranded';
import { runSummaryToWire } from '../runs/toWire';
import { factsInWords } from './factsInWords';

const KINDS: Readonly<Record<PowerKind, string>> = {
  bench: 'the first power from the bench supply', limited: 'the first limited mains power', full: 'the first full mains power', boards: 'the first power with boards fitted',
};

/** How many readings a senior is shown before the whole record. */
const READINGS = 10;

/** The hold at which the run of `row` waits, as `person` is shown it; null when it waits no more. */
export async function holdOf(tx: Tx, parts: Parts, row: RunSummaryRow, person: string): Promise<Hold | null> {
  const run = await findRun(tx, row.id);
  if (run === undefined || row.hold_entry === null || isStranded(run)) return null;
  const { program, state } = await getStanding(tx, parts, run, row);
  const placed = program.layout.steps.get(state.context.key);
  const entries = await findEntries(tx, run.id);
  const asked = entries.find((entry) => entry.id === row.hold_entry);
  if (placed === undefined || asked === undefined) return null;
  const { step } = placed;
  const kind = step.kind === 'hold' ? (step.for ?? null) : step.kind === 'energise' || step.kind === 'raise' ? powerKind(step, program.layout.profile, program.layout.settings) : null;
  const opens = kind === null ? 'this run to go on' : KINDS[kind];
  return {
    run: runSummaryToWire(row),
    entry: asked.id,
    nextSeq: row.seq + 1,
    step: { key: placed.key, title: step.title, asks: step.kind === 'hold' ? step.asks : step.lines.join(' ') },
    reason: `Your countersign opens ${opens}.`,
    askedBy: asked.actor,
    askedAt: asked.at,
    band: bandOf(state.context.facts),
    facts: factsInWords(state.context.facts, program.layout),
    readings: entries.filter((entry) => entry.kind === 'reading').slice(-READINGS).reverse(),
    mayAnswer: !everLed(person, run),
  };
}
