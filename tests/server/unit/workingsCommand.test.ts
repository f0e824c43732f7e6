import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { Ajv2020 } from 'ajv/dist/2020.js';
import * as fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { BadInput } from '@/server/cli/commands/args';
import { workings } from '@/server/cli/commands/workings';
import { inputSchemaOf, outputSchemaOf } from '@/server/cli/commands/workingsSchema';
import { SHEETS } from '@/shared/workings/list';
import { workingsPage } from '@/shared/workings/page';
import { nearExample } from '@/tests/shared/workings/anyInputs';

const KEPT = new URL('../../../docs/schema/workings/', import.meta.url);

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'lampstep-workings-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

async function write(json: unknown): Promise<string> {
  const file = join(folder, 'input.json');
  await writeFile(file, typeof json === 'string' ? json : JSON.stringify(json));
  return file;
}

async function complaint(...argv: string[]): Promise<string> {
  const answer = await workings.run(argv).catch((error: unknown) => error);
  if (!(answer instanceof BadInput)) throw new Error(`taken: ${JSON.stringify(answer)}`);
  return answer.message;
}

describe.each(SHEETS.map((sheet) => [sheet.id, sheet] as const))('workings %s', (id, sheet) => {
  // Units and titles stand in the schemas as well; a validator that is strict would not know them.
  const ajv = new Ajv2020({ strict: false, allErrors: true });
  const [validInput, validOutput] = [ajv.compile(inputSchemaOf(sheet)), ajv.compile(outputSchemaOf(sheet))];

  it('has its schemas in the documentation', async () => {
    const kept = async (side: string) => JSON.parse(await readFile(new URL(`${id}.${side}.json`, KEPT), 'utf8')) as unknown;
    const how = (side: string) => `npm run -s lampstep -- workings ${id} --schema ${side} > docs/schema/workings/${id}.${side}.json`;
    expect(await kept('input'), how('input')).toEqual(inputSchemaOf(sheet));
    expect(await kept('output'), how('output')).toEqual(outputSchemaOf(sheet));
  });

  it('answers what fits its input schema by what fits its output schema, or names a field', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.oneof(nearExample(sheet.inputs, sheet.example as Record<string, unknown>), fc.constant(sheet.example)),
        async (given) => {
          // Through JSON, as it comes and goes: what is not given is not there.
          const json = JSON.parse(JSON.stringify(given)) as unknown;
          expect(validInput(json), ajv.errorsText(validInput.errors)).toBe(true);
          const answer = await workings.run([id, await write(json)]).catch((error: unknown) => error);
          if (answer instanceof BadInput) {
            expect(answer.message).toMatch(/input\.json: [a-z][A-Za-z0-9.]*: \S.*[.?]$/);
            return;
          }
          const { output } = answer as { output: unknown };
          expect(validOutput(JSON.parse(JSON.stringify(output))), ajv.errorsText(validOutput.errors)).toBe(true);
        },
      ),
      { numRuns: 40 },
    );
  });

  it('takes by its schema what it prints as an example, and no key of another sheet', async () => {
    const { output } = await workings.run([id, '--example']);
    expect(validInput(output), ajv.errorsText(validInput.errors)).toBe(true);
    expect(validInput({ ...(output as object), poem: 1 })).toBe(false);
  });
});

describe('workings', () => {
  it('keeps no schema of a sheet that is gone', async () => {
    const wanted = SHEETS.flatMap(({ id }) => [`${id}.input.json`, `${id}.output.json`]);
    expect((await readdir(KEPT)).sort()).toEqual(wanted.sort());
  });

  it('lists every sheet with its inputs and their units', async () => {
    const { output } = await workings.run(['--list']);
    expect((output as { sheet: string }[]).map(({ sheet }) => sheet)).toEqual(SHEETS.map(({ id }) => id));
    expect(output).toContainEqual(
      expect.objectContaining({
        sheet: 'wire-drop',
        inputs: expect.objectContaining({ metres: { title: 'Length', unit: 'm' } }) as unknown,
      }),
    );
  });

  it('prints the page of the documentation', async () => {
    expect(await workings.run(['--page'])).toEqual({ good: true, output: workingsPage() });
  });

  it('works a file out', async () => {
    const { good, output } = await workings.run(['wire-drop', await write({ awg: 12, metres: 15.24, path: 'there-and-back', amps: 10 })]);
    expect(good).toBe(true);
    expect(output).toMatchObject({ sheet: 'wire-drop', headline: '158.8 mΩ: 1.59 V lost at 10 A.', result: { worstOhms: null } });
  });

  it('says what is wrong, and where', async () => {
    expect(await complaint('wire-drop', await write({ awg: 12, amps: 1 }))).toMatch(/input\.json: metres: Length is missing\.$/);
    expect(await complaint('wire-drop', await write({ awg: 12, metres: 1, amps: '1,234' }))).toMatch(
      /amps: Current must be a number in amps\.$/,
    );
    expect(await complaint('wire-drop', await write({ awg: 12, metres: 1, amps: 1, volts: 3 }))).toMatch(
      /volts: Wire and return drop has no input “volts”\.$/,
    );
    expect(await complaint('wire-drop', await write('[1, 2'))).toMatch(/is not JSON/);
    expect(await complaint('wire-drop', await write('[]'))).toMatch(/takes an object with its inputs\.$/);
    expect(await complaint('wire-drop', join(folder, 'none.json'))).toMatch(/none\.json: cannot be read\.$/);
    expect(await complaint('poem')).toMatch(/no sheet "poem"\. There are: series-lamp, /);
    for (const argv of [
      [],
      ['wire-drop'],
      ['wire-drop', 'a', 'b'],
      ['wire-drop', '--schema', 'both'],
      ['--verse'],
      ['--list', 'wire-drop'],
    ])
      expect(await complaint(...argv)).toMatch(/Usage: workings/);
  });
});
