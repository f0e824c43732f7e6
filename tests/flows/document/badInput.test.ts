/** Documents that are wrong, hostile or huge: refused with step and key, and quickly. */
import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';

import { lampTreeJson } from '../support/bench';
import { end, observe, step, treeJson } from '../support/steps';

type Json = Record<string, unknown>;
const faults = (json: unknown) => {
  const parsed = parseTree(json);
  return parsed.ok ? [] : parsed.faults.map((f) => `${f.step ?? 'head'}|${f.key}|${f.message}`);
};
/** Milliseconds of this process alone: other work on the machine does not count. */
const timed = (work: () => void): number => {
  const before = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
};
const copy = () => structuredClone(lampTreeJson) as unknown as Json & { steps: (Json & { exits: Json[] })[]; suspects: Json[]; reentries: Json[] };

describe('a tree document that is wrong', () => {
  it.each([
    ['a step called 10', (t) => (t.steps[1]!['id'] = '10'), /^10\|id\|an id is made of/m],
    ['a step called a.b', (t) => (t.steps[1]!['id'] = 'a.b'), /^a\.b\|id\|an id is made of/m],
    ['a step called __proto__', (t) => (t.steps[1]!['id'] = '__proto__'), /^__proto__\|id\|/m],
    ['a step called constructor', (t) => (t.steps[1]!['id'] = 'constructor'), /^constructor\|id\|this name is reserved/m],
    ['a step called like one below a call', (t) => (t.steps[1]!['id'] = 'a/b'), /^a\/b\|id\|/m],
    ['a step of the machine’s own', (t) => (t.steps[1]!['id'] = '~isolate'), /^~isolate\|id\|/m],
    ['an id of 41 letters', (t) => (t.steps[1]!['id'] = 'a'.repeat(41)), /\|id\|.*at most 40 long/m],
    ['a step that is no object', (t) => ((t.steps as unknown[])[1] = 7), /^step 2\|\|/m],
    ['a step of no kind', (t) => (t.steps[1]!['kind'] = 'guess'), /^dead1\|kind\|/m],
    ['an exit to nowhere', (t) => (t.steps[0]!.exits[0]!['to'] = 'nowhere'), /^look\|exits\.0\.to\|leads to "nowhere", which is no step$/m],
    ['an exit to a method of every object', (t) => (t.steps[0]!.exits[0]!['to'] = 'valueof'), /^look\|exits\.0\.to\|leads to "valueof"/m],
    ['a counted exit that runs out to nowhere', (t) => Object.assign(t.steps[0]!.exits[0]!, { atMost: 2, then: 'nowhere' }), /^look\|exits\.0\.then\|leads to "nowhere"/m],
    ['a prior of 0', (t) => (t.suspects[0]!['prior'] = 0), /^head\|suspects\.0\.prior\|.*>0/m],
    ['a negative prior', (t) => (t.suspects[0]!['prior'] = -0.5), /^head\|suspects\.0\.prior\|.*>0/m],
    ['a prior that is no number', (t) => (t.suspects[0]!['prior'] = Number.NaN), /^head\|suspects\.0\.prior\|/m],
    ['an endless prior', (t) => (t.suspects[0]!['prior'] = Number.POSITIVE_INFINITY), /^head\|suspects\.0\.prior\|/m],
    ['a prior in words', (t) => (t.suspects[0]!['prior'] = '1'), /^head\|suspects\.0\.prior\|.*expected number/m],
    ['a re-entry that is nowhere', (t) => (t.reentries[0]!['step'] = 'nowhere'), /^head\|reentries\.0\.step\|no step "nowhere"/m],
    ['endless minutes', (t) => (t.steps[1]!['minutes'] = Number.POSITIVE_INFINITY), /^dead1\|minutes\|/m],
  ] satisfies [string, (t: ReturnType<typeof copy>) => unknown, RegExp][])('%s is refused with step and key', (_, change, message) => {
    const tree = copy();
    change(tree);
    expect(faults(tree).join('\n')).toMatch(message);
  });

  it.each(['__proto__', 'constructor', 'prototype'])('a key %s is refused where it stands, and pollutes nothing', (key) => {
    const text = JSON.stringify(lampTreeJson).replace('"id":"earth"', `"${key}":{"polluted":true},"id":"earth"`);
    expect(faults(JSON.parse(text) as unknown).join('\n')).toMatch(new RegExp(`^earth\\|.*${key}`, 'm'));
    expect(({} as Json)['polluted']).toBeUndefined();
  });

  it('two steps of one name, a hundred times, are each told once', () => {
    const twice = treeJson([observe('see', 'done'), ...Array.from({ length: 100 }, () => observe('see', 'done'))]);
    expect(faults(twice).filter((f) => f === 'see|id|"see" is there twice')).toHaveLength(100);
  });
});

describe('a tree document that is huge', () => {
  it('of a megabyte, nested ten thousand deep, is refused in a moment', () => {
    const text = `${'{"steps":['.repeat(50_000)}1${']}'.repeat(50_000)}`;
    const padded = `{"format":1,"id":"deep","steps":${'[{"exits":'.repeat(5000)}${JSON.stringify('x'.repeat(1_000_000))}${'}]'.repeat(5000)}}`;
    expect(padded.length).toBeGreaterThan(1_000_000);
    // beyond what the runtime itself can read there is no document at all
    let deepest: unknown = null;
    try {
      deepest = JSON.parse(text);
    } catch (error) {
      expect(error).toBeInstanceOf(RangeError);
    }
    expect(timed(() => expect(parseTree(deepest).ok).toBe(false))).toBeLessThan(2000);
    expect(timed(() => expect(parseTree(JSON.parse(padded)).ok).toBe(false))).toBeLessThan(2000);
  });
  it('of twelve thousand steps is read in bounded time, and of one more is refused', () => {
    const steps = (n: number) => [...Array.from({ length: n - 1 }, (_, i) => observe(`s${i}`, i === n - 2 ? 'done' : `s${i + 1}`, {}, 'done')), end('done', 'cleared')];
    const json = (n: number) => ({ ...treeJson([]), steps: steps(n) });
    expect(timed(() => expect(faults(json(12_000))).toEqual([]))).toBeLessThan(6000);
    expect(faults(json(12_001)).join('\n')).toMatch(/^head\|steps\|/m);
  });
  it('of twelve thousand wrong steps tells them all in bounded time', () => {
    const wrong = { ...treeJson([]), steps: Array.from({ length: 12_000 }, (_, i) => step('do', `s${i}`, 'nowhere', {}, 'nowhere')) };
    const from = timed(() => expect(faults(wrong).length).toBeGreaterThan(12_000));
    expect(from).toBeLessThan(6000);
  });
});
