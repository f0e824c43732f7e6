/** `schema`: the form of the documents as JSON Schema, for editors and other programs. */
import { z } from 'zod';

import { profileSchema } from '@/flows/document/profile';
import { settingsSchema } from '@/flows/document/settings';
import { treeSchema } from '@/flows/document/parseTree';
import { checkTableSchema } from '@/flows/draft/table';
import { machineEventSchema } from '@/flows/machine/events';
import { BadInput, readArgs } from './args';
import type { Command } from './args';

const usage = 'schema (tree | profile | settings | events | table)';

const FORMS = {
  tree: { title: 'Fault tree, format 1', schema: treeSchema },
  profile: { title: 'Machine profile, format 1', schema: profileSchema },
  settings: { title: 'Workshop settings, format 1', schema: settingsSchema },
  events: { title: 'Machine events of a run', schema: z.array(machineEventSchema) },
  table: { title: 'Check table for a draft, format 1', schema: checkTableSchema },
} as const;

export type FormName = keyof typeof FORMS;
export const FORM_NAMES = Object.keys(FORMS) as FormName[];

/** The JSON Schema (draft 2020-12) of one form. It says the shape; what names what, and that every outcome has one exit, is checked when a document is read. */
export function jsonSchemaOf(name: FormName): Record<string, unknown> {
  const { title, schema } = FORMS[name];
  return { title, ...z.toJSONSchema(schema, { io: 'input', reused: 'ref' }) };
}

export const schema: Command = {
  name: 'schema',
  usage,
  about: ['Prints the JSON Schema of a form. Those of tree and profile are kept in docs/schema.'],
  run(argv) {
    const { file } = readArgs(argv, {}, usage);
    const name = FORM_NAMES.find((known) => known === file);
    if (name === undefined) return Promise.reject(new BadInput(`There is no form "${file}".\nUsage: ${usage}`));
    return Promise.resolve({ good: true, output: jsonSchemaOf(name) });
  },
};
