import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { SHEETS, sheetById } from '@/shared/workings/list';
import { workingsPage } from '@/shared/workings/page';
import { fieldsOf, runSheet } from '@/shared/workings/sheet';

describe('SHEETS', () => {
  it('has every id once and finds each by it', () => {
    expect(new Set(SHEETS.map(({ id }) => id)).size).toBe(SHEETS.length);
    for (const sheet of SHEETS) expect(sheetById(sheet.id)).toBe(sheet);
    expect(sheetById('none')).toBeUndefined();
  });

  it.each(SHEETS.map((sheet) => [sheet.id, sheet] as const))(
    '%s has a title and a description at every field, and works its example out',
    (_, sheet) => {
      for (const [name, field] of fieldsOf(sheet.inputs)) {
        expect(field.title, name).not.toBe(name);
        expect(field.description.length, name).toBeGreaterThan(5);
      }
      const answer = runSheet(sheet, sheet.example);
      if (!answer.ok) throw new Error(answer.say);
      expect(answer.headline).toMatch(/\.$/);
      expect(answer.formula.length).toBeGreaterThan(1);
      expect(answer.validity).not.toBe('');
      expect(answer.source).not.toBe('');
      expect(JSON.stringify(answer)).not.toMatch(/NaN|undefined|\u00b5|\u2126/);
    },
  );

  it.each(SHEETS.map((sheet) => [sheet.id, sheet] as const))('%s refuses nonsense with a sentence at the field', (_, sheet) => {
    for (const [name, { kind, rows }] of fieldsOf(sheet.inputs)) {
      for (const nonsense of [
        kind === 'text' ? ' ' : 'x',
        {},
        rows?.fewest === 0 ? 'x' : [],
        true,
        Number.NaN,
        Number.POSITIVE_INFINITY,
        -1e300,
      ]) {
        const answer = runSheet(sheet, { ...sheet.example, [name]: nonsense });
        expect(answer).toMatchObject({ ok: false, field: name });
        expect(answer.ok ? '' : answer.say).toMatch(/^[A-Z].* (must be|is missing).*\.$/);
      }
    }
  });
});

describe('workingsPage', () => {
  it('is the page that is in docs; write it anew with the function when a sheet changes', () => {
    expect(readFileSync(new URL('../../../docs/workings.md', import.meta.url), 'utf8')).toBe(workingsPage());
  });
});
