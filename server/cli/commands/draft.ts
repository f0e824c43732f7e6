/** `draft`: from a check table to an ordered draft. */
import { z } from 'zod';

import { draft as draftTable } from '@/flows/draft/draft';
import { checkTableSchema } from '@/flows/draft/table';
import { BadInput, readArgs, readJson } from './args';
import type { Command } from './args';

const usage = 'draft TABLE.json [--no-exact]';
const options = { 'no-exact': { type: 'boolean' } } as const;

export const draft: Command = {
  name: 'draft',
  usage,
  about: [
    'Orders the checks of a table of suspects × checks by what they tell for their minutes, looking ahead; small tables are solved exactly.',
    'Prints the order, its expected and worst minutes, entropy and Huffman bounds, and the gap to the optimum (or to the bound).',
    'Exit 1 when some suspects are told apart by no check.',
  ],
  async run(argv) {
    const { file, values } = readArgs(argv, options, usage);
    const parsed = checkTableSchema.safeParse(await readJson(file));
    if (!parsed.success) throw new BadInput(`${file}:\n${z.prettifyError(parsed.error)}`);
    const drafted = draftTable(parsed.data, { exact: values['no-exact'] !== true });
    return { good: drafted.report.groups.length === 0, output: drafted };
  },
};
