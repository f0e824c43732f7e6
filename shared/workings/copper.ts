/** Copper wire: its resistance from size and temperature, and the most that the standard for cables allows. */

/** Resistivity of annealed copper at 20 °C, ohm metres (100 % IACS). */
export const COPPER_OHM_METRES = 1.7241e-8;

/** Temperature coefficient of annealed copper at 20 °C, per kelvin. */
export const COPPER_PER_KELVIN = 0.00393;

/** How the conductor is made. `solid` stands for IEC 60228 classes 1 and 2 (solid or stiff strands), `flexible` for class 5. */
export type ConductorKind = 'solid' | 'flexible' | 'flexible-tinned';

/**
 * Most ohms per kilometre at 20 °C that IEC 60228 allows, by square millimetres. They are maxima: they cover strands,
 * twist and thin spots, and lie above resistivity through area.
 */
const MOST_OHMS_PER_KILOMETRE: Readonly<Record<ConductorKind, readonly (readonly [squareMillimetres: number, ohms: number])[]>> = {
  solid: [
    [0.5, 36.0],
    [0.75, 24.5],
    [1, 18.1],
    [1.5, 12.1],
    [2.5, 7.41],
    [4, 4.61],
    [6, 3.08],
  ],
  flexible: [
    [0.5, 39.0],
    [0.75, 26.0],
    [1, 19.5],
    [1.5, 13.3],
    [2.5, 7.98],
    [4, 4.95],
    [6, 3.3],
  ],
  'flexible-tinned': [
    [0.5, 40.1],
    [0.75, 26.7],
    [1, 20.0],
    [1.5, 13.7],
    [2.5, 8.21],
    [4, 5.09],
    [6, 3.39],
  ],
};

/**
 * Diameter of an AWG size: 0.005 inch × 92^((36 − n) ÷ 39) (ASTM B258).
 * @param awg whole number; 0 is 1/0, −1 is 2/0, −3 is 4/0
 * @returns metres
 */
export function awgDiameterMetres(awg: number): number {
  return 0.005 * 0.0254 * 92 ** ((36 - awg) / 39);
}

/** Square millimetres of a round wire. @param metres its diameter */
export function roundSquareMillimetres(metres: number): number {
  return (Math.PI / 4) * metres * metres * 1e6;
}

/** Ohms per metre at 20 °C, resistivity through area. @param squareMillimetres more than zero */
export function copperOhmsPerMetre(squareMillimetres: number): number {
  return COPPER_OHM_METRES / (squareMillimetres * 1e-6);
}

/** The most ohms per metre at 20 °C that IEC 60228 allows; null for a size that is not in our part of its table. */
export function mostOhmsPerMetre(squareMillimetres: number, kind: ConductorKind): number | null {
  const found = MOST_OHMS_PER_KILOMETRE[kind].find(([size]) => Math.abs(size - squareMillimetres) <= 1e-9 * size);
  return found === undefined ? null : found[1] / 1000;
}

/** By how much copper has more ohms than at 20 °C: 1 + α (T − 20). @param celsius of the copper, not of the air */
export function copperFactor(celsius: number): number {
  return 1 + COPPER_PER_KELVIN * (celsius - 20);
}
