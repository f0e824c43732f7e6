/** Finds the place where a rising function passes zero. */

/**
 * Bisection down to neighbouring doubles; it cannot miss, overshoot or fail to end, which is why it is used here.
 * @param f rising, f(low) ≤ 0 ≤ f(high)
 */
export function bisect(f: (x: number) => number, low: number, high: number): number {
  let [below, above] = [low, high];
  for (let step = 0; step < 200; step += 1) {
    const middle = below + (above - below) / 2;
    if (middle <= below || middle >= above) break;
    if (f(middle) <= 0) below = middle;
    else above = middle;
  }
  // The nearer of the two neighbours: f(below) ≤ 0 < f(above).
  return Math.abs(f(below)) <= Math.abs(f(above)) ? below : above;
}
