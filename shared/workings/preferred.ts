/** Preferred values of resistors. */

/** The E24 series (IEC 60063), one decade. It must not be computed: eight of its values are not what 10^(n/24) rounds to. */
export const E24: readonly number[] = [
  1.0, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2.0, 2.2, 2.4, 2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1, 5.6, 6.2, 6.8, 7.5, 8.2, 9.1,
];

/**
 * The smallest E24 value that is not below the one given.
 * @param ohms more than zero
 */
export function nextE24(ohms: number): number {
  const decade = Math.floor(Math.log10(ohms));
  for (const power of [decade - 1, decade, decade + 1]) {
    for (const value of E24) {
      // Written as text and read back: 4.7 × 10^3 must be 4700 and not 4700.000000000001.
      const candidate = Number(`${value}e${power}`);
      if (candidate >= ohms * (1 - 1e-12)) return candidate;
    }
  }
  return ohms;
}

/** Usual watts of single power resistors. Common practice, no source. */
export const RESISTOR_WATTS: readonly number[] = [0.25, 0.5, 1, 2, 3, 5, 7, 10, 15, 25, 50, 100, 200];

/** Usual watts of mains incandescent lamps. Common practice, no source. */
export const LAMP_WATTS: readonly number[] = [7, 15, 25, 40, 60, 75, 100, 150, 200, 300, 500];
