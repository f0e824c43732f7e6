/** Signal words and their panels, after ANSI Z535.4: the worst word of several hazards heads them all. */
import { safety } from '@/shared/ui/theme/palette';

export type SignalWord = 'danger' | 'warning' | 'caution' | 'notice';

export interface SignalVisual {
  word: string;
  ground: string;
  ink: string;
  /** the safety alert symbol stands only where a person can be hurt */
  alert: boolean;
}

const visuals: Readonly<Record<SignalWord, SignalVisual>> = {
  danger: { word: 'DANGER', ground: safety.red, ink: safety.white, alert: true },
  warning: { word: 'WARNING', ground: safety.orange, ink: safety.black, alert: true },
  caution: { word: 'CAUTION', ground: safety.yellow, ink: safety.black, alert: true },
  notice: { word: 'NOTICE', ground: safety.blue, ink: safety.white, alert: false },
};

/** How a signal word is printed. */
export function signalVisual(signal: SignalWord): SignalVisual {
  return visuals[signal];
}

const order: readonly SignalWord[] = ['danger', 'warning', 'caution', 'notice'];

/** The most severe of some signal words; `notice` when there are none. */
export function worstSignal(signals: readonly SignalWord[]): SignalWord {
  return order.find((word) => signals.includes(word)) ?? 'notice';
}
