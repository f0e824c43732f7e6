/** The word of the power band, derived from the facts. */
import { allOut, isProvedDead } from './facts';
import type { Facts } from './facts';

export type PowerBandState = 'proved-dead' | 'off' | 'lamp' | 'bench' | 'mains' | 'unknown';

/** The supply word: the worst source that is not out. */
export function bandOf(facts: Facts): PowerBandState {
  if (isProvedDead(facts)) return 'proved-dead';
  if (facts.sources.some((s) => s.state === 'unknown' || s.state === 'lapsed')) return 'unknown';
  if (allOut(facts)) return 'off';
  const mains = facts.sources.find((s) => s.id === 'mains');
  if (mains?.state === 'full') return 'mains';
  if (mains?.state === 'limited') return 'lamp';
  return 'bench';
}
