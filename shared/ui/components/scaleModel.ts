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

/** A step of 1, 2, 2.5 or 5 times a power of ten, at least as big as asked. */
export function roundStep(atLeast: number): number {
  if (!(atLeast > 0) || !Number.isFinite(atLeast)) return 1;
  const power = 10 ** Math.floor(Math.log10(atLeast));
  // a hair of room, so that 0.1 * 3 / 3 is still 0.1
  const m = (atLeast / power) * 0.999999;
  const nice = m <= 1 ? 1 : m <= 2 ? 2 : m <= 2.5 ? 2.5 : m <= 5 ? 5 : 10;
  return nice * power;
}

function extent({ value, low, high, guard, nominal }: ScaleInput): [number, number] {
  if (low !== null && high !== null) {
    const room = Math.max(high - low, 4 * guard, Math.abs(low) * 1e-3) * 0.7 || 1;
    // limits above zero and a reading that is not below it: the scale shows no values that cannot be
    const from = low - room;
    return [low > 0 && from < 0 && (value ?? 0) >= 0 ? 0 : from, high + room];
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
    const positive = anchor > 0 && (value ?? 0) >= 0 && (low === null || from < 0);
    return [positive ? 0 : from, anchor + up];
  }
  const about = value ?? nominal ?? 0;
  const reach = Math.abs(about) * 1.25 || 1;
  return about < 0 ? [-reach, 0] : [0, reach];
}

const minorsPerMajor = 5;

interface Ruling {
  step: number;
  minor: number;
  /** first and last small tick, counted from zero in small ticks */
  first: number;
  last: number;
}

function rulingOf(from: number, to: number, step: number): Ruling {
  const minor = step / minorsPerMajor;
  // a thousandth of a small tick is lost in drawing, and keeps 0.3 / 0.1 from costing a tick
  return { step, minor, first: Math.floor(from / minor + 1e-3), last: Math.ceil(to / minor - 1e-3) };
}

function majorsOf({ first, last }: Ruling): number {
  return Math.floor(last / minorsPerMajor) - Math.ceil(first / minorsPerMajor) + 1;
}

function decimalsOf(step: number): number {
  const power = Math.floor(Math.log10(step) + 1e-9);
  const twoFigures = Math.abs(step / 10 ** power - 2.5) < 1e-6;
  return Math.max(0, (twoFigures ? 1 : 0) - power);
}

/** Lays out a scale with at most `labels` labelled ticks; its ends fall on small ticks. */
export function scaleModel(input: ScaleInput, labels: number): ScaleModel {
  const [from, asked] = extent(input);
  // nothing that a meter shows is this small; a scale without length cannot be ruled
  const to = asked - from > Math.max(1, Math.abs(from)) * 1e-9 ? asked : from + 1;
  const most = Math.max(2, labels);
  let ruling = rulingOf(from, to, roundStep((to - from) / most));
  while (majorsOf(ruling) > most) ruling = rulingOf(from, to, roundStep(ruling.step * 1.01));
  const { step, minor, first, last } = ruling;
  const [min, max] = [first * minor, last * minor];
  const ticks = Array.from({ length: last - first + 1 }, (_, i) => ({
    at: (first + i) * minor,
    major: (first + i) % minorsPerMajor === 0,
  }));
  const clip = (n: number) => Math.min(max, Math.max(min, n));
  const { value, low, high, guard } = input;
  const limits = [low, high].filter((n) => n !== null);
  return {
    min,
    max,
    ticks,
    decimals: decimalsOf(step),
    band: limits.length === 0 ? null : { from: clip(low ?? min), to: clip(high ?? max) },
    guards: guard > 0 ? limits.map((n) => ({ from: clip(n - guard), to: clip(n + guard) })) : [],
    needle: value === null || Number.isNaN(value) ? null : { at: clip(value), off: value < min ? 'low' : value > max ? 'high' : null },
  };
}
