/** How likely each suspect is after what has been found, for ranking them in words. */
import { EVIDENCE } from '../document/outcomes';
import type { EvidenceWord } from '../document/outcomes';
import type { Suspect } from '../document/tree';
import { sharesOf } from './logWeights';

/** What one check said about suspects. A check that is answered again replaces what it said before. */
export interface Finding {
  check: string;
  evidence: readonly { suspect: string; says: EvidenceWord }[];
  /** suspects that were worked on: what was found out about them before counts no more */
  worked?: readonly string[];
}

export interface RankedSuspect {
  suspect: Suspect;
  /** share of all suspects together, 0 to 1 */
  share: number;
  /** how many checks have said anything about it */
  heard: number;
}

/**
 * Bayes' rule on the odds of one suspect against the others: the prior weight times the likelihood ratio of each word (1/100 to 100, steps of
 * Jeffreys' scale), worked in logarithms so that no count of checks runs out of range, then brought to a sum of 1. Most likely first; equal ones
 * stay in the order of the tree. Exactly one suspect is taken to be the cause.
 */
export function posterior(suspects: readonly Suspect[], findings: readonly Finding[]): RankedSuspect[] {
  const said = currentWords(findings);
  const weighed = suspects.map((suspect) => {
    const words = said.get(suspect.id) ?? [];
    return { suspect, heard: words.length, log: Math.log(suspect.prior) + words.reduce((sum, says) => sum + Math.log(EVIDENCE[says]), 0) };
  });
  const shares = sharesOf(weighed.map((w) => w.log));
  return weighed.map(({ suspect, heard }, i) => ({ suspect, heard, share: shares[i] ?? 0 })).sort((a, b) => b.share - a.share);
}

/** The words that stand now, by suspect: the last of each check, none from before work on that suspect. */
function currentWords(findings: readonly Finding[]): Map<string, EvidenceWord[]> {
  const standing = new Map<string, Map<string, EvidenceWord>>();
  for (const { check, evidence, worked } of findings) {
    for (const suspect of worked ?? []) standing.delete(suspect);
    for (const of of standing.values()) of.delete(check);
    for (const { suspect, says } of evidence) {
      const of = standing.get(suspect) ?? new Map<string, EvidenceWord>();
      of.set(check, says);
      standing.set(suspect, of);
    }
  }
  return new Map([...standing].map(([suspect, of]) => [suspect, [...of.values()]]));
}

/** A share in the words of the bench. */
export function shareInWords(share: number): string {
  if (share >= 0.9) return 'all but certain';
  if (share >= 0.5) return 'likely';
  if (share >= 0.15) return 'possible';
  return share >= 0.02 ? 'unlikely' : 'all but ruled out';
}
