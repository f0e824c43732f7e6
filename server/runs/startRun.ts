/** Starting a run: everything that is asked before the first step, on the server. */
import { v7 as uuidv7 } from 'uuid';

import { inWorkshop } from '@/db/createDb';
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import { misfits } from '@/flows/document/admits';
import type { FittedThing } from '@/flows/document/steps';
import { startRun as startMachine, unmetAtStart } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import { prove } from '@/flows/proof/prove';
import type { BodyOf } from '@/shared/contract/defineRoute';
import type { routes } from '@/shared/contract/routes';
import type { RunStart } from '@/shared/contract/runs';
import { GENESIS } from '@/shared/record/chain';

import { appendEntries } from '../entries/appendEntries';
import { lockHead } from '../entries/queries';
import { keepSnapshot } from '../entries/runState';
import { findMachines, findMachineTags, findReleases } from '../machines/queries';
import { releaseToWire } from '../machines/toWire';
import type { Parts } from '../parts';
import { isUniqueViolation, ProblemError } from '../problems';
import { headOf } from '../program/headOf';
import type { SignedIn } from '../session/access';
import { getSettings } from '../settings/queries';
import { findCallees } from '../trees/callees';
import { findTreeVersion } from '../trees/queries';
import { findRun, insertRun, OPEN_RUN_INDEX, RUN_ID_KEY } from './queries';

type Starter = Pick<SignedIn, 'person' | 'workshop' | 'roles'>;
type Wish = BodyOf<typeof routes.startRun>;

/** Starts the run, or gives back the one that this very request started before, also when both come at the same moment. */
export async function startRun(parts: Parts, who: Starter, wish: Wish): Promise<RunRow> {
  try {
    return await inWorkshop(parts.db, who.workshop, (tx) => startOnce(tx, parts, who, wish));
  } catch (error) {
    if (!(error instanceof ProblemError) || error.problem.code !== 'id-taken') throw error;
    return inWorkshop(parts.db, who.workshop, (tx) => startOnce(tx, parts, who, wish));
  }
}

async function startOnce(tx: Tx, parts: Parts, who: Starter, wish: Wish): Promise<RunRow> {
  const before = await findRun(tx, wish.id);
  if (before !== undefined) return sameRun(before, who, wish);

  const machine = await findMachines(tx).where('machines.id', '=', wish.machine).executeTakeFirst();
  if (machine === undefined) throw new ProblemError('not-found', 'There is no such machine in this workshop.');
  const version = await findTreeVersion(tx, wish.tree, wish.version);
  if (version === undefined) throw new ProblemError('not-found', `There is no version ${wish.version} of the tree “${wish.tree}”.`);
  if (version.state !== 'issued') throw new ProblemError('not-startable', `Version ${wish.version} of “${version.document.title}” is ${version.state}; a run needs an issued one.`);
  const against = misfits(version.document, machine.profile, machine.serial);
  if (against.length > 0) throw new ProblemError('not-startable', `“${version.document.title}” does not apply to ${machine.name}: ${against.join('; ')}.`);

  const { settings, hash: settingsHash } = await getSettings(tx);
  const { found, missing, withdrawn } = await findCallees(tx, version.document);
  if (missing.length > 0) throw new ProblemError('not-startable', `The called tree ${missing.join(', ')} has no issued version.`);
  if (withdrawn.length > 0) {
    const faults = withdrawn.map((fault) => ({ path: `${fault.step ?? ''}.${fault.key}`, message: fault.message }));
    throw new ProblemError('not-startable', `“${version.document.title}” calls a tree that may lead nobody any more: ${withdrawn[0]?.message ?? ''}.`, { faults });
  }
  const pair = { tree: version.document, callees: found.map((row) => row.document), profile: machine.profile, settings };
  const compiled = compile(pair);
  if (!compiled.ok) {
    const faults = compiled.faults.map((fault) => ({ path: [fault.step, fault.key].filter(Boolean).join('.'), message: fault.message }));
    throw new ProblemError('not-startable', `This tree does not hold for ${machine.name}: ${faults[0]?.path ?? ''}: ${faults[0]?.message ?? ''}.`, { faults });
  }
  const { program } = compiled;

  const now = parts.clock();
  const start: RunStart = {
    run: wish.id,
    restorer: who.person,
    restorerIsSenior: who.roles.includes('senior'),
    at: now,
    ...(await carriedBy(tx, machine.id, now, settings.releaseDays)),
  };
  const unmet = unmetAtStart(program, start);
  if (unmet.length > 0) throw new ProblemError('not-startable', `This tree needs at its start: ${unmet.join('; ')}. ${machine.name} does not bring that.`);

  // what is still fitted is put back by the machine before the first step
  const broken = prove({ ...pair, carried: { ...start, fitted: [] } }).rules.filter((rule) => !rule.holds);
  if (broken.length > 0) throw new ProblemError('not-startable', `The proof of this tree does not hold for ${machine.name}. ${broken[0]?.id ?? ''}: ${broken[0]?.story ?? ''}`, { rule: broken[0]?.id ?? null });

  const state = startMachine(program, start);
  const callees = found.map((row) => ({ tree: row.tree, version: row.version, hash: row.hash }));
  try {
    await insertRun(tx, {
      id: wish.id, workshop: who.workshop, machine: machine.id, tree: version.tree, tree_version: version.version, tree_hash: version.hash,
      callees: JSON.stringify(callees), profile_revision: machine.revision, profile_hash: machine.hash, settings: JSON.stringify(settings), settings_hash: settingsHash,
      engine: program.engine, restorer: who.person, restorer_roles: [...who.roles], state: 'open', ended: null, started_at: new Date(now), closed_at: null,
    });
  } catch (error) {
    if (isUniqueViolation(error, OPEN_RUN_INDEX)) throw new ProblemError('machine-busy', `A run is open on ${machine.name}. One run at a time works on a machine: close that one first.`, { run: machine.open_run });
    if (isUniqueViolation(error, RUN_ID_KEY)) throw new ProblemError('id-taken', 'This run id is taken.');
    throw error;
  }
  await tx
    .insertInto('run_heads')
    .values({ run: wish.id, workshop: who.workshop, seq: 0, hash: GENESIS, heard_at: new Date(now), hold_entry: null, ...headOf(program, state) })
    .execute();
  const head = await lockHead(tx, wish.id);
  const pins = { tree: version.tree, version: version.version, treeHash: version.hash, callees, profileRevision: machine.revision, profileHash: machine.hash, settingsHash, engine: program.engine };
  await appendEntries(
    tx, head,
    [{ id: uuidv7(), at: new Date(now).toISOString(), monotonic: wish.monotonic, actor: who.person, kind: 'opened', body: JSON.parse(JSON.stringify({ start, pins, machine: machine.id, serial: machine.serial, roles: who.roles })) }],
    now,
  );
  const run = await findRun(tx, wish.id);
  if (run === undefined) throw new Error('a run that was just written is not there');
  await keepSnapshot(tx, run, { program, state }, head.seq);
  return run;
}

function sameRun(run: RunRow, who: Pick<SignedIn, 'person'>, wish: Wish): RunRow {
  const same = run.restorer === who.person && run.machine === wish.machine && run.tree === wish.tree && run.tree_version === wish.version;
  if (!same) throw new ProblemError('id-taken', 'This run id is taken by another run.');
  return run;
}

/** The release that counts now, and what earlier runs have left on the machine. */
async function carriedBy(tx: Tx, machine: string, now: number, releaseDays: number): Promise<Pick<RunStart, 'release' | 'fitted' | 'killers'>> {
  const releases = (await findReleases(tx, machine)).map((row) => releaseToWire(row, now, releaseDays));
  const tags = await findMachineTags(tx, machine);
  return {
    release: releases.some((release) => release.valid),
    fitted: tags.filter((tag) => tag.is === 'fitted').map((tag) => tag.body as FittedThing),
    killers: tags.filter((tag) => tag.is === 'killer').map((tag) => tag.body as { part: string; killer: string }),
  };
}
