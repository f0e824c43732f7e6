import { describe, expect, it } from 'vitest';

import { circuitModel } from '@/shared/ui/components/circuitModel';
import type { Circuit } from '@/shared/workings/plot';

import { lostReturnCircuit } from './lostReturnCircuit';

const at = (model: ReturnType<typeof circuitModel>, id: string) => {
  const found = model.branches.find((b) => b.branch.id === id);
  if (found === undefined) throw new Error(id);
  return found;
};

describe('circuitModel', () => {
  const model = circuitModel(lostReturnCircuit, 358);

  it('draws every node and every branch once, inside the drawing', () => {
    expect(model.nodes.map((n) => n.node.id).sort()).toEqual(lostReturnCircuit.nodes.map((n) => n.id).sort());
    expect(model.branches.map((b) => b.branch.id).sort()).toEqual(lostReturnCircuit.branches.map((b) => b.id).sort());
    for (const { x1, x2, y1, y2 } of model.branches) {
      for (const x of [x1, x2]) expect(x > 0 && x < model.width).toBe(true);
      for (const y of [y1, y2]) expect(y > 0 && y < model.height).toBe(true);
    }
  });

  it('keeps the supply at the left of the load, and the rails from top to bottom in the order given', () => {
    const y = (id: string) => model.nodes.find((n) => n.node.id === id)?.y ?? 0;
    expect(y('p5')).toBeLessThan(y('zero'));
    expect(y('zero')).toBeLessThan(y('n12'));
    expect(y('p5l')).toBe(y('p5'));
    const supply = model.nodes.filter((n) => n.node.side === 'supply').map((n) => n.x2);
    const load = model.nodes.filter((n) => n.node.side === 'load').map((n) => n.x1);
    expect(Math.max(...supply)).toBeLessThan(Math.min(...load));
  });

  it('gives two wires between the same nodes a height each', () => {
    expect(at(model, 'r1').y1).not.toBe(at(model, 'r2').y1);
    expect(at(model, 'r2').drops).toHaveLength(2);
  });

  it('lets uprights share a column only where they do not touch', () => {
    expect(at(model, 's5').x1).toBe(at(model, 's12').x1);
    expect(at(model, 'd5').x1).not.toBe(at(model, 's5').x1);
  });

  it('keeps the symbol of an upright clear of the rules that it crosses', () => {
    const long: Circuit = { ...lostReturnCircuit, branches: [{ id: 'x', kind: 'source', label: 'x', from: 'p5', to: 'n12', amps: 1 }] };
    const drawn = circuitModel(long, 358);
    const [x] = drawn.branches;
    const symbol = (x?.y1 ?? 0) + ((x?.y2 ?? 0) - (x?.y1 ?? 0)) * (x?.share ?? 0);
    for (const node of drawn.nodes) expect(Math.abs(node.y - symbol)).toBeGreaterThan(20);
  });

  it('puts no two branches on one another, however many there are', () => {
    const nodes = ['a', 'b', 'c'].flatMap((id) => [
      { id, label: id, volts: 1, side: 'supply' as const },
      { id: `${id}l`, label: id, volts: 1, side: 'load' as const },
    ]);
    const ids = nodes.map((n) => n.id);
    const branches = ids.flatMap((from, i) =>
      ids.slice(i + 1).map((to) => ({ id: `${from}-${to}`, kind: 'conductor' as const, label: 'w', from, to, amps: 1 })),
    );
    const big: Circuit = { title: 'all to all', nodes, branches, words: 'all' };
    const drawn = circuitModel(big, 300).branches;
    const middles = drawn.map((b) => `${Math.round(b.x1 + (b.x2 - b.x1) * b.share)},${Math.round(b.y1 + (b.y2 - b.y1) * b.share)}`);
    expect(new Set(middles).size).toBe(branches.length);
  });
});
