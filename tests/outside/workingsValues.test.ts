import { readdirSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { sheetById, SHEETS } from '@/shared/workings/list';
import { runSheet } from '@/shared/workings/sheet';
import type { OutsideValue } from '@/tests/outside/outsideValue';

// Every file in values/ is read, every row in it is run below, and only rows that are run are counted.
const files = readdirSync(new URL('values/', import.meta.url)).map((name) => name.replace(/\.ts$/, ''));
const rows: readonly OutsideValue[] = (
  await Promise.all(files.map(async (name) => ((await import(`./values/${name}.ts`)) as { values: readonly OutsideValue[] }).values))
).flat();

function got(row: OutsideValue): unknown {
  if ('gives' in row) return row.gives();
  const sheet = sheetById(row.sheet);
  if (sheet === undefined) throw new Error(`There is no sheet ${row.sheet}.`);
  const answer = runSheet(sheet, row.given);
  if (!answer.ok) throw new Error(`${answer.field}: ${answer.say}`);
  const found = row.read
    .split('.')
    .reduce<unknown>((value, key) => (value as Readonly<Record<string, unknown>> | null)?.[key], answer.result);
  return typeof found === 'number' ? found * (row.times ?? 1) : found;
}

describe.each(SHEETS.map((sheet) => [sheet.id, rows.filter((row) => row.sheet === sheet.id)] as const).filter(([, of]) => of.length > 0))(
  '%s against published values',
  (_, of) => {
    it.each(of.map((row) => [row.what, row.source, row] as const))('%s (%s)', (_what, _source, row) => {
      const value = got(row);
      if (typeof row.expected === 'string') expect(value).toBe(row.expected);
      else
        expect(Math.abs((value as number) - row.expected), `${String(value)} for ${String(row.expected)}`).toBeLessThanOrEqual(
          row.within ?? 0,
        );
    });
  },
);

describe('the published values', () => {
  it('are eighty or more, each of a sheet that exists, with its source, and none twice', () => {
    expect(rows.filter((row) => sheetById(row.sheet) === undefined)).toEqual([]);
    expect(rows.filter((row) => row.source.trim().length < 12).map((row) => row.what)).toEqual([]);
    expect(new Set(rows.map((row) => `${row.sheet}: ${row.what}`)).size).toBe(rows.length);
    expect(rows.length).toBeGreaterThanOrEqual(80);
  });

  it('hold every sheet at four places or more', () => {
    const counts = SHEETS.map((sheet) => [sheet.id, rows.filter((row) => row.sheet === sheet.id).length] as const);
    expect(counts.filter(([, count]) => count < 4)).toEqual([]);
  });

  it('are no figures of which anything would do', () => {
    for (const row of rows) {
      if (typeof row.expected === 'string') continue;
      expect(Number.isFinite(row.expected), row.what).toBe(true);
      // Never more than a twentieth off, and never so far that nothing at all would pass.
      expect(row.within ?? 0, row.what).toBeLessThanOrEqual(Math.abs(row.expected) / 20);
    }
  });
});
