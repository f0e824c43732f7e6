/** `rehearse`: every suspect of a tree played through it, with no machine on the bench. */
import { groupsOf } from '@/flows/evidence/groups';
import { misreads } from '@/flows/evidence/misreads';
import { rehearse as rehearseTree } from '@/flows/rehearsal/rehearse';
import { BadInput, readArgs } from './args';
import type { Command } from './args';
import { readProgram } from './readProgram';

const usage = 'rehearse TREE.json --profile PROFILE.json [--suspect ID] [--callee FILE]… [--settings FILE]';
const options = { profile: { type: 'string' }, suspect: { type: 'string' }, callee: { type: 'string', multiple: true }, settings: { type: 'string' } } as const;

export const rehearse: Command = {
  name: 'rehearse',
  usage,
  about: [
    'Plays each suspect by the answers that it would cause: to its own verdict, to a group that the tree cannot tell apart, or past it.',
    'Prints coverage, expected and worst minutes, minutes live, steps that nothing comes to, and verdicts that hang on one answer.',
    'Exit 1 when a suspect is missed or a run does not come to an end.',
  ],
  async run(argv) {
    const { file, values } = readArgs(argv, options, usage);
    if (values.profile === undefined) throw new BadInput(`Usage: ${usage}`);
    const program = await readProgram(file, { ...values, profile: values.profile });
    const { tree } = program.layout;
    if (values.suspect !== undefined && !tree.suspects.some((s) => s.id === values.suspect)) throw new BadInput(`${file}: has no suspect "${values.suspect}". It has: ${tree.suspects.map((s) => s.id).join(', ') || 'none'}.`);
    const { good, ...report } = rehearseTree(program, values.suspect);
    return { good, output: { good, ...report, groups: groupsOf(tree).map((group) => group.map((s) => s.id)), misreads: misreads(tree) } };
  },
};
