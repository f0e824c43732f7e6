/** What every command of the command line shares: its arguments, its files and its way to say that an input is bad. */
import { readFile } from 'node:fs/promises';
import { parseArgs } from 'node:util';

import type { DocumentFault, Parsed } from '@/flows/document/parseTree';

/** A fault of the input: the sentence goes to standard error, the exit code is 2. */
export class BadInput extends Error {}

export interface Command {
  name: string;
  usage: string;
  about: readonly string[];
  run(argv: string[]): Promise<{ good: boolean; output: unknown }>;
}

type Options = Record<string, { type: 'string' | 'boolean'; multiple?: boolean }>;

/** Reads options and exactly one file name. @throws BadInput with the usage */
export function readArgs<O extends Options>(argv: string[], options: O, usage: string) {
  try {
    const parsed = parseArgs({ args: argv, options, allowPositionals: true, strict: true });
    const [file, ...more] = parsed.positionals;
    if (file === undefined || more.length > 0) throw new BadInput(`Usage: ${usage}`);
    return { file, values: parsed.values };
  } catch (error) {
    if (error instanceof BadInput) throw error;
    throw new BadInput(`${error instanceof Error ? error.message : String(error)}\nUsage: ${usage}`);
  }
}

/** The text of a file. @throws BadInput naming it */
export async function readText(file: string): Promise<string> {
  try {
    return await readFile(file, 'utf8');
  } catch {
    throw new BadInput(`${file}: cannot be read.`);
  }
}

/** The JSON of a file. @throws BadInput naming it */
export async function readJson(file: string): Promise<unknown> {
  const text = await readText(file);
  try {
    return JSON.parse(text) as unknown;
  } catch (error) {
    throw new BadInput(`${file}: is not JSON (${error instanceof Error ? error.message : String(error)}).`);
  }
}

/** The document of a file. @throws BadInput with every fault, its step and its key */
export async function readDocument<T>(file: string, parse: (json: unknown) => Parsed<T>): Promise<T> {
  const parsed = parse(await readJson(file));
  if (parsed.ok) return parsed.value;
  throw new BadInput([`${file}:`, ...parsed.faults.map(faultLine)].join('\n'));
}

/** One fault of a document on a line. */
export function faultLine(fault: DocumentFault): string {
  return `  ${fault.step === null ? 'head' : `step ${fault.step}`}${fault.key === '' ? '' : `, ${fault.key}`}: ${fault.message}`;
}
