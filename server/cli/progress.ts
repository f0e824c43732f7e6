/** Lines of progress with the time that each step took. */
import type { Say } from './runTool';

/** Seconds with one decimal, for people. */
export function seconds(sinceMs: number): string {
  return `${((performance.now() - sinceMs) / 1000).toFixed(1)} s`;
}

/** Runs a step and says afterwards what was done and how long it took; `done` may depend on the result. */
export async function step<T>(say: Say, done: string | ((result: T) => string), work: () => Promise<T>): Promise<T> {
  const begun = performance.now();
  const result = await work();
  say(`✓ ${typeof done === 'string' ? done : done(result)} (${seconds(begun)})`);
  return result;
}
