/** Word, colours, pattern and symbol of each power state. */
import type { IconName } from '@/shared/ui/components/icons/iconPaths';
import { safety } from '@/shared/ui/theme/palette';

export type PowerState = 'proved-dead' | 'off' | 'lamp' | 'bench' | 'mains' | 'unknown';
export type PowerPatternName = 'plain' | 'dashes' | 'dots' | 'ticks' | 'diagonal' | 'chequer';

export interface PowerVisual {
  word: string;
  ground: string;
  ink: string;
  pattern: PowerPatternName;
  patternInk: string;
  symbol: IconName;
}

const visuals: Readonly<Record<PowerState, PowerVisual>> = {
  'proved-dead': {
    word: 'Proved dead',
    ground: safety.green,
    ink: safety.white,
    pattern: 'plain',
    patternInk: safety.green,
    symbol: 'power-proved-dead',
  },
  off: {
    word: 'Off, not proved',
    ground: safety.grey,
    ink: safety.black,
    pattern: 'dashes',
    patternInk: safety.greyDark,
    symbol: 'power-off',
  },
  lamp: { word: 'Lamp', ground: safety.yellow, ink: safety.black, pattern: 'dots', patternInk: safety.black, symbol: 'power-lamp' },
  bench: {
    word: 'Bench supply',
    ground: safety.blue,
    ink: safety.white,
    pattern: 'ticks',
    patternInk: safety.blueLight,
    symbol: 'power-bench',
  },
  mains: { word: 'Mains', ground: safety.red, ink: safety.white, pattern: 'diagonal', patternInk: safety.redLight, symbol: 'power-mains' },
  unknown: {
    word: 'Not known, treat as live',
    ground: safety.white,
    ink: safety.black,
    pattern: 'chequer',
    patternInk: safety.black,
    symbol: 'power-unknown',
  },
};

/** How a power state is shown; the same by day and by night. */
export function powerVisual(state: PowerState): PowerVisual {
  return visuals[state];
}

export interface PowerSegment {
  state: PowerState;
  seconds: number;
}

/** Seconds in each state, in the order in which the states first appear. */
export function powerTotals(segments: readonly PowerSegment[]): PowerSegment[] {
  const totals = new Map<PowerState, number>();
  for (const { state, seconds } of segments) totals.set(state, (totals.get(state) ?? 0) + seconds);
  return [...totals].map(([state, seconds]) => ({ state, seconds }));
}

/** A span in words: seconds below two minutes, whole minutes above. */
export function spanWords(seconds: number): string {
  return seconds < 120 ? `${Math.round(seconds)} s` : `${Math.round(seconds / 60)} min`;
}
