/** `replay`: the answers of a past run on another version of its tree. */
import { z } from 'zod';

import { renamedSteps } from '@/flows/compare/renamed';
import { parseProfile, parseTree } from '@/flows/document/parseTree';
import type { Profile } from '@/flows/document/profile';
import { settingsSchema } from '@/flows/document/settings';
import type { Settings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { machineEventSchema } from '@/flows/machine/events';
import type { MachineEvent } from '@/flows/machine/events';
import type { RunStart } from '@/flows/machine/advance';
import { replay as replayRun } from '@/flows/replay/replay';
import { startSchema } from '@/shared/contract/runs';
import { readExport } from '@/shared/record/exportFormat';
import { BadInput, readArgs, readDocument, readText } from './args';
import type { Command } from './args';
import { compileTree, parseEvents } from './readProgram';

const usage = 'replay TREE.json --run RECORD.json [--profile PROFILE.json] [--older TREE.json] [--callee FILE]… [--settings FILE] [--senior] [--release]';
const options = {
  profile: { type: 'string' },
  run: { type: 'string' },
  older: { type: 'string' },
  callee: { type: 'string', multiple: true },
  settings: { type: 'string' },
  senior: { type: 'boolean' },
  release: { type: 'boolean' },
} as const;

export const replay: Command = {
  name: 'replay',
  usage,
  about: [
    'Plays the answers of a run (an exported record, or an array of machine events) on another version of its tree.',
    'Prints where it would have gone elsewhere or been refused, and where it comes back. Exit 1 when it would.',
    'Machine and settings are those of the record, unless they are given. With --older, or a record that carries its tree, steps that were only renamed are followed.',
  ],
  async run(argv) {
    const { file, values } = readArgs(argv, options, usage);
    if (values.run === undefined) throw new BadInput(`Usage: ${usage}`);
    const tree = await readDocument(file, parseTree);
    const past = readRun(values.run, await readText(values.run));
    const profile = values.profile ?? past.profile;
    if (profile === null) throw new BadInput(`${values.run}: does not carry the profile of its machine. Give it with --profile.\nUsage: ${usage}`);
    const program = await compileTree(file, tree, { ...values, profile, settings: values.settings ?? past.settings ?? undefined });
    const older = values.older === undefined ? past.tree : await readDocument(values.older, parseTree);
    const start = past.start ?? { restorer: 'restorer', restorerIsSenior: values.senior ?? false, release: values.release ?? false, fitted: [], killers: [], at: past.events[0]?.at ?? 0 };
    const replayed = replayRun(program, start, past.events, older === null ? undefined : renamedSteps(older, tree));
    return { good: replayed.same, output: replayed };
  },
};

interface PastRun {
  events: MachineEvent[];
  start: RunStart | null;
  /** what the record carries of what it was pinned to */
  tree: Tree | null;
  profile: Profile | null;
  settings: Settings | null;
}

function readRun(file: string, text: string): PastRun {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch (error) {
    throw new BadInput(`${file}: is not JSON (${error instanceof Error ? error.message : String(error)}).`);
  }
  if (Array.isArray(json)) return { events: parseEvents(file, json), start: null, tree: null, profile: null, settings: null };
  const read = readExport(text);
  if (!read.ok) throw new BadInput(`${file}: is neither an array of machine events nor an exported record (${read.say})`);
  if (!read.chain.ok) throw new BadInput(`${file}: its entries do not hold together; verify it first.`);
  const start = startSchema.safeParse(read.entries[0]?.body['start']);
  if (!start.success) throw new BadInput(`${file}: its first entry does not say how the run began.`);
  const events = read.entries.flatMap((entry): MachineEvent[] => {
    const event = entry.body['event'];
    if (event === undefined || event === null) return [];
    const parsed = machineEventSchema.safeParse(event);
    if (!parsed.success) throw new BadInput(`${file}, entry ${entry.seq}:\n${z.prettifyError(parsed.error)}`);
    return [parsed.data];
  });
  const { record } = read;
  const [tree, profile, settings] = [parseTree(record.tree.document), parseProfile(record.profile.document), settingsSchema.safeParse(record.settings.document)];
  return { events, start: start.data as RunStart, tree: tree.ok ? tree.value : null, profile: profile.ok ? profile.value : null, settings: settings.success ? settings.data : null };
}
