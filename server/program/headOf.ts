/** What lists and other people see of a run, out of its state. */
import type { RunHeadRow } from '@/db/tables';
import { bandOf } from '@/flows/facts/band';
import type { RunState } from '@/flows/machine/advance';
import type { Program } from '@/flows/machine/compile';
import { SAFE } from '@/flows/machine/program';

/** The columns of `run_heads` that follow from the state. */
export function headOf(program: Program, { context }: RunState): Pick<RunHeadRow, 'band' | 'step_key' | 'step_title' | 'step_stud' | 'step_total'> {
  const common = { band: bandOf(context.facts), step_total: program.layout.total };
  if (context.phase === 'closed') return { ...common, step_key: null, step_title: null, step_stud: null };
  const placed = program.layout.steps.get(context.key);
  return { ...common, step_key: context.key, step_title: placed?.step.title ?? TITLES[context.key] ?? context.key, step_stud: placed?.stud ?? '' };
}

const TITLES: Readonly<Record<string, string>> = { [SAFE.opening]: 'Open the bench', [SAFE.ended]: 'Ready to close' };
