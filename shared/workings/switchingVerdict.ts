/** Whether a regulator switches, told by two currents: a switching one trades volts for amps, a linear one cannot. */
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';

/** What the currents say. */
export type SwitchingIs = 'switching' | 'not-switching' | 'between' | 'cannot-tell' | 'takes-more' | 'impossible';

/** The answer with its numbers. */
export interface SwitchingVerdict {
  readonly is: SwitchingIs;
  /** Amps in for each amp out: of the change between two loads where a light one was read, else of the one load. */
  readonly ratio: number;
  /** What a loss-free switching regulator would show. */
  readonly ideal: number;
  /** Efficiency that the ratio stands for, where it can be a switching one. */
  readonly efficiency: number;
  /** Ohms behind which the rail sags between the two loads; null without a light load or its volts. */
  readonly sagOhms: number | null;
  readonly formula: string;
}

/** The two currents, or the four. */
export interface SwitchingReadings {
  readonly inputVolts: number;
  readonly outputVolts: number;
  readonly amps: number;
  readonly readInputAmps: number;
  readonly standingAmps: number;
  readonly light: { readonly inputAmps: number; readonly outputAmps: number; readonly outputVolts: number | null } | null;
}

/** What each answer means at the bench, without a full stop. */
export const SWITCHING_WORDS: Readonly<Record<SwitchingIs, string>> = {
  switching: 'It switches: the input takes far fewer amps than the output gives',
  'not-switching': 'It does not switch: input current follows output current, and the pass device burns the difference. Take the load off',
  between: 'Neither: it switches with heavy losses or only part of the time. Look at the choke with a scope before more load',
  'cannot-tell': 'These volts lie too close together for the currents to tell. Look at the choke with a scope',
  'takes-more': 'More goes in than comes out: something else draws from the input. Look for it dead before more load',
  impossible: 'More comes out than can go in: a reading is wrong, or another source feeds the rail. Isolate and look',
};

/** Ratio of input to output amps from which it counts as linear; a meter of 1 % or a leak accounts for the rest. Common practice, no source. */
export const LINEAR_FROM = 0.9;
/** Efficiency below which "switching" is not believed. Common practice, no source. */
export const LEAST_EFFICIENCY = 0.5;
/** V out ÷ V in above which the two cases lie too close. Common practice, no source. */
export const TOO_CLOSE = 0.7;

/**
 * Judges the readings.
 * @param expectedAmps input amps expected of a good switching regulator, for the sentence; null where none can reach the output
 */
export function judgeSwitching(given: SwitchingReadings, expectedAmps: number | null): SwitchingVerdict {
  const { inputVolts, outputVolts, amps, readInputAmps, light } = given;
  const ratio =
    light === null ? (readInputAmps - given.standingAmps) / amps : (readInputAmps - light.inputAmps) / (amps - light.outputAmps);
  const ideal = outputVolts / inputVolts;
  const efficiency = ratio > 0 ? ideal / ratio : 0;
  const sag = light === null || light.outputVolts === null ? null : (light.outputVolts - outputVolts) / (amps - light.outputAmps);
  const print = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
  const top =
    light === null
      ? `${print(readInputAmps - given.standingAmps)} ÷ ${print(amps)}`
      : `(${print(readInputAmps)} − ${print(light.inputAmps)}) ÷ (${print(amps)} − ${print(light.outputAmps)})`;
  const sagText = sag === null ? '' : `; the rail sags by ${formatQuantity(sag, 'Ω', { digits: 2 })}`;
  const expectedText = expectedAmps === null ? '' : ` (${print(expectedAmps)} in at ${print(amps)} out)`;
  const formula = `read: ${top} = ${formatNumber(ratio, 3)}; linear 1, switching ${formatNumber(ideal, 3)} or somewhat more${expectedText}${sagText}`;
  return { is: verdict(ratio, ideal, efficiency), ratio, ideal, efficiency, sagOhms: sag, formula };
}

function verdict(ratio: number, ideal: number, efficiency: number): SwitchingIs {
  if (ratio > 1.1) return 'takes-more';
  // 3 % for two meters that disagree.
  if (ratio < ideal * 0.97) return 'impossible';
  if (ideal > TOO_CLOSE) return 'cannot-tell';
  if (ratio >= LINEAR_FROM) return 'not-switching';
  return efficiency >= LEAST_EFFICIENCY ? 'switching' : 'between';
}
