/** The proof for issue: over the workshop's profiles that the tree admits, and over the built-in odd ones. */
import { misfits } from '../document/admits';
import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Tree } from '../document/tree';
import { oddProfiles } from './oddProfiles';
import { prove, RULE_IDS } from './prove';
import type { Proof, RuleVerdict } from './prove';

export interface IssueProof {
  holds: boolean;
  /** each rule over all profiles: the first profile on which it breaks, if any */
  rules: (RuleVerdict & { profile: string | null })[];
  /** titles of the profiles that it was proved on */
  provedOn: string[];
  /** profiles that it does not apply to, and why */
  leftOut: { profile: string; why: string[] }[];
}

/** Proves a tree for issue. A tree that applies to no profile at all holds nothing. */
export function proveForIssue(input: { tree: Tree; callees: readonly Tree[]; profiles: readonly Profile[]; settings: Settings }): IssueProof {
  const all = [...input.profiles, ...oddProfiles];
  const leftOut = all.flatMap((profile) => {
    const why = misfits(input.tree, profile);
    return why.length > 0 ? [{ profile: profile.title, why }] : [];
  });
  const admitted = all.filter((profile) => misfits(input.tree, profile).length === 0);
  const proofs: { profile: Profile; proof: Proof }[] = admitted.map((profile) => ({ profile, proof: prove({ tree: input.tree, callees: input.callees, profile, settings: input.settings }) }));
  const rules = RULE_IDS.map((id, i) => {
    const broken = proofs.find(({ proof }) => proof.rules[i]?.holds === false);
    const verdict = broken?.proof.rules[i];
    if (broken !== undefined && verdict !== undefined) return { ...verdict, profile: broken.profile.title };
    return { id, holds: true, path: [], story: '', legs: null, start: null, profile: null };
  });
  return { holds: proofs.length > 0 && rules.every((r) => r.holds), rules, provedOn: admitted.map((p) => p.title), leftOut };
}
