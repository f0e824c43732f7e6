/** A reading that is well inside its limit, and the demo instrument that can tell: worked out from what the screen says. */
import { parseReading } from '@/shared/quantity/parseReading';
import type { Unit } from '@/shared/quantity/units';

import type { Seen } from './readScreen';

interface Limits {
  unit: Unit;
  low: number | null;
  high: number | null;
}

function limitsIn({ entry, limit }: Pick<Seen, 'entry' | 'limit'>): Limits {
  const unit = (/, in ([^,]*)$/.exec(entry ?? '')?.[1] ?? 'V') as Unit;
  const [, word = '', first = '', second] = /^(at most |at least )?(.*?)(?: to (.*))?$/.exec(limit ?? '') ?? [];
  const si = (text: string) => {
    const parsed = parseReading(text, { unit, signed: true });
    if (!parsed.ok || parsed.kind !== 'value') throw new Error(`the limit “${limit ?? ''}” is not understood at “${entry ?? ''}”`);
    return parsed.value;
  };
  if (word === 'at most ') return { unit, low: null, high: si(first) };
  if (word === 'at least ') return { unit, low: si(first), high: null };
  const ends = [si(first), si(second ?? first)].sort((a, b) => a - b);
  return { unit, low: ends[0] ?? null, high: ends[1] ?? null };
}

/** As a person would type it: plain figures, with a point. */
export function goodReading(seen: Pick<Seen, 'entry' | 'limit'>): string {
  const { low, high } = limitsIn(seen);
  const value = low !== null && high !== null ? (low + high) / 2 : low !== null ? low * 3 : (high ?? 1) * 0.1;
  return String(Number(value.toPrecision(3)));
}

/** Sticker of the instrument that reads this exactly enough, or null where any that is offered will do. */
export function meterFor(seen: Pick<Seen, 'entry' | 'limit'>): string | null {
  const { unit, low, high } = limitsIn(seen);
  if (unit === 'Ω') return high !== null && high <= 0.2 ? 'Q-03' : low !== null && low >= 1e6 ? 'Q-04' : 'Q-02';
  return unit === 'V' && (low !== null || (high ?? 0) < 1) ? 'Q-02' : null;
}
