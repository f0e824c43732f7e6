/** A tree on a machine, and the events of a run, read from the files that a command names. */
import { z } from 'zod';

import { parseProfile, parseTree } from '@/flows/document/parseTree';
import type { Profile } from '@/flows/document/profile';
import { defaultSettings, settingsSchema } from '@/flows/document/settings';
import type { Settings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { compile } from '@/flows/machine/compile';
import type { Program } from '@/flows/machine/compile';
import { machineEventSchema } from '@/flows/machine/events';
import type { MachineEvent } from '@/flows/machine/events';
import { BadInput, faultLine, readDocument, readJson } from './args';
import { libraryTrees } from './library';

/** Options that name what a tree is compiled with. */
export interface ProgramFiles {
  /** a file, or the profile itself where a record carries it */
  profile: string | Profile;
  settings?: string | Settings | undefined;
  /** called trees; what is not given comes from the starter library */
  callee?: string[] | undefined;
}

/** The tree of a file, compiled. @throws BadInput with every fault */
export async function readProgram(file: string, files: ProgramFiles): Promise<Program> {
  return compileTree(file, await readDocument(file, parseTree), files);
}

/** A tree that has been read, compiled with the files. @throws BadInput with every fault */
export async function compileTree(name: string, tree: Tree, files: ProgramFiles): Promise<Program> {
  const profile = typeof files.profile === 'string' ? await readDocument(files.profile, parseProfile) : files.profile;
  const settings = typeof files.settings === 'string' ? await readSettings(files.settings) : (files.settings ?? defaultSettings);
  const given = await Promise.all((files.callee ?? []).map((callee) => readDocument(callee, parseTree)));
  const callees = [...given, ...(await libraryTrees()).filter((t) => !given.some((g) => g.id === t.id))];
  const compiled = compile({ tree, callees, profile, settings });
  if (!compiled.ok) throw new BadInput([`${name} does not fit this profile:`, ...compiled.faults.map(faultLine)].join('\n'));
  return compiled.program;
}

/** Events of a run from a file that is an array of them. @throws BadInput naming the event */
export async function readEvents(file: string): Promise<MachineEvent[]> {
  return parseEvents(file, await readJson(file));
}

/** Events from parsed JSON; `at`, `monotonic` and `boot` may be left out and then go on by a second. @throws BadInput naming the event */
export function parseEvents(file: string, json: unknown): MachineEvent[] {
  if (!Array.isArray(json)) throw new BadInput(`${file}: is not an array of machine events.`);
  const firstAt = 1_000_000_000_000;
  return json.map((raw: unknown, i) => {
    const filled = typeof raw === 'object' && raw !== null ? { at: firstAt + i * 1000, monotonic: i * 1000, boot: 'walk', ...raw } : raw;
    const parsed = machineEventSchema.safeParse(filled);
    if (!parsed.success) throw new BadInput(`${file}, event ${i + 1}:\n${z.prettifyError(parsed.error)}`);
    return parsed.data;
  });
}

async function readSettings(file: string) {
  const parsed = settingsSchema.safeParse(await readJson(file));
  if (!parsed.success) throw new BadInput(`${file}:\n${z.prettifyError(parsed.error)}`);
  return parsed.data;
}
