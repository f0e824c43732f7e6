/** What a step asks beyond its instruction, in words: how a twin is read, what an answer shows of a part. */
import { formatNumber } from '@/shared/quantity/formatQuantity';

import { SHOWN } from '../document/outcomes';
import type { Exit, Step } from '../document/steps';

export interface StepNote {
  name: string;
  say: string;
}

/** Notes in the order in which they are read. */
export function stepNotes(step: Step): StepNote[] {
  return [...twinNotes(step), ...shownNotes(step)];
}

function twinNotes(step: Step): StepNote[] {
  if (step.kind !== 'measure' || step.limit.is !== 'twin') return [];
  return [{ name: 'Like its twin', say: `Read ${step.limit.of} first, with the same meter, range and probes. The two lie within ${formatNumber(step.limit.within * 100)} %.` }];
}

function shownNotes(step: Step): StepNote[] {
  const shown = new Set(step.exits.flatMap((exit: Exit) => (exit.shows === undefined ? [] : [exit.shows])));
  return [...shown].map((kind) => SHOWN[kind]);
}
