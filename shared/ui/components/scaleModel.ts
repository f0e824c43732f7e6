/** The geometry of a reading on its ruled scale: where ticks, limits, guard bands and needle stand. Pure. */

export interface ScaleInput {
  value: number | null;
  /** limits; null where that side is open */
  low: number | null;
  high: number | null;
  /** half-width of the guard band at a limit, in the unit of the value; 0 without one */
  guard: number;
  nominal?: number | null | undefined;
}

export interface Tick {
  at: number;
  major: boolean;
}

export interface ScaleModel {
  min: number;
  max: number;
  ticks: Tick[];
  /** decimals that tell two major ticks apart */
  decimals: number;
  /** from and to of what is allowed, cut at the ends of the scale */
  band: { from: number; to: number } | null;
  /** from and to of what is too close to a limit to tell */
  guards: { from: number; to: number }[];
  needle: { at: number; off: 'low' | 'high' | null } | null;
}

/** A step of 1, 2 or 5 times a power of ten, at least as big as asked. */
export function roundStep(atLeast: number): number {
  if (!(atLeast > 0) || !Number.isFinite(atLeast)) return 1;
  const power = 10 ** Math.floor(Math.log10(atLeast));
  const m = atLeast / power;
  const nice = m <= 1.000001 ? 1 : m <= 2 ? 2 : m <= 5 ? 5 : 10;
  return nice * power;
}

function extent({ value, low, high, guard, nominal }: ScaleInput): [number, number] {
  if (low !== null && high !== null) {
    const room = Math.max(high - low, 4 * guard) * 0.8 || Math.abs(low) * 0.1 || 1;
    return [low - room, high + room];
  }
  const anchor = low ?? high;
  if (anchor !== null) {
    // one-sided: room enough to see the limit from both sides, more where the reading lies within reach
    const scale = Math.max(Math.abs(anchor), Math.abs((nominal ?? anchor) - anchor) * 2, guard * 8) || Math.abs(value ?? 1) || 1;
    const reach = value === null ? 0 : Math.min(Math.abs(value - anchor) * 1.2, scale * 3);
    const room = Math.max(scale * 0.5, reach);
    const short = scale * 0.5;
    const [down, up] = low !== null ? [short, room] : [room, short];
    // a lower end of zero keeps a positive scale from showing values that cannot be
    const from = anchor - down;
    return [anchor > 0 && from < 0 && (value ?? 0) >= 0 ? 0 : from, anchor + up];
  }
  const about = value ?? nominal ?? 0;
  const reach = Math.abs(about) * 1.25 || 1;
  return about < 0 ? [-reach, 0] : [0, reach];
}

const minorsPerMajor = 5;

/** Lays out a scale with at most `majors` labelled spans. */
export function scaleModel(input: ScaleInput, majors: number): ScaleModel {
  const [from, to] = extent(input);
  let step = roundStep((to - from) / Math.max(1, majors));
  // widening the ends to whole steps may add one span too many
  while (Math.ceil(to / step) - Math.floor(from / step) > Math.max(1, majors)) step = roundStep(step * 1.01);
  const first = Math.floor(from / step);
  const last = Math.ceil(to / step);
  const [min, max] = [first * step, last * step];
  const ticks = Array.from({ length: (last - first) * minorsPerMajor + 1 }, (_, i) => ({
    at: (first + i / minorsPerMajor) * step,
    major: i % minorsPerMajor === 0,
  }));
  const clip = (n: number) => Math.min(max, Math.max(min, n));
  const { value, low, high, guard } = input;
  const limits = [low, high].filter((n) => n !== null);
  return {
    min,
    max,
    ticks,
    decimals: Math.max(0, -Math.floor(Math.log10(step) + 1e-9)),
    band: limits.length === 0 ? null : { from: clip(low ?? min), to: clip(high ?? max) },
    guards: guard > 0 ? limits.map((n) => ({ from: clip(n - guard), to: clip(n + guard) })) : [],
    needle: value === null || Number.isNaN(value) ? null : { at: clip(value), off: value < min ? 'low' : value > max ? 'high' : null },
  };
}
