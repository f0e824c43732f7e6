import { describe, expect, it } from 'vitest';

import { faultWords } from '@/shared/ui/screens/workings/faultWords';
import { notedWords } from '@/shared/ui/screens/workings/notedWords';
import { rowWords } from '@/shared/ui/screens/workings/rowWords';
import type { SheetField, SheetList } from '@/shared/ui/screens/workings/sheetPart';

const field = (name: string, title: string, more: Partial<SheetField> = {}): SheetField => ({
  kind: 'number',
  name,
  title,
  description: '',
  unit: 'V',
  optional: false,
  choices: null,
  signed: true,
  ...more,
});
const rails: SheetList = {
  kind: 'rows',
  name: 'rails',
  title: 'Rails',
  description: '',
  rowName: 'rail',
  fewest: 1,
  most: 4,
  columns: [
    field('name', 'Name', { kind: 'text', unit: null }),
    field('volts', 'Volts'),
    field('takes', 'Takes current', { kind: 'choice', unit: null, choices: ['no', 'yes'] }),
  ],
};
const parts = [field('guard', 'Guard band'), rails];

describe('why a sheet has no answer', () => {
  it.each([
    [{ guard: 'Do you mean 1.234 or 1234?' }, 'Guard band: Do you mean 1.234 or 1234?'],
    [{ guard: 'Guard band must be 0 V or more.' }, 'Guard band must be 0 V or more.'],
    [{ 'rails.1.volts': 'Volts is missing.' }, 'Rail 2: Volts is missing.'],
    [{ 'rails.1.volts': 'That is ohms.' }, 'Rail 2: Volts: That is ohms.'],
    [{ 'rails.0': 'Rail 1 and rail 2 have one name.' }, 'Rail 1 and rail 2 have one name.'],
    [{ rails: 'Rails must be a list of 1 or more.' }, 'Rails must be a list of 1 or more.'],
    [{ elsewhere: 'It does not settle.' }, 'It does not settle.'],
    [{}, null],
  ])('%j is told as %j', (errors, words) => {
    expect(faultWords({ parts, errors: errors as Record<string, string> })).toBe(words);
  });
});

describe('a row on a line', () => {
  it('stands under its name with what else is typed', () => {
    expect(rowWords(rails, 0, { 'rails.0.name': '+5 V', 'rails.0.volts': '5', 'rails.0.takes': 'no' })).toEqual({
      title: '+5 V',
      detail: 'volts 5 V, takes current no',
    });
  });

  it('stands under its place while it has no name', () => {
    expect(rowWords(rails, 1, { 'rails.1.volts': '4,97' })).toEqual({ title: 'rail 2', detail: 'volts 4,97 V' });
    expect(rowWords(rails, 2, {})).toEqual({ title: 'rail 3', detail: '' });
    expect(rowWords(rails, 1, { 'rails.1.volts': '400m' }, { 'rails.1.volts': '400 mV' }).detail).toBe('volts 400 mV');
  });
});

describe('what has become of a note', () => {
  const aside = { notTaken: { say: 'This run is closed.', rule: null } };

  it('is said for each place that it can be at', () => {
    expect(notedWords('Corvane 12', null)).toContain('Noted on this device');
    expect(notedWords('Corvane 12', { waiting: 1, notTaken: [] })).toContain('Noted on this device');
    expect(notedWords('Corvane 12', { waiting: 0, notTaken: [] })).toBe('Noted in the record of Corvane 12.');
    expect(notedWords('Corvane 12', { waiting: 0, notTaken: [aside] as never })).toBe(
      'The note was not taken into the record of Corvane 12: This run is closed.',
    );
  });
});
