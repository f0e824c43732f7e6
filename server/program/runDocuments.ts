/** The documents that a run is pinned to, and its compiled program. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { Profile } from '@/flows/document/profile';
import type { Settings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { compile } from '@/flows/machine/compile';
import type { Program } from '@/flows/machine/compile';

import { findTreeVersion } from '../trees/queries';
import { hashOf } from './hashOf';
import type { ProgramCache } from './programCache';

export interface RunDocuments {
  tree: Tree;
  callees: Tree[];
  profile: Profile;
  settings: Settings;
}

type Pinned = Pick<RunRow, 'machine' | 'tree' | 'tree_version' | 'tree_hash' | 'callees' | 'profile_revision' | 'profile_hash' | 'settings' | 'settings_hash'>;

/** One hash for all that a program is made from. */
export function programKey(run: Pick<RunRow, 'tree_hash' | 'callees' | 'profile_hash' | 'settings_hash'>): string {
  return hashOf([run.tree_hash, run.callees.map((callee) => callee.hash), run.profile_hash, run.settings_hash]);
}

/** Reads them; throws when one is not what the run was pinned to, since nobody may be led by a document that has changed. */
export async function getRunDocuments(tx: Tx, run: Pinned): Promise<RunDocuments> {
  const tree = await pinnedTree(tx, { tree: run.tree, version: run.tree_version, hash: run.tree_hash });
  const callees: Tree[] = [];
  for (const callee of run.callees) callees.push(await pinnedTree(tx, callee));
  const revision = await tx
    .selectFrom('profile_revisions')
    .select(['document', 'hash'])
    .where('machine', '=', run.machine)
    .where('revision', '=', run.profile_revision)
    .executeTakeFirstOrThrow();
  if (revision.hash !== run.profile_hash) throw new Error(`profile revision ${run.profile_revision} of machine ${run.machine} is not the one that the run was pinned to`);
  return { tree, callees, profile: revision.document, settings: run.settings };
}

/** The compiled program of a run, from the cache where it can. */
export function getProgram(tx: Tx, programs: ProgramCache, run: Pinned): Promise<Program> {
  return programs.get(programKey(run), async () => {
    const compiled = compile(await getRunDocuments(tx, run));
    if (compiled.ok) return compiled.program;
    throw new Error(`the pinned tree of a run no longer compiles: ${compiled.faults.map((fault) => `${fault.step ?? 'tree'} ${fault.key}: ${fault.message}`).join('; ')}`);
  });
}

async function pinnedTree(tx: Tx, pin: { tree: string; version: number; hash: string }): Promise<Tree> {
  const row = await findTreeVersion(tx, pin.tree, pin.version);
  if (row === undefined || row.hash !== pin.hash) throw new Error(`version ${pin.version} of tree ${pin.tree} is not the one that the run was pinned to`);
  return row.document;
}
