/** Which of the resistors that a workshop owns make a load, side by side. */

/** Resistors alike that are there. */
export interface OwnedResistor {
  readonly ohms: number;
  /** Rated watts of each. */
  readonly watts: number;
  readonly count: number;
}

/** A choice of them in parallel. */
export interface LoadChoice {
  readonly ohms: number;
  /** How many of each, in the order in which they are owned; no zeros. */
  readonly pieces: readonly { readonly resistor: OwnedResistor; readonly count: number }[];
  /** Heat of the hardest worked one as a share of its rating, at the volts asked for. */
  readonly share: number;
}

/** Share of its rated watts at which a resistor in free air is worked for minutes. Common practice, no source. */
export const WORKED_SHARE = 0.5;

/**
 * The parallel choice whose amps come nearest to those wanted, without any piece above half its rating.
 * @param volts by size, across the load
 * @param amps wanted
 * @param mostAmps never more than this
 * @returns null when nothing that is owned gives any load at these volts
 */
export function chooseLoad(owned: readonly OwnedResistor[], volts: number, amps: number, mostAmps: number): LoadChoice | null {
  const usable = owned.filter((one) => (volts * volts) / one.ohms <= one.watts * WORKED_SHARE * (1 + 1e-9));
  let best: { counts: readonly number[]; amps: number } | null = null;
  const walk = (at: number, counts: readonly number[], sum: number): void => {
    const one = usable[at];
    if (one === undefined) {
      if (sum > 0 && (best === null || Math.abs(sum - amps) < Math.abs(best.amps - amps))) best = { counts, amps: sum };
      return;
    }
    for (let count = 0; count <= one.count; count += 1) {
      const more = sum + (count * volts) / one.ohms;
      if (more > mostAmps * (1 + 1e-9)) break;
      walk(at + 1, [...counts, count], more);
    }
  };
  walk(0, [], 0);
  // The walk writes to it from inside, which the flow of types does not see.
  const found = best as { counts: readonly number[]; amps: number } | null;
  if (found === null) return null;
  const pieces = usable.flatMap((resistor, at) => {
    const count = found.counts[at] ?? 0;
    return count === 0 ? [] : [{ resistor, count }];
  });
  const share = Math.max(...pieces.map(({ resistor }) => (volts * volts) / resistor.ohms / resistor.watts));
  return { ohms: volts / found.amps, pieces, share };
}
