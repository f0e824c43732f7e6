/** What an outcome of a run says about suspects, calls that were passed through included. */
import type { Exit } from '../document/steps';
import type { RunContext } from '../machine/context';
import { follow } from '../machine/program';
import type { Layout } from '../machine/program';
import type { Finding } from './posterior';

/** Findings of one outcome; suspects are named as the run names them, those of a called tree under its call. */
export function findingsOf(layout: Layout, outcome: RunContext['outcome']): Finding[] {
  if (outcome === null || outcome.exit === null) return [];
  const placed = layout.steps.get(outcome.key);
  const exit = placed?.step.exits.find((e: Exit) => e.id === outcome.exit);
  if (placed === undefined || exit === undefined) return [];
  const { step, scope } = placed;
  const worked =
    step.kind === 'work' && outcome.outcome === 'done'
      ? [...(step.replaces ?? []), ...(step.suspects ?? [])].map((id) => scope.check(id))
      : [];
  const own: Finding = { check: outcome.key, evidence: evidenceOf(exit, scope.check), ...(worked.length > 0 ? { worked } : {}) };
  const passed = follow(layout, scope.check(exit.to), () => false).through.map(({ call, exit: by }): Finding => ({
    check: call,
    evidence: evidenceOf(by, layout.steps.get(call)?.scope.check ?? scope.check),
  }));
  return [own, ...passed];
}

function evidenceOf(exit: Exit, check: (id: string) => string): Finding['evidence'] {
  return (exit.evidence ?? []).map((e) => ({ suspect: check(e.suspect), says: e.says }));
}
