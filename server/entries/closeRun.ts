/** What stays when a run closes. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { Facts } from '@/flows/facts/facts';
import type { RunState } from '@/flows/machine/advance';

import { setRunState } from '../runs/queries';

/** Closes the run, and names on the machine what is still fitted and which killers are owed: its next run starts with them. */
export async function closeRun(tx: Tx, run: RunRow, { context }: RunState, now: number): Promise<void> {
  await setRunState(tx, run.id, { state: 'closed', ended: context.end?.says ?? 'stopped', closed_at: new Date(now) });
  await tagMachine(tx, run, context.facts, now, 'instead');
}

/** Writes the machine's tags: instead of those of earlier runs, or beside them where nobody can say that those are gone. None is written twice. */
export async function tagMachine(tx: Tx, run: RunRow, { fitted, owed }: Pick<Facts, 'fitted' | 'owed'>, now: number, how: 'instead' | 'beside'): Promise<void> {
  if (how === 'instead') await tx.deleteFrom('machine_tags').where('machine', '=', run.machine).execute();
  const standing = await tx.selectFrom('machine_tags').select(['is', 'body']).where('machine', '=', run.machine).execute();
  const named = new Set(standing.map(nameOf));
  const common = { workshop: run.workshop, machine: run.machine, run: run.id, since: new Date(now) };
  const tags = [...fitted.map((body) => ({ is: 'fitted' as const, body })), ...owed.killers.map((body) => ({ is: 'killer' as const, body }))].filter((tag) => !named.has(nameOf(tag)));
  if (tags.length > 0) await tx.insertInto('machine_tags').values(tags.map(({ is, body }) => ({ ...common, is, body: JSON.stringify(body) }))).execute();
}

function nameOf({ is, body }: { is: 'fitted' | 'killer'; body: object }): string {
  return 'id' in body ? `${is} ${String(body.id)}` : `${is} ${'part' in body ? String(body.part) : ''} ${'killer' in body ? String(body.killer) : ''}`;
}
