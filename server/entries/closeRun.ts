/** What stays when a run closes. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { RunState } from '@/flows/machine/advance';

import { setRunState } from '../runs/queries';

/** Closes the run, and names on the machine what is still fitted and which killers are owed: its next run starts with them. */
export async function closeRun(tx: Tx, run: RunRow, { context }: RunState, now: number): Promise<void> {
  await setRunState(tx, run.id, { state: 'closed', ended: context.end?.says ?? 'stopped', closed_at: new Date(now) });
  await tx.deleteFrom('machine_tags').where('machine', '=', run.machine).execute();
  const common = { workshop: run.workshop, machine: run.machine, run: run.id, since: new Date(now) };
  const tags = [
    ...context.facts.fitted.map((thing) => ({ ...common, is: 'fitted' as const, body: JSON.stringify(thing) })),
    ...context.facts.owed.killers.map((killer) => ({ ...common, is: 'killer' as const, body: JSON.stringify(killer) })),
  ];
  if (tags.length > 0) await tx.insertInto('machine_tags').values(tags).execute();
}
