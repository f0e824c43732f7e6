/** A supply output as a circuit element: holds its volts while it gives from nothing to its limit. */
import type { BranchCurrent } from '@/shared/workings/network/diode';

/** One output that is on. */
export interface LimitedSource {
  /** Volts that it holds, with their sign. */
  readonly volts: number;
  /** Most amps that it gives; from there on its volts fall, through zero if they are pulled. */
  readonly limitAmps: number;
  /** Whether it also takes current, up to its limit. */
  readonly takes: boolean;
  /** Slope of the output before the limit; more than zero. */
  readonly outputOhms: number;
}

/** Whether a source holds its volts, gives all it can, or has been pushed off. */
export type SourceState = 'holds' | 'limits' | 'pushed-off';

/**
 * Current that the output gives out of its terminal, signed; for a negative output it is negative.
 * @param volts of the terminal against the output's own 0 V
 * @returns amps and how they fall with the volts, in siemens (zero or more)
 */
export function sourceCurrent({ volts: held, limitAmps, takes, outputOhms }: LimitedSource, volts: number): BranchCurrent {
  const wanted = (held - volts) / outputOhms;
  const least = held > 0 ? (takes ? -limitAmps : 0) : -limitAmps;
  const most = held > 0 ? limitAmps : takes ? limitAmps : 0;
  if (wanted <= least) return { amps: least, siemens: 0 };
  if (wanted >= most) return { amps: most, siemens: 0 };
  return { amps: wanted, siemens: 1 / outputOhms };
}

/** What a source does at some volts of its terminal. */
export function sourceState(source: LimitedSource, volts: number): SourceState {
  const given = Math.sign(source.volts) * sourceCurrent(source, volts).amps;
  if (given >= source.limitAmps) return 'limits';
  return given <= (source.takes ? -source.limitAmps : 0) && Math.sign(source.volts) * volts > Math.abs(source.volts)
    ? 'pushed-off'
    : 'holds';
}
