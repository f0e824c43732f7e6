import { describe, expect, it } from 'vitest';

import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { parseReading } from '@/shared/quantity/parseReading';
import type { Unit } from '@/shared/quantity/units';

describe('lengths, areas and melting values as fields of a sheet', () => {
  it.each<[string, Unit, number, string]>([
    ['1.8', 'm', 1.8, '1.8 m'],
    ['1,8 m', 'm', 1.8, '1.8 m'],
    ['180 mm', 'm', 0.18, '0.18 m'],
    ['35cm', 'm', 0.35, '0.35 m'],
    ['50 ft', 'm', 15.24, '15.24 m'],
    ['12 in', 'm', 0.3048, '0.3048 m'],
    ['350m', 'm', 350, '350 m'],
    ['0,75', 'mm²', 0.75, '0.75 mm²'],
    ['2.5 mm2', 'mm²', 2.5, '2.5 mm²'],
    ['1.5 sq mm', 'mm²', 1.5, '1.5 mm²'],
    ['2.5m', 'A²s', 0.0025, '2.5 mA²s'],
    ['0.69 A2s', 'A²s', 0.69, '690 mA²s'],
  ])('takes %s', (text, unit, value, echo) => {
    const parsed = parseReading(text, { unit });
    expect(parsed).toMatchObject({ ok: true, kind: 'value', echo });
    expect(parsed.ok && parsed.kind === 'value' ? parsed.value : null).toBeCloseTo(value, 12);
  });

  it.each<[string, Unit, RegExp]>([
    ['1,234', 'm', /^Do you mean 1.234 or 1234\?/],
    ['1,234', 'A²s', /^Do you mean 1.234 or 1234\?/],
    ['3 mm', 'V', /^That is metres; this field takes volts\.$/],
    ['0.75 mm', 'mm²', /^That is metres; this field takes square millimetres\.$/],
    ['18 AWG', 'mm²', /is not a number; this field takes square millimetres/],
    ['2000 km', 'm', /is more than any bench reading/],
  ])('asks back at %s', (text, unit, say) => {
    const parsed = parseReading(text, { unit });
    expect(parsed.ok ? '' : parsed.say).toMatch(say);
  });

  it('prints a short length in metres, which reads back as itself', () => {
    const printed = formatQuantity(0.35, 'm');
    expect(printed).toBe('0.35 m');
    expect(parseReading(printed, { unit: 'm' })).toMatchObject({ value: 0.35 });
  });

  it('still takes a lone m as milli where no length is asked for', () => {
    expect(parseReading('470 m', { unit: 'Ω' })).toMatchObject({ value: 0.47 });
    expect(parseReading('3 m', { unit: 's' })).toMatchObject({ ok: false, why: 'ambiguous' });
  });
});
