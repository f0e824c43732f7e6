import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { SHEETS } from '@/shared/workings/list';
import { circuitFaults, plotFaults } from '@/shared/workings/plot';
import { fieldsOf, runSheet } from '@/shared/workings/sheet';
import { anyOf, nearExample } from '@/tests/shared/workings/anyInputs';

/** Numbers that are none, anywhere in an answer. */
function notFinite(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [path];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => notFinite(inner, `${path}.${key}`));
}

describe.each(SHEETS.map((sheet) => [sheet.id, sheet] as const))('%s', (_, sheet) => {
  const names = fieldsOf(sheet.inputs).map(([name]) => name);
  const near = nearExample(sheet.inputs, sheet.example as Record<string, unknown>);

  it('gives no NaN, nothing without end and no broken drawing for any input that its form admits', () => {
    fc.assert(
      fc.property(fc.oneof({ arbitrary: near, weight: 3 }, { arbitrary: anyOf(sheet.inputs), weight: 1 }), (given) => {
        const answer = runSheet(sheet, given);
        if (!answer.ok) {
          expect(names).toContain(answer.field.split('.')[0]);
          expect(answer.say).toMatch(/^\S.*[.?]$/s);
          return;
        }
        expect(notFinite(answer.result)).toEqual([]);
        expect(JSON.stringify(answer)).not.toMatch(/NaN|undefined|no value|Infinity|\u00b5|\u2126/);
        if (answer.plot !== undefined) expect(plotFaults(answer.plot)).toEqual([]);
        if (answer.drawing !== undefined) expect(circuitFaults(answer.drawing)).toEqual([]);
      }),
      { numRuns: 150 },
    );
  });

  it('draws its example without a fault', () => {
    const answer = runSheet(sheet, sheet.example);
    if (!answer.ok) throw new Error(answer.say);
    expect(answer.plot === undefined ? [] : plotFaults(answer.plot)).toEqual([]);
    expect(answer.drawing === undefined ? [] : circuitFaults(answer.drawing)).toEqual([]);
  });
});
