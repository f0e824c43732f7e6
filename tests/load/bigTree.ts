/** A seeded tree of many steps that holds: calls, live segments, counted loops back, up to four exits a step. */
import { parseTree } from '@/flows/document/parseTree';
import type { Tree } from '@/flows/document/tree';

type Step = Record<string, unknown>;

/** A small generator of numbers in [0, 1): the same seed, the same tree (mulberry32). */
export function randomOf(seed: number): () => number {
  let a = seed >>> 0;
  return () => {
    a = (a + 0x6d2b79f5) >>> 0;
    let t = a;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
  };
}

const base = { tools: [], minutes: 0.01, hazards: [], lines: ['Do it.'] };

/** `size` steps, `calls` calls of make-dead, `segments` live segments through the lamp, one step in twenty with a counted way back. */
export function bigTree(size: number, seed: number, calls = 20, segments = 30): Tree {
  const random = randomOf(seed);
  const steps: Step[] = [];
  const id = (i: number) => `s${i}`;
  const next = () => id(steps.length + 1);
  const add = (step: Step) => steps.push({ ...base, ...step, id: id(steps.length), title: `Step ${steps.length + 1}` });
  const call = () => add({ kind: 'call', contact: 'none', tree: 'make-dead', version: 1, exits: [{ id: 'dead', on: ['dead'], to: next() }] });
  const proof = (kind: string, others: string[]) => add({ kind, contact: 'hands', exits: [{ id: 'good', on: ['in'], to: next() }, { id: 'bad', on: others, to: 'refer' }] });
  const dead = () => {
    add({ kind: 'isolate', contact: 'none', exits: [{ id: 'out', on: ['out'], to: next() }, { id: 'not', on: ['not-out', 'not-sure'], to: 'stop' }] });
    add({ kind: 'discharge', contact: 'probe', exits: [{ id: 'low', on: ['in'], to: next() }, { id: 'high', on: ['high', 'not-sure', 'cannot'], to: 'stop' }] });
    add({ kind: 'prove-dead', contact: 'probe', exits: [{ id: 'dead', on: ['in'], to: next() }, { id: 'not', on: ['falling', 'high', 'not-sure', 'cannot'], to: 'stop' }] });
  };
  const look = (back: boolean, live: boolean, lookOver = false) => {
    const at = steps.length;
    const to = back && at > 40 && !live ? id(at - 1) : null;
    add({
      kind: 'observe', contact: 'none', asks: 'How is it?', lookOver, ...(live ? { power: 'live' } : {}),
      exits: [
        { id: 'good', label: 'Good', on: ['answer'], to: next() },
        ...(random() < 0.6 ? [{ id: 'fair', label: 'Fair', on: ['answer'], to: next(), evidence: [{ suspect: 'a', says: 'points-to' }] }] : []),
        ...(to === null ? [] : [{ id: 'again', label: 'Again', on: ['answer'], to, atMost: 2, then: 'refer' }]),
        { id: 'unsure', on: ['not-sure', 'cannot'], to: live ? 'abort' : 'refer' },
      ],
    });
  };
  look(false, false, true);
  call();
  proof('prove-returns', ['close', 'high', 'not-sure', 'cannot']);
  proof('prove-earth', ['close', 'high', 'not-sure', 'cannot']);
  proof('prove-insulation', ['close', 'low', 'not-sure', 'cannot']);
  call();
  const body = size - 8;
  const callAt = Math.max(1, Math.floor(body / calls));
  const liveAt = Math.max(1, Math.floor(body / segments));
  let callsLeft = calls - 2;
  let liveLeft = segments;
  while (steps.length < body) {
    const at = steps.length;
    if (liveLeft > 0 && at % liveAt === 0) {
      liveLeft -= 1;
      add({ kind: 'energise', contact: 'none', source: 'mains', through: 'lamp', node: 'inlet', load: 'none', mostVolts: 230, mostAmps: 0.5, longestMinutes: 60, lampWatts: 60, abort: 'abort', exits: [{ id: 'on', on: ['on'], to: next() }, { id: 'not', on: ['cannot'], to: 'abort' }] });
      for (let i = 0; i < 4; i += 1) look(false, true);
      dead();
    } else if (callsLeft > 0 && at % callAt === 0) {
      callsLeft -= 1;
      call();
    } else look(random() < 0.05, false);
  }
  add({ kind: 'end', contact: 'none', says: 'cleared', exits: [] });
  const last = steps.length - 1;
  const tail: Step[] = [
    { ...base, id: 'abort', title: 'Abort', kind: 'call', contact: 'none', tree: 'make-dead', version: 1, exits: [{ id: 'dead', on: ['dead'], to: 'refer' }] },
    { ...base, id: 'refer', title: 'Refer', kind: 'end', contact: 'none', says: 'referred', exits: [] },
    { ...base, id: 'stop', title: 'Stop', kind: 'end', contact: 'none', says: 'stopped', exits: [] },
  ];
  const parsed = parseTree({
    format: 1, id: 'big', title: `Big tree of ${last + 1}`, symptom: 'For the benchmark',
    appliesTo: { protectiveClasses: ['I', 'II'], supplyKinds: ['linear'], fewestRails: 1, mostRails: 6 }, needsAtStart: [],
    opening: { tools: [], instruments: [], parts: [], conditions: [] },
    suspects: [{ id: 'a', part: 'A', mode: 'open', prior: 1, killedBy: [] }], reentries: [], steps: [...steps, ...tail],
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults.slice(0, 5)));
  return parsed.value;
}
