/** What a case of the lost-return sheet does to rails, boards and diodes. */
import type { RailState } from '@/shared/workings/lostReturnCases';
import type { LostReturnModel } from '@/shared/workings/lostReturnModel';
import type { Solution } from '@/shared/workings/network/network';

/** Kinds of harm, worst first; each is about one rail, load or diode, by its place. */
export const HARM_KINDS = ['rail-reversed', 'diode-over', 'load-reversed', 'load-over', 'rail-over', 'load-out'] as const;
export type HarmKind = (typeof HARM_KINDS)[number];

/** One harm of one case. */
export interface Harm {
  readonly kind: HarmKind;
  readonly at: number;
  /** Volts as they are, or amps of a diode. */
  readonly value: number;
  /** How bad, for the worst of several cases: more is worse. */
  readonly size: number;
  readonly destroys: boolean;
}

/** Least reverse volts that destroy: 74-series supply pins are rated down to −0.5 V (data sheets, absolute maximum). */
export const REVERSE_VOLTS = 0.5;
/** Share of nominal volts above which parts go: 7 V on 5 V (74 series, absolute maximum); for other rails common practice, no source. */
export const OVER_SHARE = 1.4;

/** Volts of wrong sign that still count as nothing: 1 % of nominal up to 0.1 V. Common practice, no source. */
export const reversedAbove = (nominalVolts: number): number => Math.min(0.1, Math.abs(nominalVolts) / 100);

function signed(kinds: { reversed: HarmKind; over: HarmKind }, at: number, nominalVolts: number, value: number): Harm | null {
  const volts = Math.sign(nominalVolts) * value;
  if (volts < -reversedAbove(nominalVolts)) return { kind: kinds.reversed, at, value, size: -volts, destroys: volts <= -REVERSE_VOLTS };
  if (volts > OVER_SHARE * Math.abs(nominalVolts))
    return { kind: kinds.over, at, value, size: volts / Math.abs(nominalVolts), destroys: true };
  return null;
}

/** Every harm of a solved case. */
export function harmsOf(model: LostReturnModel, states: readonly RailState[], { volts, diodeAmps }: Solution): readonly Harm[] {
  const harms: Harm[] = [];
  model.network.outputs.forEach(({ terminal, zero, volts: nominal }, rail) => {
    const harm = signed({ reversed: 'rail-reversed', over: 'rail-over' }, rail, nominal, (volts[terminal] ?? 0) - (volts[zero] ?? 0));
    if (harm !== null) harms.push(harm);
  });
  model.loads.forEach(({ from, to, nominalVolts, rails, tolerance }, at) => {
    if (nominalVolts === null || nominalVolts === 0) return;
    const value = (volts[from] ?? 0) - (volts[to] ?? 0);
    const harm = signed({ reversed: 'load-reversed', over: 'load-over' }, at, nominalVolts, value);
    if (harm !== null) harms.push(harm);
    const off = Math.abs(value - nominalVolts);
    if (off > tolerance * Math.abs(nominalVolts) && rails.every((rail) => states[rail] === 'on'))
      harms.push({ kind: 'load-out', at, value, size: off / Math.abs(nominalVolts), destroys: false });
  });
  diodeAmps.forEach((amps, at) => {
    const rated = model.diodes[at]?.ratedAmps ?? null;
    if (rated !== null && amps > rated) harms.push({ kind: 'diode-over', at, value: amps, size: amps / rated, destroys: true });
  });
  return harms;
}
