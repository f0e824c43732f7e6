/** Short ways to write steps for trees of tests: each covers all outcomes, and what is not said leads to the end `refer`. */
import { parseTree } from '@/flows/document/parseTree';
import { OUTCOMES_OF, PASSING } from '@/flows/document/outcomes';
import type { Kind } from '@/flows/document/outcomes';
import type { Tree } from '@/flows/document/tree';
import { must } from './bench';

type Extra = Record<string, unknown>;

/** A step of a kind whose passing outcome leads to `to` and whose other outcomes all lead to `other`. */
export function step(kind: Kind, id: string, to: string, extra: Extra = {}, other = 'refer'): Extra {
  const pass = PASSING[kind];
  const rest = OUTCOMES_OF[kind].filter((o) => o !== pass);
  return { id, kind, title: id, lines: ['Do it.'], contact: 'none', tools: [], minutes: 1, hazards: [], exits: [{ id: 'good', on: [pass], to }, { id: 'other', on: rest, to: other }], ...extra };
}

export const observe = (id: string, to: string, extra: Extra = {}, other = 'refer') => step('observe', id, to, { asks: 'How is it?', exits: [{ id: 'good', label: 'Good', on: ['answer'], to }, { id: 'bad', label: 'Bad', on: ['answer'], to: other, verdict: 'fail' }, { id: 'unsure', on: ['not-sure', 'cannot'], to: other }], ...extra });
export const look = (to: string) => observe('look', to, { lookOver: true });
export const dead = (id: string, to: string) => ({ ...step('call', id, to), tree: 'make-dead', version: 1, exits: [{ id: 'dead', on: ['dead'], to }] });
export const earth = (to: string, other = 'refer') => step('prove-earth', 'earth', to, { contact: 'hands' }, other);
export const insulation = (to: string, other = 'refer') => step('prove-insulation', 'insulation', to, { contact: 'hands' }, other);
export const returns = (to: string, other = 'refer') => step('prove-returns', 'returns', to, { contact: 'hands' }, other);
export const connect = (id: string, load: string, to: string) => step('connect-load', id, to, { contact: 'hands', load });
export const work = (id: string, area: string, to: string, extra: Extra = {}) => step('work', id, to, { contact: 'hands', area, ...extra });
export const hands = (id: string, to: string, extra: Extra = {}) => step('do', id, to, { contact: 'hands', ...extra });
export const fit = (id: string, thing: Extra, to: string) => step('do', id, to, { contact: 'hands', fits: [thing] });
export const remove = (id: string, thing: string, to: string) => step('do', id, to, { contact: 'hands', removes: [thing] });
const power = { mostVolts: 230, mostAmps: 0.5, longestMinutes: 10, load: 'none', abort: 'abort' };
export const lamp = (id: string, to: string, extra: Extra = {}) => step('energise', id, to, { ...power, source: 'mains', through: 'lamp', node: 'inlet', lampWatts: 60, ...extra }, 'abort');
export const mains = (id: string, to: string, extra: Extra = {}) => step('energise', id, to, { ...power, mostAmps: 2, source: 'mains', through: 'mains', node: 'inlet', ...extra }, 'abort');
export const bench = (id: string, to: string, extra: Extra = {}) => step('energise', id, to, { ...power, source: 'bench', through: 'bench', node: 'raw', mostVolts: 12, ...extra }, 'abort');
export const rails = (id: string, level: string, to: string, extra: Extra = {}) => step('prove-rails', id, to, { contact: 'probe', level, probe: 'hand', ...extra });
export const end = (id: string, says: string, extra: Extra = {}) => ({ id, kind: 'end', title: id, lines: ['It ends.'], contact: 'none', tools: [], minutes: 0, hazards: [], exits: [], says, ...extra });

const CLIP = { id: 'rail-clips', name: 'meter clips', class: 'clip', area: 'clip', point: 'each-rail' };
export const clip = (to: string) => fit('clip', CLIP, to);

/** A tree of these steps with the ends `refer` and `done` and the abort target `abort`. */
export function treeOf(steps: Extra[], head: Extra = {}): Tree {
  return must(parseTree(treeJson(steps, head)));
}

/** The same, as JSON that has not been parsed. */
export function treeJson(steps: Extra[], head: Extra = {}): Extra {
  const text = JSON.stringify(steps);
  const used = (id: string) => new RegExp(`"(to|then|abort)":"${id}"`).test(text);
  // only what the steps lead to: a step that nothing leads to is a fault of its own
  const tail = [...(used('abort') ? [dead('abort', 'refer')] : []), ...(used('done') ? [end('done', 'cleared')] : []), ...(used('refer') || used('abort') ? [end('refer', 'referred')] : [])];
  return {
    format: 1,
    id: 'test-tree',
    title: 'Test tree',
    symptom: 'For tests',
    appliesTo: { protectiveClasses: ['I', 'II'], supplyKinds: ['linear', 'switched-from-raw', 'switch-mode'], fewestRails: 1, mostRails: 16 },
    needsAtStart: [],
    opening: { tools: [], instruments: [], parts: [], conditions: [] },
    suspects: [
      { id: 'diode', part: 'Diode', mode: 'open', prior: 1, killedBy: [] },
      { id: 'pass', part: 'Pass transistor', mode: 'short', prior: 1, killedBy: ['diode'] },
    ],
    reentries: [],
    ...head,
    steps: [...steps, ...tail],
  };
}
