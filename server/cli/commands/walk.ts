/** `walk`: plays answers through a tree, as server and client would, and stops at the first that the machine refuses. */
import { advance, startRun, unmetAtStart } from '@/flows/machine/advance';
import type { MachineEvent } from '@/flows/machine/events';
import { view } from '@/flows/machine/view';
import { BadInput, readArgs } from './args';
import type { Command } from './args';
import { readEvents, readProgram } from './readProgram';

const usage = 'walk TREE.json --profile PROFILE.json --answers ANSWERS.json [--callee FILE]… [--settings FILE] [--senior] [--release]';
const options = {
  profile: { type: 'string' },
  answers: { type: 'string' },
  callee: { type: 'string', multiple: true },
  settings: { type: 'string' },
  senior: { type: 'boolean' },
  release: { type: 'boolean' },
} as const;

export const walk: Command = {
  name: 'walk',
  usage,
  about: [
    'Plays an array of machine events; `at`, `monotonic` and `boot` may be left out and then go on by a second.',
    'Prints the final step, the bench facts, the entries, and the first refused event with its house rule.',
    'Called trees come from --callee, otherwise from the starter library.',
  ],
  async run(argv) {
    const { file, values } = readArgs(argv, options, usage);
    if (values.profile === undefined || values.answers === undefined) throw new BadInput(`Usage: ${usage}`);
    const program = await readProgram(file, { ...values, profile: values.profile });
    const events = await readEvents(values.answers);
    const start = { restorer: 'restorer', restorerIsSenior: values.senior ?? false, release: values.release ?? false, fitted: [], killers: [], at: events[0]?.at ?? 0 };
    const unmet = unmetAtStart(program, start);
    if (unmet.length > 0) throw new BadInput(`${file} needs at its start: ${unmet.join(', ')}.`);

    let state = startRun(program, start);
    const entries: { seq: number; kind: string; event: MachineEvent }[] = [];
    let refused: { index: number; event: MachineEvent; rule: string | null; code: string; say: string } | null = null;
    for (const [index, event] of events.entries()) {
      const advanced = advance(program, state, event);
      if (!advanced.ok) {
        refused = { index, event, ...advanced.refusal };
        break;
      }
      state = advanced.state;
      entries.push({ seq: entries.length + 1, kind: advanced.kind, event });
    }
    const now = view(program, state);
    return { good: refused === null, output: { step: now.key, phase: now.phase, title: now.title, power: now.band, end: now.end, facts: now.facts, entries, refused } };
  },
};
