/** `draft`: from a check table to an ordered draft. */
import { z } from 'zod';

import { parseTree } from '@/flows/document/parseTree';
import { draft as draftTable } from '@/flows/draft/draft';
import { draftTree } from '@/flows/draft/draftTree';
import { checkTableSchema } from '@/flows/draft/table';
import { BadInput, faultLine, readArgs, readJson } from './args';
import type { Command } from './args';

const usage = 'draft TABLE.json [--no-exact] [--tree ID]';
const options = { 'no-exact': { type: 'boolean' }, tree: { type: 'string' } } as const;

export const draft: Command = {
  name: 'draft',
  usage,
  about: [
    'Orders the checks of a table of suspects × checks by what they tell for their minutes, looking ahead; small tables are solved exactly.',
    'Prints the order, its expected and worst minutes, entropy and Huffman bounds, and the gap to the optimum (or to the bound).',
    'With --tree ID it prints the draft as a fault tree document of that id, for an author to go on with.',
    'Exit 1 when some suspects are told apart by no check.',
  ],
  async run(argv) {
    const { file, values } = readArgs(argv, options, usage);
    const parsed = checkTableSchema.safeParse(await readJson(file));
    if (!parsed.success) throw new BadInput(`${file}:\n${z.prettifyError(parsed.error)}`);
    const drafted = draftTable(parsed.data, { exact: values['no-exact'] !== true });
    const good = drafted.report.groups.length === 0;
    if (values.tree === undefined) return { good, output: drafted };
    const tree = parseTree(draftTree(parsed.data, drafted, { id: values.tree, symptom: parsed.data.title }));
    if (!tree.ok) throw new BadInput(['No tree can be made of this:', ...tree.faults.map(faultLine)].join('\n'));
    return { good, output: tree.value };
  },
};
