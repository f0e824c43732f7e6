/** Library trees broken on purpose: each unsafe mutant is refused; the ones that are let through are safe, one by one, for the reason given. */
import { readdirSync, readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { misfits } from '@/flows/document/admits';
import { parseProfile, parseTree } from '@/flows/document/parseTree';
import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { layOut } from '@/flows/machine/program';
import { graphOf } from '@/flows/proof/graph';
import { oddProfiles } from '@/flows/proof/oddProfiles';
import { prove } from '@/flows/proof/prove';

import { must } from '../support/bench';
import { mutantsOf } from '../support/mutants';

const read = (folder: string) => readdirSync(folder).filter((f) => f.endsWith('.json')).sort().map((f) => JSON.parse(readFileSync(`${folder}/${f}`, 'utf8')) as unknown);
const trees = read('flows/library').map((json) => must(parseTree(json)));
const profiles = read('db/seeds/demo/profiles').map((json) => must(parseProfile(json))).concat(oddProfiles);
const profileFor = (tree: Tree) => profiles.find((p) => misfits(tree, p).length === 0) ?? profiles[0]!;
/** `npm test` takes every fourth mutant of the largest tree and all of the others; `npm run bench:mutants` takes all. */
const SHARE = 4;

/** Mutants that hold, and why each is no danger; a name with its tree before it speaks of that tree alone. */
const SAFE: Record<string, string> = {
  'drop a make-dead: dead-leak': 'the way goes straight to an end, and close-out makes dead by itself',
  'drop prove-returns: returns-after': 'no power follows: the way ends at a found fault, which claims nothing',
  'forget to fit: reservoir-off': 'the lead is lifted for a truer reading, not for safety; the reading is made dead and no power follows',
  'forget to fit: secondaries': 'with the windings still on the lamp limits as it did before; the test says less, and nothing that hands touch is live',
  'forget to fit: primary-lift': 'the lead is lifted to part two readings, both made dead',
  'bench limit away: full-low': 'the rails have passed on the limited bench supply, which is what opens full power into the raw node; the low start is a kindness to the new parts',
  'drop prove-returns: returns-why': 'the returns are proved once more before any power, and until then the killer of the diode stays owed',
  'drop prove-rails: rails-creep': 'the trip is known to be right by then, the supply is limited and the boards are out; the end claims no rail',
  'drop prove-rails: rails-raw': 'what follows feeds the output alone and needs no regulator; the end claims no rail',
  'an exit led past its check: loads-away>unsure': 'boards count as in until a load step says what is on the rails; the light load does, and nothing is powered before it',
  'drop prove-rails: rails-held': 'what follows is a reading of heat at the same limited power; the end claims no rail',
  'forget to fit: part-filter': 'the filter is lifted to part two readings; no power follows in this tree',
  'forget to fit: part-primary': 'the primary is lifted to part two readings; no power follows in this tree',
  'drop a make-dead: dead-filter': 'the way goes straight to an end, and close-out makes dead by itself',
  'drop a make-dead: dead-winding': 'the way goes straight to an end, and close-out makes dead by itself',
  'drop a make-dead: dead-inlet': 'the way goes straight to an end, and close-out makes dead by itself',
  'drop a make-dead: dead-unclear': 'the way goes straight to an end, and close-out makes dead by itself',
  'drop prove-rails: rails-unheated': 'what follows is a reading of heat at the same limited power; the end claims no rail',
  'discharge: drop a make-dead: dead-rebound': 'the way goes straight to an end, and close-out makes dead by itself',
  'discharge: drop a make-dead: dead-fed': 'the way goes straight to an end, and close-out makes dead by itself',
  'reform-lifted: an exit led past its check: boards-out>unsure': 'the can is fed alone, its lead lifted: no volts reach a board, in or out; the end claims no rail',
  'lamp-first: drop prove-rails: rails-lamp': 'what follows is a look at heat on the same lamp; the end claims no rail, and no more power comes',
  'regulator-bench: an exit led past its check: loads-off>unsure': 'boards count as in until a load step says what is on the rails; the light load does, and nothing is powered before it',
  'full-load: drop prove-rails: rails-full': 'each rail is read again at the same load for thirty minutes; the end says what it held and proves no supply',
  'fuse-switch-mode: drop prove-rails: rails-lamp': 'what follows is isolation; the end names a tired fuse, claims no rail, and asks for rails to full load',
  'refit: drop prove-returns: returns': 'every return is proved again with each board in, before that board gets power; until then only dummy loads are on',
  'refit: forget the load: loads-off': 'a dummy load left on takes amps and gives no volts; boards get power only where the load step says boards, with trip, returns and full proving standing',
  'refit: boards in early: loads-off': 'by then trip, full proving and release stand; the boards get no power before their returns are proved with them in',
  'refit: an exit led past its check: loads-off>unsure': 'a load step that is not sure counts as boards in; power after it declares boards and asks all that boards ask',
  'refit: boards in early: fit': 'the step fits boards as it is written: the same tree',
  'refit: an exit led past its check: fit>unsure': 'a load step that is not sure counts as boards in, and the power that follows declares boards',
  'refit: forget the load: reseat': 'the board is read again as it sits; all that boards ask still stands, and the returns are proved again',
  'refit: boards in early: reseat': 'the step fits boards as it is written: the same tree',
  'refit: an exit led past its check: reseat>unsure': 'a load step that is not sure counts as boards in, and the power that follows declares boards',
  'rail-low: forget the load: loads-away': 'the readings that follow are made dead, and the light load says what is on the rails before any power',
  'cold-checks: forget the load: boards-apart': 'no power follows in this tree: the boards are parted for truer readings, and its good end claims no load',
  'cold-checks: drop prove-returns: returns-last': 'no power follows in this tree, and its good end claims no return',
  'drop prove-dead: prove': 'the tree claims nothing by itself; every tree that calls it is refused, which is tested below',
};

/** A tree for supplies without a trip is argued with the one that it was made from. */
const family = (tree: Tree) => tree.id.replace(/-no-trip$/, '');

/** Whether power, or an end that claims something, can still follow the exit of a mutant that was led on. */
function powerFollows(tree: Tree, name: string): boolean {
  const { layout } = layOut({ tree, callees: trees, profile: profileFor(tree), settings: defaultSettings });
  const graph = graphOf(layout);
  const at = name.split(': ')[1] ?? '';
  const [step, exit] = at.split('>');
  const from = [...graph.nodes.values()].filter((n) => n.key === step).flatMap((n) => n.edges.filter((e) => e.exit.id === exit).map((e) => e.to));
  const seen = new Set(from);
  const stack = [...from];
  for (let key = stack.pop(); key !== undefined; key = stack.pop()) {
    const node = graph.nodes.get(key);
    const kind = node?.placed.step.kind;
    if (kind === 'energise' || kind === 'raise') return true;
    for (const edge of node?.edges ?? []) if (!seen.has(edge.to)) { seen.add(edge.to); stack.push(edge.to); }
  }
  return false;
}

describe.each(trees.map((tree) => ({ id: tree.id, tree })))('mutants of $id', ({ tree }) => {
  const all = mutantsOf(tree);
  const taken = all.length > 250 ? all.filter((_, i) => i % SHARE === 0) : all;
  it(`are refused, or safe for a reason (${taken.length} of ${all.length})`, { timeout: 120_000 }, () => {
    const unexplained: string[] = [];
    let refused = 0;
    for (const mutant of taken) {
      if (mutant.tree === null) {
        expect(mutant.say).not.toBe('');
        refused += 1;
        continue;
      }
      if (!prove({ tree: mutant.tree, callees: trees, profile: profileFor(tree), settings: defaultSettings }).holds) refused += 1;
      else if (mutant.name in SAFE || `${family(tree)}: ${mutant.name}` in SAFE) continue;
      else if (mutant.kind !== 'an exit led past its check') unexplained.push(mutant.name);
      // an answer that was led on is no danger where it owes nothing (it passes), or where no power follows it
      else if (powerFollows(mutant.tree, mutant.name) && owes(tree, mutant.name)) unexplained.push(mutant.name);
    }
    expect(unexplained).toEqual([]);
    expect(refused).toBeGreaterThan(taken.length / 3);
  });
});

/** Whether the exit of a mutant is one that owes: unsure or failed, of a check or an act. */
function owes(tree: Tree, name: string): boolean {
  const [step, exit] = (name.split(': ')[1] ?? '').split('>');
  const found = tree.steps.find((s) => s.id === step);
  const taken = found?.exits.find((e) => e.id === exit);
  if (found === undefined || taken === undefined || found.kind === 'raise') return false;
  return taken.verdict === undefined ? taken.on.some((on) => on !== 'answer') : taken.verdict !== 'pass' && taken.verdict !== 'find';
}

describe('a make-dead without its proof', () => {
  it('takes every tree with it that calls it', () => {
    const broken = mutantsOf(trees.find((t) => t.id === 'make-dead')!).find((m) => m.name === 'drop prove-dead: prove');
    const first = trees.find((t) => t.id === 'first-power')!;
    const callees = [broken!.tree!];
    const proof = prove({ tree: first, callees, profile: profileFor(first), settings: defaultSettings });
    expect(proof.rules.filter((r) => !r.holds).map((r) => r.id)).toContain('H1');
  });
});
