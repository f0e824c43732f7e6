/** The normal distribution, for the chance that a reading deceives. */

/**
 * Share of a normal distribution below x, Φ(x); good to 1e-14.
 * Series near the middle, continued fraction in the tails (Abramowitz & Stegun, 26.2.11 and 26.2.14).
 * @param x in standard deviations; ±Infinity gives 1 and 0
 */
export function normalShareBelow(x: number): number {
  if (x === 0) return 0.5;
  const size = Math.abs(x);
  if (size > 38) return x > 0 ? 1 : 0;
  const density = Math.exp((-size * size) / 2) / Math.sqrt(2 * Math.PI);
  if (size < 4) {
    let [term, sum] = [size, size];
    for (let n = 3; Math.abs(term) > 1e-17 * sum && n < 400; n += 2) {
      term *= (size * size) / n;
      sum += term;
    }
    const half = density * sum;
    return x > 0 ? 0.5 + half : 0.5 - half;
  }
  let fraction = size;
  for (let n = 60; n >= 1; n -= 1) fraction = size + n / fraction;
  const tail = density / fraction;
  return x > 0 ? 1 - tail : tail;
}
