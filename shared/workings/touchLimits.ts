/** Voltages below which a part counts as safe to touch, each with the standard that says so. They differ, so none goes unnamed. */

/** One published threshold. */
export interface TouchLimit {
  readonly volts: number;
  readonly name: string;
  /** Time in which that standard wants it reached, or null where it names none. */
  readonly withinSeconds: number | null;
}

/** Published thresholds for d.c., highest first. */
export const TOUCH_LIMITS: readonly TouchLimit[] = [
  { volts: 60, name: 'IEC 61010-1, hazardous live above 60 V d.c. (dry)', withinSeconds: null },
  { volts: 60, name: 'IEC 60204-1, 6.2.4, residual voltage', withinSeconds: 5 },
  { volts: 50, name: 'NEC 460.6(A), capacitors up to 600 V', withinSeconds: 60 },
  { volts: 42.4, name: 'IEC 60335-1, 8.1.4, household appliances', withinSeconds: null },
  { volts: 34, name: 'IEC 60335-1, 22.5, pins of the plug', withinSeconds: 1 },
];

/** Reading at or below which a circuit counts as dead here: below every touch limit, above the noise of a meter. */
export const DEAD_VOLTS = 5;

/** Charge and energy that IEC 60335-1, 8.1.4 allows a part to hold: 45 μC (450 V to 15 kV) and 350 mJ (above 15 kV). */
export const HARMLESS_COULOMBS = 45e-6;
export const HARMLESS_JOULES = 0.35;

/** A charge or an energy that a part may keep. */
export interface ChargeLimit {
  readonly name: string;
  /** One of the two; the other is null. */
  readonly coulombs: number | null;
  readonly joules: number | null;
}

/** Published charges and energies. IEC 60335-1 speaks of 45 μC from 450 V to 15 kV and of 350 mJ above. */
export const CHARGE_LIMITS: readonly ChargeLimit[] = [
  { name: 'IEC 60204-1, 6.2.4, exempt', coulombs: 60e-6, joules: null },
  { name: 'IEC 61010-1, 6.3.1 c), and IEC 60335-1, 8.1.4', coulombs: HARMLESS_COULOMBS, joules: null },
  { name: 'IEC 60335-1, 8.1.4, above 15 kV', coulombs: null, joules: HARMLESS_JOULES },
];

/** Volts at which a capacitor holds no more than that. */
export function voltsAtLimit({ coulombs, joules }: ChargeLimit, farads: number): number {
  return coulombs !== null ? coulombs / farads : Math.sqrt((2 * (joules ?? 0)) / farads);
}

/** Kinds of capacitor by how far they come back. */
export const REBOUND_KINDS = ['electrolytic', 'paper', 'ceramic', 'film'] as const;
/** One of them. */
export type ReboundKind = (typeof REBOUND_KINDS)[number];

/**
 * Share of the first volts that a capacitor may come back to after a short discharge (dielectric absorption). Electrolytic up
 * to 15 %, films 1 to 2 % at most: public encyclopaedia; ceramic up to 2.5 %: WIMA, technical information (Z5U); paper 5 %:
 * from memory.
 */
export const REBOUND_SHARES: Readonly<Record<ReboundKind, number>> = { electrolytic: 0.15, paper: 0.05, ceramic: 0.025, film: 0.02 };
