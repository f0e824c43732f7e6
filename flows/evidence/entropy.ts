/** Entropy of weights, and what an answer is expected to take off it. */

/** Entropy in bits of weights that need not sum to 1 (Shannon 1948). Weights of zero count for nothing. */
export function entropyBits(weights: readonly number[]): number {
  const total = weights.reduce((sum, w) => sum + w, 0);
  if (!(total > 0)) return 0;
  return weights.reduce((sum, w) => (w > 0 ? sum - (w / total) * Math.log2(w / total) : sum), 0);
}

/**
 * Bits that an answer is expected to tell: entropy of the answers less their entropy once the cause is known. `shares` are the causes' shares (sum
 * 1), `chances[cause][answer]` each a row that sums to 1.
 */
export function expectedBits(shares: readonly number[], chances: readonly (readonly number[])[]): number {
  const answers = chances[0]?.length ?? 0;
  const marginal = Array.from({ length: answers }, (_, a) => shares.reduce((sum, p, s) => sum + p * (chances[s]?.[a] ?? 0), 0));
  const known = shares.reduce((sum, p, s) => sum + p * entropyBits(chances[s] ?? []), 0);
  return Math.max(0, entropyBits(marginal) - known);
}
