import { describe, expect, it } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import { compile } from '@/flows/machine/compile';
import { dischargeSeconds, dischargeTool, tooSmallFor } from '@/flows/machine/dischargeTool';
import { view } from '@/flows/machine/view';

import { Bench, benchProfile, makeDeadTree, program } from '../support/bench';
import { dead, look, step, treeOf } from '../support/steps';

const bulk = { ...benchProfile, stores: [{ ...benchProfile.stores[0]!, id: 'bulk', name: 'bulk', farads: 220e-6, voltsWorked: 325, voltsRated: 400 }] };
const bleed = { kind: 'discharge' } as Parameters<typeof dischargeTool>[0];

describe('the discharge tool of a step', () => {
  it('is chosen by the workings for parts that the usual one cannot take', () => {
    expect(dischargeTool(bleed, benchProfile, defaultSettings)).toEqual({ ohms: 100, watts: 50 });
    const chosen = dischargeTool(bleed, bulk, defaultSettings);
    expect(325 ** 2 / chosen.ohms).toBeLessThanOrEqual(10 * chosen.watts);
    expect(tooSmallFor(chosen, bulk, defaultSettings)).toEqual([]);
  });
  it('is refused when an author names one that burns out (H3)', () => {
    const own = treeOf([look('d1'), dead('d1', 'done'), step('discharge', 'bleed', 'done', { contact: 'probe', toolOhms: 10, toolWatts: 5 })]);
    const compiled = compile({ tree: own, callees: [makeDeadTree], profile: bulk, settings: defaultSettings });
    expect(compiled).toMatchObject({ ok: false });
    expect(compiled.ok ? [] : compiled.faults.map((f) => `${f.step}: ${f.message}`)).toEqual(expect.arrayContaining([expect.stringMatching(/^bleed: H3: .*too small for bulk/)]));
  });
  it('gives the wait to the dead limit at half as much again as marked: 68 mF, 20 V, 100 Ω → 14.1 s', () => {
    // R·C·ln(V/V₀) = 100 × 0.102 × ln(20/5) = 14.14 s
    expect(dischargeSeconds(benchProfile.stores[0]!, { ohms: 100, watts: 50 }, defaultSettings)).toBe(15);
  });
  it('is named on the row that waits for it', () => {
    const b = new Bench(program(treeOf([look('d1'), dead('d1', 'done')])));
    b.pass().answer('good').pass();
    expect(view(b.program, b.state).rows[0]?.row.label).toMatch(/C1 reservoir: through 100 Ω, 10 W/);
  });
});
