/** Distances, line weights and target sizes in CSS pixels. */

export const space = { xs: 4, s: 8, m: 12, l: 16, xl: 24, xxl: 32, huge: 48 } as const;

/** Weights of ruled lines: between rows, around controls, under headings that open a part. */
export const line = { hair: 1, rule: 2, heavy: 3 } as const;

/** Smallest sides of what a gloved thumb must hit, and the gap that keeps two of them apart. */
export const target = { control: 48, answer: 64, stop: 60, gap: 8 } as const;

/** Side of the corner that is cut from things that can be picked up. */
export const notch = 14;

/** Width of the column that carries studs and their vertical rule, and the stud itself. */
export const stud = { column: 60, size: 44, small: 22 } as const;

/** From this window width on, places stand at the left and tables keep their columns. */
export const wideFrom = 900;

/** True when a window of this width has room for side columns. */
export function isWide(windowWidth: number): boolean {
  return windowWidth >= wideFrom;
}
