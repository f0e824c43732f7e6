/** Where the parts of a circuit stand: nodes as level rules, the supply's at the left and the load's at the right. Pure. */
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Circuit, CircuitBranch, CircuitNode } from '@/shared/workings/plot';

export interface PlacedNode {
  node: CircuitNode;
  /** ends of its rule, and its height */
  x1: number;
  x2: number;
  y: number;
}

export interface PlacedBranch {
  branch: CircuitBranch;
  /** number of its call-out, from 1, in the order given */
  number: number;
  /** from `from` to `to`; level between supply and load, upright inside one of them */
  x1: number;
  y1: number;
  x2: number;
  y2: number;
  /** where its symbol stands, as a share of the way, clear of rules that it crosses */
  share: number;
  /** on which side of an upright its number stands */
  numberAt: 'left' | 'right';
  /** level branches reach a node of another height by these uprights */
  drops: { x: number; y1: number; y2: number }[];
}

export interface CircuitModel {
  width: number;
  height: number;
  nodes: PlacedNode[];
  branches: PlacedBranch[];
}

/** Distances in CSS pixels: between uprights, of the stretch between supply and load, between levels. */
const COLUMN = 50;
const MIDDLE = 86;
const LEVEL = 64;
const TOP = 34;
/** Widths of a letter of the text face and of a figure, at the smallest size. */
const LETTER = 8.6;
const FIGURE = 9.8;

/** What stands at a node's rule, below its name; nothing in a drawing that is not about volts. */
export function voltsOf({ volts }: CircuitNode): string {
  if (volts === undefined) return '';
  return volts === null ? 'not known' : formatQuantity(volts, 'V', { digits: 3 });
}

interface Sorted {
  supply: CircuitBranch[];
  load: CircuitBranch[];
  across: CircuitBranch[];
}

function sorted({ nodes, branches }: Circuit): Sorted {
  const side = new Map(nodes.map((node) => [node.id, node.side]));
  const inside = (of: 'supply' | 'load') => branches.filter((b) => side.get(b.from) === of && side.get(b.to) === of);
  return { supply: inside('supply'), load: inside('load'), across: branches.filter((b) => side.get(b.from) !== side.get(b.to)) };
}

/** Heights: each level takes a node of the supply, a node of the load, or both where one wire joins them; further wires between two nodes get levels of their own. */
function levels({ nodes }: Circuit, across: readonly CircuitBranch[]) {
  const y = new Map<string, number>();
  const lanes = new Map<string, number>();
  let next = TOP;
  const place = (id: string) => {
    if (!y.has(id)) {
      y.set(id, next);
      next += LEVEL;
    }
  };
  const ends = (b: CircuitBranch, supply: string) => (b.from === supply ? b.to : b.from);
  for (const node of nodes.filter((n) => n.side === 'supply')) {
    place(node.id);
    const own = across.filter((b) => b.from === node.id || b.to === node.id);
    let first = true;
    for (const branch of own) {
      const other = ends(branch, node.id);
      if (first && !y.has(other)) {
        y.set(other, y.get(node.id) ?? next);
        lanes.set(branch.id, y.get(node.id) ?? next);
      } else if (!y.has(other)) {
        y.set(other, next);
        lanes.set(branch.id, next);
        next += LEVEL;
      } else {
        lanes.set(branch.id, next);
        next += LEVEL;
      }
      first = false;
    }
    next += LEVEL / 3;
  }
  for (const node of nodes) place(node.id);
  return { y, lanes, bottom: Math.max(TOP, ...lanes.values()) };
}

/** Puts uprights into as few columns as they fit in without touching: columns of their heights. */
function columnsOf(branches: readonly CircuitBranch[], y: ReadonlyMap<string, number>): { column: Map<string, number>; count: number } {
  const column = new Map<string, number>();
  const taken: [number, number][][] = [];
  for (const branch of branches) {
    const [a, b] = [y.get(branch.from) ?? 0, y.get(branch.to) ?? 0];
    const span: [number, number] = [Math.min(a, b), Math.max(a, b)];
    let at = taken.findIndex((spans) => spans.every(([from, to]) => to <= span[0] || from >= span[1]));
    if (at === -1) at = taken.push([]) - 1;
    taken[at]?.push(span);
    column.set(branch.id, at);
  }
  return { column, count: taken.length };
}

/** The middle of the widest gap between the rules that an upright crosses, as a share of its way. */
function clearShare(y1: number, y2: number, rules: readonly number[]): number {
  const [top, bottom] = [Math.min(y1, y2), Math.max(y1, y2)];
  const stops = [...new Set([top, ...rules.filter((y) => y > top && y < bottom), bottom])].sort((a, b) => a - b);
  let best = [top, bottom] as readonly [number, number];
  stops.slice(1).forEach((to, i) => {
    const from = stops[i] ?? top;
    if (i === 0 || to - from > best[1] - best[0]) best = [from, to];
  });
  return bottom === top ? 0.5 : ((best[0] + best[1]) / 2 - y1) / (y2 - y1);
}

/**
 * Lays a circuit out.
 * @param least width to be filled, in CSS pixels; a large circuit is wider and scrolls
 */
export function circuitModel(circuit: Circuit, least: number): CircuitModel {
  const { supply, load, across } = sorted(circuit);
  const { y, lanes, bottom } = levels(circuit, across);
  const left = columnsOf(supply, y);
  const right = columnsOf(load, y);
  const gutter = (side: 'supply' | 'load') =>
    Math.max(
      ...circuit.nodes.map((node) => (node.side === side ? Math.max(node.label.length * LETTER, voltsOf(node).length * FIGURE) + 16 : 0)),
    );
  const [leftGutter, rightGutter] = [gutter('supply'), gutter('load')];
  const want = (count: number) => Math.max(1, count) * COLUMN;
  const spare = Math.max(0, least - leftGutter - rightGutter - want(left.count) - want(right.count) - MIDDLE);
  const [leftWidth, rightWidth] = [leftGutter + want(left.count) + spare / 4, rightGutter + want(right.count) + spare / 4];
  const width = Math.max(least, leftWidth + MIDDLE + rightWidth);
  const [supplyEnd, loadStart] = [leftWidth, width - rightWidth];
  // where wires of several heights meet one rule, each node has an upright of its own, so that two nodes never share one
  const supplyNodes = circuit.nodes.filter((n) => n.side === 'supply').map((n) => n.id);
  const loadNodes = circuit.nodes.filter((n) => n.side === 'load').map((n) => n.id);
  const stagger = (list: readonly string[], id: string) => (list.length < 2 ? 0 : (list.indexOf(id) / (list.length - 1)) * 14);
  const upright = (id: string) =>
    supplyNodes.includes(id) ? supplyEnd + stagger(supplyNodes, id) - 7 : loadStart - stagger(loadNodes, id) + 7;
  const heightOf = (id: string) => y.get(id) ?? 0;
  const numberOf = new Map(circuit.branches.map((branch, i) => [branch.id, i + 1]));

  const nodes = circuit.nodes.map((node): PlacedNode => ({
    node,
    y: heightOf(node.id),
    x1: node.side === 'supply' ? leftGutter : upright(node.id),
    x2: node.side === 'supply' ? upright(node.id) : width - rightGutter,
  }));
  const rules = (side: 'supply' | 'load') => circuit.nodes.filter((n) => n.side === side).map((n) => heightOf(n.id));
  const upRights = (
    side: 'supply' | 'load',
    list: readonly CircuitBranch[],
    columns: Map<string, number>,
    x0: number,
    step: number,
  ): PlacedBranch[] =>
    list.map((branch) => {
      const x = x0 + (columns.get(branch.id) ?? 0) * step;
      const [y1, y2] = [heightOf(branch.from), heightOf(branch.to)];
      const share = clearShare(y1, y2, rules(side));
      return {
        branch,
        number: numberOf.get(branch.id) ?? 0,
        x1: x,
        x2: x,
        y1,
        y2,
        share,
        numberAt: side === 'supply' ? 'right' : 'left',
        drops: [],
      };
    });
  const level = across.map((branch): PlacedBranch => {
    const lane = lanes.get(branch.id) ?? heightOf(branch.from);
    const ends = [branch.from, branch.to].map((id) => ({ x: upright(id), y1: heightOf(id), y2: lane }));
    const [from, to] = ends;
    return {
      branch,
      number: numberOf.get(branch.id) ?? 0,
      x1: from?.x ?? 0,
      x2: to?.x ?? 0,
      y1: lane,
      y2: lane,
      share: 0.5,
      numberAt: 'right',
      drops: ends.filter(({ y1, y2 }) => y1 !== y2),
    };
  });
  return {
    width,
    height: Math.max(bottom, ...circuit.nodes.map((n) => heightOf(n.id))) + 38,
    nodes,
    branches: [
      ...upRights('supply', supply, left.column, leftGutter + 20, COLUMN),
      ...level,
      ...upRights('load', load, right.column, width - rightGutter - 20, -COLUMN),
    ],
  };
}
