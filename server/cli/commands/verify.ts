/** `verify`: checks an exported record, its chain of entries and its signature, with nothing but the file and the published keys. */
import { z } from 'zod';

import { readExport } from '@/shared/record/exportFormat';
import { verifyExport } from '@/shared/record/verifyExport';
import { BadInput, readArgs, readJson, readText } from './args';
import type { Command } from './args';

const usage = 'verify RECORD.json (--keys JWKS.json | --chain-only)';
const options = { keys: { type: 'string' }, 'chain-only': { type: 'boolean' } } as const;
const jwks = z.object({ keys: z.array(z.looseObject({ kty: z.string() })) });

export const verify: Command = {
  name: 'verify',
  usage,
  about: ['Checks the entries of an exported record one by one, and the signature over its bytes against the published keys.', 'With --chain-only the signature is left unchecked, and said to be.'],
  async run(argv) {
    const { file, values } = readArgs(argv, options, usage);
    const text = await readText(file);
    if (values.keys === undefined) {
      if (values['chain-only'] !== true) throw new BadInput(`Give the published keys, or say --chain-only.\nUsage: ${usage}`);
      const read = readExport(text);
      if (!read.ok) throw new BadInput(`${file}: ${read.say}`);
      return { good: read.chain.ok, output: { run: read.record.run, entries: read.entries.length, sha256: read.sha256, chain: read.chain, signature: { state: 'not checked' } } };
    }
    const keys = jwks.safeParse(await readJson(values.keys));
    if (!keys.success) throw new BadInput(`${values.keys}: is not a set of published keys.`);
    const read = await verifyExport(text, keys.data);
    if (!read.ok) throw new BadInput(`${file}: ${read.say}`);
    return { good: read.trusted, output: { run: read.record.run, entries: read.entries.length, sha256: read.sha256, chain: read.chain, signature: read.signature } };
  },
};
