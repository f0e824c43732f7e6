/** The proof of a tree: every house rule over every path, as a visible list of passes. */
import type { DocumentFault } from '../document/parseTree';
import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Tree } from '../document/tree';
import { worstFacts } from '../facts/facts';
import type { Carried, Facts } from '../facts/facts';
import type { RuleId } from '../facts/needs';
import { claimAtoms } from '../facts/claims';
import { applyOps } from '../facts/ops';
import type { Op } from '../facts/ops';
import { layOut } from '../machine/program';
import type { Layout } from '../machine/program';
import { fixpointOf } from './fixpoint';
import type { Broken } from './fixpoint';
import { graphOf } from './graph';
import type { Graph, Start } from './graph';
import { owedFindings } from './owed';
import { callFindings, listFindings, liveFindings, reachFindings } from './paths';
import { isFeasible, search } from './search';
import type { Leg, SearchResult, Story } from './search';
import { tellStory, titleOf } from './story';

export const RULE_IDS = Array.from({ length: 21 }, (_, i) => `H${i + 1}` as RuleId);

/** What the proof says of one house rule. `path` lists the keys on the way, the barred one last. */
export interface RuleVerdict {
  id: RuleId;
  holds: boolean;
  path: string[];
  story: string;
  /** the answers of the path, for playing it; null where the rule speaks of no path */
  legs: Leg[] | null;
  start: Start | null;
}

export interface Proof {
  holds: boolean;
  rules: RuleVerdict[];
  /** faults of the pair of tree and profile: no proof without them mended */
  faults: DocumentFault[];
}

export interface ProofInput {
  tree: Tree;
  callees: readonly Tree[];
  profile: Profile;
  settings: Settings;
  carried?: Carried;
}

/** Most states that stories are looked for in; beyond it the verdict stands and the story is the place alone. */
const STORY_STATES = 60_000;
const STORY_TEXT = 40_000_000;

/** Proves one tree on one profile. Never passes on a limit: what could not be decided is a finding. */
export function prove(input: ProofInput): Proof {
  const { layout, faults } = layOut(input);
  if (faults.length > 0) return { holds: false, rules: RULE_IDS.map((id) => faultVerdict(id, faults)), faults };
  const graph = graphOf(layout);
  const start = startFacts(layout, input.carried);
  const findings: Finding[] = [
    ...fixpointOf(graph, start).broken.map(ofBroken),
    ...owedFindings(graph).map((o): Finding => ({ rule: o.rule, key: o.at, say: `${o.say}: “${titleOf(layout, o.check)}” may be owed`, searched: true })),
    ...[...reachFindings(graph), ...liveFindings(graph), ...listFindings(layout), ...callFindings(graph)].map((f): Finding => ({ ...f, searched: false })),
  ];
  const rules = verdicts(graph, start, findings);
  return { holds: rules.every((r) => r.holds), rules, faults: [] };
}

interface Finding {
  rule: RuleId;
  key: string | null;
  say: string;
  /** whether a walk with whole facts can show it */
  searched: boolean;
}

const ofBroken = (b: Broken): Finding => ({ rule: b.rule, key: b.key, say: b.need.say, searched: true });

/** The facts that every run of this tree starts its first step with: what it needs at the start, the bench opened, everything else at its worst. */
export function startFacts(layout: Layout, carried?: Carried): Facts {
  const ops: Op[] = [{ op: 'opened' }];
  let facts = worstFacts(layout.profile, carried);
  for (const atom of layout.tree.needsAtStart.flatMap((c) => claimAtoms(c, layout.profile))) {
    if (atom.fact === 'release') facts = { ...facts, release: 'valid' };
    // what is proved in one run is not proved in the next: a start can bring nothing else
  }
  return applyOps(facts, ops);
}

function verdicts(graph: Graph, start: Facts, findings: readonly Finding[]): RuleVerdict[] {
  const broken = new Set(findings.filter((f) => f.searched).map((f) => f.rule));
  const found = broken.size === 0 ? null : storiesOf(graph, start, broken);
  return RULE_IDS.map((id) => {
    const own = findings.filter((f) => f.rule === id);
    const first = own[0];
    if (first === undefined) return { id, holds: true, path: [], story: '', legs: null, start: null };
    const story = found?.stories.get(id);
    if (story !== undefined) {
      return { id, holds: false, path: [...story.legs.map((l) => l.key), story.at], story: tellStory(graph.layout, story.start, story.legs, story.at, story.needs), legs: story.legs, start: story.start };
    }
    const where = first.key === null ? '' : `“${titleOf(graph.layout, first.key)}”: `;
    return { id, holds: false, path: first.key === null ? [] : [first.key], story: `${where}${first.say}${first.searched ? behind(found, id) : ''}.`, legs: null, start: null };
  });
}

/** A rule that only breaks behind another's refusal has no story of its own. */
function behind(found: SearchResult | null, id: RuleId): string {
  if (found === null) return '';
  if (found.limited) return ' (no path was found within the limit of the search, so it cannot be decided and does not pass)';
  const others = [...found.stories.keys()].filter((rule) => rule !== id);
  return others.length === 0 ? '' : ` (behind ${others.join(', ')})`;
}

function storiesOf(graph: Graph, start: Facts, wanted: ReadonlySet<RuleId>): SearchResult {
  const plain = search(graph, start, { limit: STORY_STATES, text: STORY_TEXT, counters: false, wanted });
  const infeasible = [...plain.stories.values()].filter((s: Story) => !isFeasible(graph, s.legs)).map((s) => s.rule);
  if (infeasible.length === 0) return plain;
  const exact = search(graph, start, { limit: STORY_STATES, text: STORY_TEXT, counters: true, wanted: new Set(infeasible) });
  const stories = new Map(plain.stories);
  for (const rule of infeasible) {
    const again = exact.stories.get(rule);
    if (again === undefined) stories.delete(rule);
    else stories.set(rule, again);
  }
  return { stories, states: plain.states + exact.states, limited: plain.limited || exact.limited };
}

function faultVerdict(id: RuleId, faults: readonly DocumentFault[]): RuleVerdict {
  const own = faults.filter((f) => f.message.startsWith(`${id}:`));
  const say = (f: DocumentFault) => `${f.step ?? 'head'}, ${f.key}: ${f.message}`;
  // a pair that cannot be laid out is proved in nothing
  return { id, holds: false, path: own.flatMap((f) => (f.step === null ? [] : [f.step])), story: own.length > 0 ? own.map(say).join('; ') : `not proved: ${faults.map(say).join('; ')}`, legs: null, start: null };
}
