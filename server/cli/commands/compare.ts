/** `compare`: what changed between two versions of a tree, and how far it reaches. */
import { compareTrees } from '@/flows/compare/compareTrees';
import { parseTree } from '@/flows/document/parseTree';
import type { Tree } from '@/flows/document/tree';
import { BadInput, readArgs, readDocument } from './args';
import type { Command } from './args';
import { libraryTrees } from './library';

const usage = 'compare OLDER.json NEWER.json [--callee FILE]…';
const options = { with: { type: 'string' }, callee: { type: 'string', multiple: true } } as const;

export const compare: Command = {
  name: 'compare',
  usage,
  about: [
    'Says what an author changed: steps added, removed, renamed and reworded, limits, exits, evidence, suspects, opening list.',
    'Prints the risk (text, limit, order, energy) and every new way to a live step.',
    'Exit 1 when the change reaches energy.',
  ],
  async run(argv) {
    const { file, values } = readArgs(withSecond(argv), options, usage);
    if (values.with === undefined) throw new BadInput(`Usage: ${usage}`);
    const [older, newer] = await Promise.all([readDocument(file, parseTree), readDocument(values.with, parseTree)]);
    const given = await Promise.all((values.callee ?? []).map((name) => readDocument(name, parseTree)));
    const powered = new Set([...(await libraryTrees()), ...given].filter(putsPowerIn).map((t) => t.id));
    const compared = compareTrees(older, newer, powered);
    return { good: compared.risk !== 'energy', output: compared };
  },
};

/** The second file may stand without its option. */
function withSecond(argv: string[]): string[] {
  const [first, second, ...rest] = argv;
  return first !== undefined && second !== undefined && !first.startsWith('-') && !second.startsWith('-') ? [first, '--with', second, ...rest] : argv;
}

function putsPowerIn(tree: Tree): boolean {
  return tree.steps.some((s) => s.kind === 'energise' || s.kind === 'raise');
}
