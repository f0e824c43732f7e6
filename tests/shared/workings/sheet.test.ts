import { describe, expect, it } from 'vitest';
import { z } from 'zod';

import { choiceField, defineSheet, fieldsOf, numberField, rowsField, runSheet, textField } from '@/shared/workings/sheet';

const row = z.strictObject({
  name: textField('Name', 'What it is called', 20),
  volts: numberField({ title: 'Volts', description: 'With its sign', unit: 'V', min: -100, max: 100 }),
  kind: choiceField('Kind', 'What it is', ['cell', 'rail']).default('rail'),
  amps: numberField({ title: 'Amps', description: 'Empty for none', unit: 'A', min: 0, max: 10 }).nullable().default(null),
});
const inputs = z.strictObject({
  rails: rowsField({ title: 'Rails', description: 'Every rail', rowName: 'rail', row, fewest: 1, most: 3 }),
});
const sum = defineSheet({
  id: 'sum',
  title: 'Sum',
  question: 'What do they add up to?',
  inputs,
  output: z.strictObject({ volts: z.number(), amps: z.array(z.number().nullable()) }),
  law: [],
  validity: '',
  source: '',
  caution: '',
  checks: [],
  example: { rails: [{ name: 'a', volts: 5 }] },
  compute: ({ rails }) => ({
    ok: true,
    result: { volts: rails.reduce((all, rail) => all + rail.volts, 0), amps: rails.map((rail) => rail.amps) },
    headline: '',
    formula: [],
    validity: '',
    source: '',
  }),
});

describe('rowsField', () => {
  it('tells a form its columns, with units, choices and what stands in', () => {
    const [[name, field] = ['', null]] = fieldsOf(inputs);
    expect(name).toBe('rails');
    expect(field).toMatchObject({ kind: 'rows', title: 'Rails', choices: null, rows: { rowName: 'rail', fewest: 1, most: 3 } });
    expect(field?.rows?.columns).toMatchObject([
      ['name', { kind: 'text', title: 'Name', unit: null }],
      ['volts', { kind: 'number', unit: 'V', rows: null }],
      ['kind', { kind: 'choice', choices: ['cell', 'rail'], fallback: 'rail' }],
      ['amps', { kind: 'number', unit: 'A', mayBeEmpty: true, fallback: null }],
    ]);
  });

  it('gives the sheet its rows with their defaults', () => {
    const answer = runSheet(sum, {
      rails: [
        { name: ' a ', volts: 5 },
        { name: 'b', volts: -12, amps: 2 },
      ],
    });
    expect(answer).toMatchObject({ ok: true, result: { volts: -7, amps: [null, 2] } });
  });

  it.each([
    [{}, 'rails', 'Rails is missing.'],
    [{ rails: 'x' }, 'rails', 'Rails must be a list.'],
    [{ rails: [] }, 'rails', 'Rails must be a list of 1 or more.'],
    [{ rails: [1, 2, 3, 4].map((n) => ({ name: String(n), volts: n })) }, 'rails', 'Rails must be a list of 3 or fewer.'],
    [{ rails: [{ name: 'a', volts: 5 }, 'x'] }, 'rails.1', 'Rail 2 must be a row with its columns.'],
    [{ rails: [{ name: 'a', volts: 5 }, { name: 'b' }] }, 'rails.1.volts', 'Rail 2: Volts is missing.'],
    [{ rails: [{ name: 'a', volts: 500 }] }, 'rails.0.volts', 'Rail 1: Volts must be 100 V or less.'],
    [{ rails: [{ name: '  ', volts: 5 }] }, 'rails.0.name', 'Rail 1: Name is missing.'],
    [{ rails: [{ name: 'a', volts: 5, ohms: 2 }] }, 'rails.0.ohms', 'Rail 1 has no input “ohms”.'],
    [{ rails: [{ name: 'a', volts: 5 }], ohms: 2 }, 'ohms', 'Sum has no input “ohms”.'],
    ['x', '', 'Sum takes an object with its inputs.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sum, input)).toEqual({ ok: false, field, say });
  });
});
