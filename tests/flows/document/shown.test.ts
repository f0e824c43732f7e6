/** What an answer of a look shows of a part. */
import { describe, expect, it } from 'vitest';

import { stepChanges } from '@/flows/compare/stepChanges';
import { parseTree } from '@/flows/document/parseTree';
import { posterior } from '@/flows/evidence/posterior';
import { findingsOf } from '@/flows/evidence/findings';
import { Bench, program } from '../support/bench';
import { dead, end, hands, look, observe, treeJson, treeOf } from '../support/steps';

type Answer = Record<string, unknown>;
const original = (answer: Answer) =>
  observe('make', 'done', {
    exits: [
      { id: 'all', label: 'All of one make', on: ['answer'], to: 'done' },
      { id: 'other', label: 'The diode is of another make', on: ['answer'], to: 'done', ...answer },
      { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' },
    ],
  });
const POINTS = [{ suspect: 'diode', says: 'points-to' }];
const faultsOf = (steps: Answer[]) => {
  const parsed = parseTree(treeJson(steps));
  return parsed.ok ? [] : parsed.faults.map((f) => `${f.step} ${f.key}: ${f.message}`);
};

describe('a part that is not original', () => {
  const tree = treeOf([original({ shows: 'not-original', evidence: POINTS })]);

  it('raises the odds of its suspect, and the screen says what counts as not original', () => {
    const bench = new Bench(program(tree)).pass();
    expect(bench.view.notes).toEqual([expect.objectContaining({ name: 'Not original', say: expect.stringMatching(/another maker or batch.*cut or soldered again/) as string })]);
    expect(bench.view.answers.map((a) => [a.answer, a.shows])).toContainEqual(['other', 'not-original']);
    const before = posterior(tree.suspects, []);
    bench.do({ type: 'ANSWER', step: 'make', answer: 'other' });
    const after = posterior(tree.suspects, findingsOf(bench.program.layout, bench.state.context.outcome));
    const share = (of: typeof before) => of.find((r) => r.suspect.id === 'diode')?.share ?? 0;
    // even odds, told once with a likelihood ratio of ten: 10 to 1
    expect([share(before), share(after)]).toEqual([0.5, expect.closeTo(10 / 11, 9)]);
  });

  it.each<[string, Answer[], RegExp]>([
    ['raises nobody', [original({ shows: 'not-original' })], /make exits.1.shows: it shows something of a part and raises no suspect/],
    ['is taken for proof', [original({ shows: 'not-original', evidence: [{ suspect: 'diode', says: 'all-but-proves' }] })], /a reason to suspect it and no proof/],
    ['is no word of ours', [original({ shows: 'replaced', evidence: POINTS })], /make exits.1.shows/],
    ['stands on work of the hands', [look('d1'), dead('d1', 'touch'), { ...hands('touch', 'done'), exits: [{ id: 'good', on: ['done'], to: 'done', shows: 'not-original', evidence: POINTS }, { id: 'other', on: ['not-sure', 'cannot'], to: 'refer' }] }], /only an answer of an observation/],
  ])('is refused in the document where it %s', (_, steps, say) => {
    expect(faultsOf(steps).join('\n')).toMatch(say);
  });

  it('is told when a new version says it', () => {
    const [older, newer] = [treeOf([original({ evidence: POINTS })]), tree].map((t) => t.steps[0]!);
    expect(stepChanges(older!, newer!).map((c) => c.say)).toEqual(['“make”: “The diode is of another make” now shows not original, before: nothing of a part.']);
  });
});

describe('an answer that shows nothing', () => {
  it('needs no suspect', () => {
    expect(faultsOf([original({})])).toEqual([]);
    expect(faultsOf([original({}), end('spare', 'cleared')])).toEqual([]);
  });
});
