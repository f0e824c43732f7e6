import { describe, expect, it } from 'vitest';

import { readSheet, sheetFields, startTexts } from '@/shared/ui/screens/workings/sheetForm';
import { SHEETS, sheetById } from '@/shared/workings/list';
import type { AnySheet } from '@/shared/workings/list';
import { runSheet } from '@/shared/workings/sheet';

function sheet(id: string): AnySheet {
  const found = sheetById(id);
  if (!found) throw new Error(`no sheet ${id}`);
  return found;
}

describe('the form of a sheet', () => {
  it.each(SHEETS.map((s) => [s.id, s] as const))('of %s reads its own example back as it is', (_, one) => {
    const read = readSheet(sheetFields(one), startTexts(one));
    expect(read.errors).toEqual({});
    expect(read.inputs).toEqual(one.inputs.parse(one.example));
    expect(runSheet(one, read.inputs).ok).toBe(true);
  });

  it.each([
    ['toolOhms', '4k7', 4700],
    ['farads', '470u', 470e-6],
    ['volts', '4,97', 4.97],
    ['volts', '470m', 0.47],
  ] as const)('takes %s typed as %s', (name, typed, value) => {
    const bleed = sheet('bleed-down');
    const { inputs, errors } = readSheet(sheetFields(bleed), { ...startTexts(bleed), [name]: typed });
    expect(errors).toEqual({});
    expect(inputs[name]).toBe(value);
  });

  it('asks back where a comma could mean two things', () => {
    const bleed = sheet('bleed-down');
    expect(readSheet(sheetFields(bleed), { ...startTexts(bleed), volts: '1,234' }).errors['volts']).toBe(
      'Do you mean 1.234 or 1234? Write it with a decimal point and without a mark for thousands.',
    );
  });

  it('refuses a unit of another quantity at its field', () => {
    const bleed = sheet('bleed-down');
    expect(readSheet(sheetFields(bleed), { ...startTexts(bleed), volts: '12 Ω' }).errors['volts']).toContain('That is ohms');
  });

  it('lets a field that may stay empty be empty, and asks for the others', () => {
    const bleed = sheet('bleed-down');
    const { inputs, errors } = readSheet(sheetFields(bleed), { ...startTexts(bleed), bleederOhms: '', volts: ' ' });
    expect(inputs['bleederOhms']).toBeNull();
    expect(Object.keys(errors)).toEqual(['volts']);
  });

  it('reads the limits of a reading in the unit of the chosen quantity', () => {
    const limit = sheet('reading-limit');
    const { inputs, errors } = readSheet(sheetFields(limit), {
      ...startTexts(limit),
      quantity: 'ohms',
      reading: '4k7',
      low: '',
      high: '5k',
      resolution: '1',
    });
    expect(errors).toEqual({});
    expect(inputs).toMatchObject({ reading: 4700, low: null, high: 5000 });
  });
});
