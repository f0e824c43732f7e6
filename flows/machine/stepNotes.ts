/** What a step asks beyond its instruction, in words: how a twin is read, what an answer shows of a part. */
import { formatNumber } from '@/shared/quantity/formatQuantity';

import { SHOWN } from '../document/outcomes';
import type { Exit, Step } from '../document/steps';
import { TEST_CONDITIONS } from '../document/testConditions';

export interface StepNote {
  name: string;
  say: string;
}

/** Notes in the order in which they are read. */
export function stepNotes(step: Step): StepNote[] {
  return [...conditionNotes(step), ...openingNotes(step), ...twinNotes(step), ...shownNotes(step)];
}

/** What is confirmed here, or was before and must still be so. */
function conditionNotes(step: Step): StepNote[] {
  const [confirmed, stated] = [step.kind === 'do' ? (step.confirms ?? []) : [], 'asInService' in step ? (step.asInService ?? []) : []];
  return [...confirmed.map((id) => ({ name: 'You confirm', say: `${TEST_CONDITIONS[id].name}.` })), ...stated.map((id) => ({ name: 'Confirmed before', say: `${TEST_CONDITIONS[id].name}. Change nothing of it; if it has changed, press Stop.` }))];
}

function openingNotes(step: Step): StepNote[] {
  return step.kind === 'observe' && step.opens !== undefined ? [{ name: 'Opening destroys it', say: 'Dead, and after its photo. Never a part that may hold beryllium oxide. Keep the pieces.' }] : [];
}

function twinNotes(step: Step): StepNote[] {
  if (step.kind !== 'measure' || step.limit.is !== 'twin') return [];
  return [{ name: 'Like its twin', say: `Read ${step.limit.of} first, with the same meter, range and probes. The two lie within ${formatNumber(step.limit.within * 100)} %.` }];
}

function shownNotes(step: Step): StepNote[] {
  const shown = new Set(step.exits.flatMap((exit: Exit) => (exit.shows === undefined ? [] : [exit.shows])));
  return [...shown].map((kind) => SHOWN[kind]);
}
