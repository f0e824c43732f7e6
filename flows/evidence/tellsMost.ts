/** Which check would tell most next, for each minute that it takes; never one that a house rule forbids now. */
import type { Exit } from '../document/steps';
import type { Facts } from '../facts/facts';
import { unmetNeeds } from '../machine/arrive';
import { follow } from '../machine/program';
import type { Layout, ProgramStep } from '../machine/program';
import { expectedBits } from './entropy';
import { posterior } from './posterior';
import type { Finding } from './posterior';
import { chancesOf, sureExits } from './sureExits';

export interface Telling {
  key: string;
  title: string;
  minutes: number;
  /** expected information on which suspect it is */
  bits: number;
  bitsPerMinute: number;
}

/** No check is taken to be quicker than this: reading the step and answering it. */
const LEAST_MINUTES = 0.5;

/**
 * Checks of the tree that its facts allow now and that have not been made since the last repair, by expected bits a minute, best first. Needs are
 * those of the step, or of the first step of the tree that a call enters; role, clock and countersign stand beside them as everywhere.
 */
export function tellsMost(layout: Layout, facts: Facts, findings: readonly Finding[]): Telling[] {
  const ranked = posterior(layout.tree.suspects, findings);
  const shares = ranked.map((r) => r.share);
  const made = madeSinceRepair(findings);
  return [...layout.steps.values()]
    .filter(
      (placed) =>
        placed.caller === null && !placed.builtIn && !made.has(placed.key) && carriesEvidence(placed) && allowedNow(layout, placed, facts),
    )
    .map((placed): Telling => {
      const exits = sureExits(placed.step);
      const bits = expectedBits(
        shares,
        ranked.map((r) => chancesOf(exits, r.suspect.id)),
      );
      const { minutes, title } = placed.step;
      return { key: placed.key, title, minutes, bits, bitsPerMinute: bits / Math.max(minutes, LEAST_MINUTES) };
    })
    .filter((telling) => telling.bits > 1e-12)
    .sort((a, b) => b.bitsPerMinute - a.bitsPerMinute);
}

/** Whether no house rule forbids the step on these facts. */
export function allowedNow(layout: Layout, placed: ProgramStep, facts: Facts): boolean {
  if (placed.step.kind !== 'call') return unmetNeeds(placed, facts).length === 0;
  const first = layout.steps.get(follow(layout, placed.key, () => false).key);
  return first !== undefined && first.step.kind !== 'call' && unmetNeeds(first, facts).length === 0;
}

function carriesEvidence({ step }: ProgramStep): boolean {
  return step.kind !== 'end' && step.exits.some((exit: Exit) => exit.evidence?.some((e) => e.says !== 'says-nothing') ?? false);
}

function madeSinceRepair(findings: readonly Finding[]): Set<string> {
  const repair = findings.findLastIndex((f) => (f.worked?.length ?? 0) > 0);
  return new Set(findings.slice(repair + 1).map((f) => f.check));
}
