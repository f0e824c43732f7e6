/** The power balance of a solved network: what the outputs give is what the rest turns into heat. */
import type { Network, Solution, Variation } from '@/shared/workings/network/network';
import { OUTPUT_BLEED_OHMS, STRAY_SIEMENS } from '@/shared/workings/network/network';

/** Watts given by the outputs and turned into heat, and how far apart they are as a share of the larger. */
export interface PowerBalance {
  readonly givenWatts: number;
  readonly heatWatts: number;
  readonly imbalance: number;
}

/** Below a microwatt there is no power to balance: everything is off. */
const LEAST_WATTS = 1e-6;

/** Sums the power of every branch, each from its own volts and amps. */
export function powerBalance(network: Network, { open, added }: Omit<Variation, 'off'>, solution: Solution): PowerBalance {
  const { volts } = solution;
  const between = (from: number, to: number): number => (volts[from] ?? 0) - (volts[to] ?? 0);
  const opened = new Set(open);
  let given = 0;
  let heat = 0;
  network.resistors.forEach(({ from, to, ohms }, k) => {
    if (!opened.has(k)) heat += between(from, to) ** 2 / ohms;
  });
  for (const { from, to, ohms } of added) heat += between(from, to) ** 2 / ohms;
  network.diodes.forEach(({ anode, cathode }, k) => (heat += between(anode, cathode) * (solution.diodeAmps[k] ?? 0)));
  network.outputs.forEach(({ terminal, zero }, k) => {
    const across = between(terminal, zero);
    given += across * (solution.outputAmps[k] ?? 0);
    heat += across ** 2 / OUTPUT_BLEED_OHMS;
  });
  for (const value of volts) heat += value * value * STRAY_SIEMENS;
  const larger = Math.max(Math.abs(given), Math.abs(heat), LEAST_WATTS);
  return { givenWatts: given, heatWatts: heat, imbalance: Math.abs(given - heat) / larger };
}
