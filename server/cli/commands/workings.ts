/** `workings`: a bench calculation from a file, with everything that it stands on. */
import { parseArgs } from 'node:util';

import type { AnySheet } from '@/shared/workings/list';
import { sheetById, SHEETS } from '@/shared/workings/list';
import { workingsPage } from '@/shared/workings/page';
import { fieldsOf, runSheet } from '@/shared/workings/sheet';
import { BadInput, readJson } from './args';
import type { Command } from './args';
import { inputSchemaOf, outputSchemaOf } from './workingsSchema';

const usage = 'workings (SHEET INPUT.json | SHEET --example | SHEET --schema (input | output) | --list | --page)';
const options = { list: { type: 'boolean' }, page: { type: 'boolean' }, example: { type: 'boolean' }, schema: { type: 'string' } } as const;

function read(argv: string[]) {
  try {
    return parseArgs({ args: argv, options, allowPositionals: true, strict: true });
  } catch (error) {
    throw new BadInput(`${error instanceof Error ? error.message : String(error)}\nUsage: ${usage}`);
  }
}

/** Every sheet with its question and its inputs, units included. */
function list(): unknown {
  return SHEETS.map((sheet) => ({
    sheet: sheet.id,
    title: sheet.title,
    question: sheet.question,
    inputs: Object.fromEntries(
      fieldsOf(sheet.inputs).map(([name, { title, unit, choices, fallback }]) => [
        name,
        {
          title,
          ...(unit !== null && { unit }),
          ...(choices !== null && { choices }),
          ...(fallback !== undefined && { whenNotGiven: fallback }),
        },
      ]),
    ),
  }));
}

function known(id: string): AnySheet {
  const sheet = sheetById(id);
  if (sheet === undefined) throw new BadInput(`There is no sheet "${id}". There are: ${SHEETS.map((one) => one.id).join(', ')}.`);
  return sheet;
}

async function work(sheet: AnySheet, file: string): Promise<unknown> {
  const answer = runSheet(sheet, await readJson(file));
  if (!answer.ok) throw new BadInput(`${file}: ${answer.field === '' ? '' : `${answer.field}: `}${answer.say}`);
  const { ok: _ok, result, headline, ...grounds } = answer;
  return { sheet: sheet.id, headline, result, ...grounds };
}

export const workings: Command = {
  name: 'workings',
  usage,
  about: [
    'Works a sheet out from a file of its inputs in SI units, and prints answer, formula with the numbers in it, validity and source.',
    'A refused input ends with 2 and names its field. --list prints every sheet with its inputs, --example inputs to begin with.',
    '--schema prints the form of inputs or answer, --page the page docs/workings.md.',
  ],
  async run(argv) {
    const { values, positionals } = read(argv);
    const [id, file, ...more] = positionals;
    if (more.length > 0) throw new BadInput(`Usage: ${usage}`);
    if (values.list === true || values.page === true) {
      if (id !== undefined) throw new BadInput(`Usage: ${usage}`);
      return { good: true, output: values.list === true ? list() : workingsPage() };
    }
    if (id === undefined) throw new BadInput(`Usage: ${usage}`);
    const sheet = known(id);
    if (values.example === true) return { good: true, output: sheet.example };
    if (values.schema === 'input') return { good: true, output: inputSchemaOf(sheet) };
    if (values.schema === 'output') return { good: true, output: outputSchemaOf(sheet) };
    if (values.schema !== undefined || file === undefined) throw new BadInput(`Usage: ${usage}`);
    return { good: true, output: await work(sheet, file) };
  },
};
