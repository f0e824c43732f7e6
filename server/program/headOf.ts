/** What lists and other people see of a run, out of its state. */
import type { RunHeadRow } from '@/db/tables';
import type { RunState } from '@/flows/machine/advance';
import type { Program } from '@/flows/machine/compile';
import { view } from '@/flows/machine/view';

/** The columns of `run_heads` that follow from the state. */
export function headOf(program: Program, state: RunState): Pick<RunHeadRow, 'band' | 'step_key' | 'step_title' | 'step_stud' | 'step_total' | 'offered_to'> {
  const { band, key, title, stud, total, phase, handing } = view(program, state);
  const closed = phase === 'closed';
  return { band, step_key: closed ? null : key, step_title: closed ? null : title, step_stud: closed ? null : stud, step_total: total, offered_to: handing?.to ?? null };
}
