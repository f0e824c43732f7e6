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
