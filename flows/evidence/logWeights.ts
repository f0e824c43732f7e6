/** Weights kept as logarithms, so that no number of checks runs out of range. */

/** Shares (sum 1) of natural-log weights. The largest is taken out before the exponential: only differences count. */
export function sharesOf(logs: readonly number[]): number[] {
  const top = logs.reduce((most, log) => Math.max(most, log), -Infinity);
  const weights = logs.map((log) => Math.exp(log - top));
  const total = weights.reduce((sum, w) => sum + w, 0);
  return weights.map((w) => w / total);
}

/**
 * Evidence for each of several causes in decibels: 10 log10 of its odds against all the others together (Good 1950; Jaynes, Probability Theory, chapter 4).
 * Ten decibels are odds of 10 to 1.
 */
export function evidenceDecibels(logs: readonly number[]): number[] {
  return logs.map((log, i) => {
    const others = logs.filter((_, j) => j !== i);
    const top = others.reduce((most, other) => Math.max(most, other), -Infinity);
    const rest = top + Math.log(others.reduce((sum, other) => sum + Math.exp(other - top), 0));
    return (10 * (log - rest)) / Math.LN10;
  });
}
