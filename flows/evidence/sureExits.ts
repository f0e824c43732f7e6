/** Exits that say something for certain, and how likely each is when a given suspect is the cause. */
import { EVIDENCE } from '../document/outcomes';
import type { EvidenceWord, Outcome } from '../document/outcomes';
import type { Exit, Step } from '../document/steps';
import { verdictOf } from '../facts/effects';

/** The outcomes of an exit whose verdict is not unsure; at a call the ends of the called tree. */
export function sureOutcomes(exit: Exit): string[] {
  return (exit.on as string[]).filter((on) => verdictOf(exit, on as Outcome) !== 'unsure');
}

/** Exits by which the step can be left with a sure answer, in document order. */
export function sureExits(step: Step): Exit[] {
  return step.exits.filter((exit: Exit) => sureOutcomes(exit).length > 0);
}

/** True where the exit is the good one for at least one of its outcomes. */
export function passes(exit: Exit): boolean {
  return (exit.on as string[]).some((on) => verdictOf(exit, on as Outcome) === 'pass');
}

/** What an exit says of a suspect of its own tree. */
export function wordOn(exit: Exit, suspect: string): EvidenceWord {
  return exit.evidence?.find((e) => e.suspect === suspect)?.says ?? 'says-nothing';
}

/** Likelihood ratio of an exit for a suspect, 1/100 to 100. */
export function ratioOn(exit: Exit, suspect: string): number {
  return EVIDENCE[wordOn(exit, suspect)];
}

/** Chance of each sure exit when the suspect is the cause: the ratios brought to a sum of 1. */
export function chancesOf(exits: readonly Exit[], suspect: string): number[] {
  const ratios = exits.map((exit) => ratioOn(exit, suspect));
  const total = ratios.reduce((sum, r) => sum + r, 0);
  return ratios.map((r) => r / total);
}
