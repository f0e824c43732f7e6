import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { parseReading } from '@/shared/quantity/parseReading';
import type { ReadingFault, Wanted } from '@/shared/quantity/parseReading';
import type { Quantity } from '@/shared/quantity/quantities';
import { QUANTITIES, QUANTITY_IDS } from '@/shared/quantity/quantities';
import { PREFIXES } from '@/shared/quantity/units';

const taken: readonly (readonly [string, Quantity, number, string])[] = [
  ['4.97', 'volts-dc', 4.97, '4.97 V'],
  ['4,97', 'volts-dc', 4.97, '4.97 V'],
  ['4.970', 'volts-dc', 4.97, '4.970 V'],
  ['470m', 'volts-dc', 0.47, '470 mV'],
  ['470 mV', 'volts-dc', 0.47, '470 mV'],
  ['4k7', 'ohms', 4700, '4.7 kΩ'],
  ['4K7', 'ohms', 4700, '4.7 kΩ'],
  ['4k7Ω', 'ohms', 4700, '4.7 kΩ'],
  ['4R7', 'ohms', 4.7, '4.7 Ω'],
  ['R47', 'ohms', 0.47, '470 mΩ'],
  ['0R1', 'ohms', 0.1, '100 mΩ'],
  ['470R', 'ohms', 470, '470 Ω'],
  ['3V3', 'volts-dc', 3.3, '3.3 V'],
  ['2u2', 'farads', 2.2e-6, '2.2 μF'],
  ['470u', 'farads', 470e-6, '470 μF'],
  ['470µ', 'farads', 470e-6, '470 μF'],
  ['470μF', 'farads', 470e-6, '470 μF'],
  ['470 uF', 'farads', 470e-6, '470 μF'],
  ['470 MFD', 'farads', 470e-6, '470 μF'],
  ['100 mmf', 'farads', 100e-12, '100 pF'],
  ['47n', 'farads', 47e-9, '47 nF'],
  ['22 mF', 'farads', 0.022, '22 mF'],
  ['-12.1', 'volts-dc', -12.1, '−12.1 V'],
  ['\u221212.1', 'volts-dc', -12.1, '−12.1 V'],
  ['\u201312,1 V', 'volts-dc', -12.1, '−12.1 V'],
  ['- 12.1 V', 'volts-dc', -12.1, '−12.1 V'],
  ['+5', 'volts-dc', 5, '5 V'],
  ['4.97 V', 'volts-dc', 4.97, '4.97 V'],
  ['4.97v', 'volts-dc', 4.97, '4.97 V'],
  ['4.97 VDC', 'volts-dc', 4.97, '4.97 V'],
  ['4.97 volts', 'volts-dc', 4.97, '4.97 V'],
  ['  4.97\u00a0V ', 'volts-dc', 4.97, '4.97 V'],
  ['117 V AC', 'volts-ac', 117, '117 V'],
  ['230~', 'volts-ac', 230, '230 V'],
  ['1.2k', 'volts-dc', 1200, '1.2 kV'],
  ['1.234', 'volts-dc', 1.234, '1.234 V'],
  ['0,470', 'volts-dc', 0.47, '470 mV'],
  ['1234,567', 'ohms', 1234.567, '1.234567 kΩ'],
  ['4,9700', 'volts-dc', 4.97, '4.9700 V'],
  ['.5', 'volts-dc', 0.5, '500 mV'],
  [',5', 'volts-dc', 0.5, '500 mV'],
  ['5.', 'volts-dc', 5, '5 V'],
  ['0', 'ohms', 0, '0 Ω'],
  ['-0', 'volts-dc', 0, '0 V'],
  ['2.2M', 'ohms', 2.2e6, '2.2 MΩ'],
  ['1M5', 'ohms', 1.5e6, '1.5 MΩ'],
  ['1 megohm', 'ohms', 1e6, '1 MΩ'],
  ['10 k\u2126', 'ohms', 10e3, '10 kΩ'],
  ['35m', 'esr-ohms', 0.035, '35 mΩ'],
  ['250 mA', 'amps-dc', 0.25, '250 mA'],
  ['12 uA', 'amps-dc', 12e-6, '12 μA'],
  ['0.512', 'diode-volts', 0.512, '512 mV'],
  ['42 °C', 'celsius', 42, '42 °C'],
  ['42℃', 'celsius', 42, '42 °C'],
  ['-5', 'celsius', -5, '−5 °C'],
  ['90 s', 'seconds', 90, '90 s'],
  ['2 min', 'seconds', 120, '120 s'],
  ['1,5 h', 'seconds', 5400, '5400 s'],
];

const refused: readonly (readonly [string, Wanted, ReadingFault, RegExp])[] = [
  ['', { quantity: 'volts-dc' }, 'empty', /Nothing is entered; this step reads volts DC/],
  ['   ', { quantity: 'ohms' }, 'empty', /Nothing is entered/],
  ['1,234', { quantity: 'volts-dc' }, 'ambiguous', /^Do you mean 1\.234 or 1234\?/],
  ['-1,234 V', { quantity: 'volts-dc' }, 'ambiguous', /^Do you mean −1\.234 or −1234\?/],
  ['1,234k', { quantity: 'ohms' }, 'ambiguous', /^Do you mean 1\.234 or 1234\?/],
  ['1 234', { quantity: 'ohms' }, 'ambiguous', /^Do you mean 1\.234 or 1234\?/],
  ['1.234,5', { quantity: 'ohms' }, 'ambiguous', /^Do you mean 1234\.5\?/],
  ['1,234.5', { quantity: 'ohms' }, 'ambiguous', /^Do you mean 1234\.5\?/],
  ['1.234.567', { quantity: 'ohms' }, 'ambiguous', /^Do you mean 1234567\?/],
  ['5m', { quantity: 'seconds' }, 'ambiguous', /5 ms or 5 min/],
  ['470 MF', { quantity: 'farads' }, 'ambiguous', /470 μF.*470 mF/],
  ['4.97 A', { quantity: 'volts-dc' }, 'wrong-unit', /^That is amps; this step reads volts DC\.$/],
  ['250mA', { quantity: 'volts-dc' }, 'wrong-unit', /^That is amps; this step reads volts DC\.$/],
  ['4R7', { quantity: 'volts-dc' }, 'wrong-unit', /^That is ohms; this step reads volts DC\.$/],
  ['12 V', { quantity: 'ohms' }, 'wrong-unit', /^That is volts; this step reads ohms\.$/],
  ['4.97 VAC', { quantity: 'volts-dc' }, 'wrong-unit', /^That is volts AC; this step reads volts DC\.$/],
  ['OL V', { quantity: 'ohms' }, 'wrong-unit', /^That is volts; this step reads ohms\.$/],
  ['40 W', { unit: 'V' }, 'wrong-unit', /^That is watts; this field takes volts\.$/],
  ['77 °F', { quantity: 'celsius' }, 'wrong-unit', /^That is degrees Fahrenheit; this step reads degrees Celsius\.$/],
  ['15 V', { unit: '' }, 'wrong-unit', /^That is volts; this field takes plain numbers\.$/],
  ['15k', { unit: '' }, 'wrong-prefix', /kilo/],
  ['470M', { quantity: 'volts-dc' }, 'wrong-prefix', /M is mega.*For milli write a small m/],
  ['1M', { quantity: 'farads' }, 'wrong-prefix', /M is mega/],
  ['470u', { quantity: 'celsius' }, 'wrong-prefix', /micro/],
  ['-4', { quantity: 'ohms' }, 'negative', /no minus sign/],
  ['-230', { quantity: 'volts-ac' }, 'negative', /no minus sign/],
  ['-OL', { quantity: 'ohms' }, 'negative', /minus/],
  ['999999', { quantity: 'volts-dc' }, 'absurd', /100 kV at most/],
  ['abc', { quantity: 'volts-dc' }, 'not-a-number', /“abc” is not a number/],
  ['4..97', { quantity: 'volts-dc' }, 'not-a-number', /not a number/],
  ['4,9,7', { quantity: 'volts-dc' }, 'not-a-number', /not a number/],
  ['4.97 5.01', { quantity: 'volts-dc' }, 'not-a-number', /not a number/],
  ['--5', { quantity: 'volts-dc' }, 'not-a-number', /not a number/],
  ['4.5k7', { quantity: 'ohms' }, 'not-a-number', /not a number/],
  ['4k7k', { quantity: 'ohms' }, 'not-a-number', /not a number/],
  ['1e3', { quantity: 'ohms' }, 'not-a-number', /not a number/],
  ['0x10', { quantity: 'ohms' }, 'not-a-number', /not a number/],
  ['4²', { quantity: 'volts-dc' }, 'not-a-number', /not a number/],
  ['NaN', { quantity: 'volts-dc' }, 'not-a-number', /not a number/],
  ['Infinity', { quantity: 'volts-dc' }, 'not-a-number', /not a number/],
  ['<1', { quantity: 'ohms' }, 'not-a-number', /not a number/],
  ['.', { quantity: 'ohms' }, 'not-a-number', /not a number/],
  ['k', { quantity: 'ohms' }, 'not-a-number', /not a number/],
  ['9'.repeat(200), { quantity: 'ohms' }, 'not-a-number', /…” is not a number/],
];

describe('parseReading', () => {
  it.each(taken)('takes %j as %s', (text, quantity, value, echo) => {
    expect(parseReading(text, { quantity })).toEqual({ ok: true, kind: 'value', value, echo });
  });

  it.each(refused)('refuses %j for %j as %s', (text, wanted, why, say) => {
    const parsed = parseReading(text, wanted);
    expect(parsed).toMatchObject({ ok: false, why });
    expect(parsed.ok ? '' : parsed.say).toMatch(say);
  });

  it.each(['OL', 'O.L', '0L', '0.L', 'ol', 'overload', 'over range', 'over-range', 'OL MΩ', '∞'])('takes %j as over range', (text) => {
    expect(parseReading(text, { quantity: 'ohms' })).toEqual({ ok: true, kind: 'over-range', sign: 1, echo: 'over range' });
  });

  it('takes a plain number where no unit is asked for', () => {
    expect(parseReading('6,6', { unit: '' })).toEqual({ ok: true, kind: 'value', value: 6.6, echo: '6.6' });
  });

  it('keeps the sign of an over-range display', () => {
    expect(parseReading('\u2212OL', { quantity: 'volts-dc' })).toMatchObject({ ok: true, kind: 'over-range', sign: -1 });
  });

  it('offers the values that an ambiguous entry could mean', () => {
    const parsed = parseReading('1,234 mV', { quantity: 'volts-dc' });
    expect(parsed.ok ? [] : parsed.choices).toEqual([
      { value: 0.001234, echo: '1.234 mV' },
      { value: 1.234, echo: '1.234 V' },
    ]);
  });

  it('reads back its own print for every quantity', () => {
    const readings = fc.constantFrom(...QUANTITY_IDS).chain((quantity) => {
      const { unit, signed, prefixes } = QUANTITIES[quantity];
      const exponents = prefixes.map((prefix) => PREFIXES[prefix].exponent);
      return fc.tuple(fc.integer({ min: 1, max: 9999 }), fc.constantFrom(...exponents), fc.boolean()).map(([figures, exponent, minus]) => ({
        quantity,
        unit,
        value: (minus && signed ? -1 : 1) * Number(`${figures}e${exponent - 3}`),
      }));
    });
    fc.assert(
      fc.property(readings, ({ quantity, unit, value }) => {
        const text = formatQuantity(value, unit, { digits: 15 });
        const parsed = parseReading(text, { quantity });
        // A prefix that the unit prints but this instrument never shows is refused by name.
        if (!parsed.ok) return parsed.why === 'wrong-prefix';
        return parsed.kind === 'value' && Math.abs(parsed.value - value) <= Math.abs(value) * 1e-12;
      }),
    );
  });

  it('never gives NaN and always a sentence, whatever is typed', () => {
    const alphabet = fc.constantFrom(..."0123456789.,-+ kKmMuμnpGRVAΩFsCOLe'~%°−");
    fc.assert(
      fc.property(fc.constantFrom(...QUANTITY_IDS), fc.string({ unit: alphabet, maxLength: 12 }), (quantity, text) => {
        const parsed = parseReading(text, { quantity });
        if (!parsed.ok)
          return parsed.say.length > 10 && /[.?]$/.test(parsed.say) && parsed.choices.every(({ value }) => Number.isFinite(value));
        return parsed.kind === 'over-range' || Number.isFinite(parsed.value);
      }),
      { numRuns: 3000 },
    );
  });
});
