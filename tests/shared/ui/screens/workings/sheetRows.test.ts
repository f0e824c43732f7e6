import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';

import { parametersOf, sheetAddress, takenFrom, textsFrom } from '@/shared/ui/screens/workings/sheetAddress';
import { readSheet, sheetFields, startTexts } from '@/shared/ui/screens/workings/sheetForm';
import type { SheetList } from '@/shared/ui/screens/workings/sheetPart';
import { withoutRow, withRow } from '@/shared/ui/screens/workings/sheetRows';
import { choiceField, numberField, rowsField, textField } from '@/shared/workings/sheet';

const inputs = z.strictObject({
  guard: numberField({ title: 'Guard', description: '', unit: 'V', min: 0, max: 10 }).nullable().default(null),
  rails: rowsField({
    title: 'Rails',
    description: '',
    rowName: 'rail',
    row: z.strictObject({
      name: textField('Name', ''),
      volts: numberField({ title: 'Volts', description: '', unit: 'V', min: -100, max: 100 }),
      takes: choiceField('Takes', '', ['no', 'yes']),
    }),
    fewest: 1,
    most: 3,
  }),
});
const sheet = {
  inputs,
  example: {
    rails: [
      { name: '+5 V', volts: 5, takes: 'yes' as const },
      { name: '−12 V', volts: -12, takes: 'no' as const },
    ],
  },
};
const parts = sheetFields(sheet);
const rails = parts[1] as SheetList;
const start = startTexts(sheet);

describe('a list of rows in a form', () => {
  it('stands with a row for each of the example and reads back as it is', () => {
    expect(start).toMatchObject({ rails: '2', 'rails.0.name': '+5 V', 'rails.1.volts': '-12' });
    expect(readSheet(parts, start)).toMatchObject({ errors: {}, inputs: inputs.parse(sheet.example) });
  });

  it('takes a row more, empty but for its choices, and asks for what is missing at its cells', () => {
    const more = withRow(rails, start);
    expect(more).toMatchObject({ rails: '3', 'rails.2.name': '', 'rails.2.takes': 'no' });
    expect(readSheet(parts, more).errors).toEqual({ 'rails.2.name': 'Name is missing.', 'rails.2.volts': 'Volts is missing.' });
    expect(withRow(rails, more)['rails']).toBe('3');
  });

  it('gives up a row and moves those below it up, whatever is typed in them', () => {
    const less = withoutRow(rails, { ...start, 'rails.1.volts': '1,234' }, 0);
    expect(less).toMatchObject({ rails: '1', 'rails.0.name': '−12 V', 'rails.0.volts': '1,234' });
    expect(Object.keys(less).filter((key) => key.startsWith('rails.1'))).toEqual([]);
    expect(readSheet(parts, less).errors['rails.0.volts']).toContain('Do you mean');
  });

  it('comes back from its address exactly, whatever was typed', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({ name: fc.string({ maxLength: 12 }), volts: fc.string({ maxLength: 6 }), takes: fc.constantFrom('no', 'yes') }),
          { maxLength: 3 },
        ),
        fc.string({ maxLength: 6 }),
        (rows, guard) => {
          const texts: Record<string, string> = { guard, rails: String(rows.length) };
          rows.forEach((row, at) => Object.entries(row).forEach(([column, text]) => (texts[`rails.${at}.${column}`] = text)));
          const address = new URL(
            sheetAddress('any', texts, { machine: 'Corvane 12', names: new Set(['guard', 'rails.0.volts']) }),
            'http://bench',
          );
          const given = Object.fromEntries(address.searchParams);
          expect(takenFrom(given)).toEqual({ machine: 'Corvane 12', names: new Set(['guard', 'rails.0.volts']) });
          expect(textsFrom(parts, start, given)).toEqual(texts);
        },
      ),
    );
  });

  it('takes an address without the list for the example, and one with fewer rows for the whole list', () => {
    expect(textsFrom(parts, start, {})).toEqual(start);
    expect(textsFrom(parts, start, { rails: '1', 'rails.0.name': 'raw' })).toMatchObject({
      rails: '1',
      'rails.0.name': 'raw',
      'rails.0.volts': '',
    });
    expect(textsFrom(parts, start, { rails: '900' })['rails']).toBe('3');
    expect(textsFrom(parts, start, { rails: 'many' })['rails']).toBe('0');
  });

  it('tells the router to drop what is gone', () => {
    expect(parametersOf({ guard: '', rails: '0' }, null, { 'rails.0.name': 'x' })).toEqual({
      guard: '',
      rails: '0',
      'rails.0.name': undefined,
    });
  });
});
