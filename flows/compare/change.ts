/** One thing that differs between two versions of a tree, as its author would say it. */

/** How far a change can reach: only words, a limit, what follows what, or where power goes. */
export const RISKS = ['none', 'text', 'limit', 'order', 'energy'] as const;
export type Risk = (typeof RISKS)[number];

export interface Change {
  what: 'added' | 'removed' | 'renamed' | 'reworded' | 'limit' | 'exit' | 'evidence' | 'suspect' | 'opening' | 'power' | 'start' | 'other';
  /** the step, by its id in the newer version (or the older where it is gone); null in the head */
  step: string | null;
  risk: Risk;
  say: string;
}

/** The furthest-reaching of several risks. */
export function worstRisk(risks: readonly Risk[]): Risk {
  return risks.reduce<Risk>((worst, risk) => (RISKS.indexOf(risk) > RISKS.indexOf(worst) ? risk : worst), 'none');
}

/** Whether two values of a document are the same. */
export function same(a: unknown, b: unknown): boolean {
  return JSON.stringify(sorted(a)) === JSON.stringify(sorted(b));
}

/** A value as an author reads it: short, lists without brackets. */
export function shown(value: unknown): string {
  if (value === undefined || value === null) return 'nothing';
  if (typeof value === 'string') return `“${value}”`;
  if (Array.isArray(value)) return value.length === 0 ? 'nothing' : value.map((v) => (typeof v === 'string' ? v : shown(v))).join(', ');
  if (typeof value === 'object') return Object.entries(value).map(([k, v]) => `${k} ${typeof v === 'object' ? shown(v) : String(v)}`).join(', ');
  return String(value);
}

/** Keys in one order, so that the order in which they were written does not count. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).filter(([, v]) => v !== undefined).sort(([a], [b]) => (a < b ? -1 : 1)).map(([k, v]) => [k, sorted(v)]));
}
