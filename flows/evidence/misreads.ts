/** Verdicts that would fall with one answer misread. */
import type { Exit, Step, StepOf } from '../document/steps';
import type { Tree } from '../document/tree';
import { reachedFrom, wayTo } from './paths';
import { posterior } from './posterior';
import type { Finding } from './posterior';
import { sureExits } from './sureExits';

export interface Flip {
  /** the end that names the suspect */
  end: string;
  suspect: string;
  /** the check whose answer was read as `read` where `truly` would have been right */
  check: string;
  read: string;
  truly: string;
  /** who would be the likeliest then */
  instead: string;
}

/**
 * For the shortest way to each end that names a suspect: the single answers on it that, had another sure exit of the same check been the true
 * one, would leave somebody else the likeliest. A way on which the suspect is not the likeliest to begin with flips at its own end.
 */
export function misreads(tree: Tree): Flip[] {
  const steps = new Map(tree.steps.map((s) => [s.id, s]));
  const reached = reachedFrom(tree);
  return tree.steps.flatMap((end) =>
    end.kind === 'end' && end.says === 'fault-found' && end.suspect !== undefined
      ? flipsOf(tree, steps, end, end.suspect, wayTo(reached, end.id) ?? [])
      : [],
  );
}

function flipsOf(
  tree: Tree,
  steps: ReadonlyMap<string, Step>,
  end: StepOf<'end'>,
  suspect: string,
  way: { from: string; exit: Exit }[],
): Flip[] {
  const findings = way.map(({ from, exit }): Finding => ({ check: from, evidence: exit.evidence ?? [] }));
  const stands = (heard: readonly Finding[]) => likeliest(tree, heard, suspect);
  const now = stands(findings);
  if (now !== undefined && now !== suspect) return [{ end: end.id, suspect, check: end.id, read: '', truly: '', instead: now }];
  return way.flatMap(({ from, exit }, at) => {
    const step = steps.get(from);
    const others = step === undefined ? [] : sureExits(step).filter((other) => other.id !== exit.id);
    return others.flatMap((truly): Flip[] => {
      const instead = stands(findings.map((finding, i) => (i === at ? { check: from, evidence: truly.evidence ?? [] } : finding)));
      return instead === undefined || instead === suspect
        ? []
        : [{ end: end.id, suspect, check: from, read: exit.id, truly: truly.id, instead }];
    });
  });
}

/** The likeliest suspect; the named one where it is level with the likeliest. */
function likeliest(tree: Tree, heard: readonly Finding[], named: string): string | undefined {
  const ranked = posterior(tree.suspects, heard);
  const top = ranked[0];
  const share = ranked.find((r) => r.suspect.id === named)?.share ?? 0;
  return top !== undefined && share >= top.share * (1 - 1e-9) ? named : top?.suspect.id;
}
