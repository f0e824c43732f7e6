/** The points of a drawn terminal strip: rows that fit, and the strip in words. */

export interface FigurePoint {
  id: string;
  /** as printed on the machine */
  name: string;
  /** which of the meter's leads goes there */
  highlight: 'red' | 'black' | null;
}

/** Cuts the points into rows of nearly equal length, none longer than `perRow`. */
export function figureRows<P>(points: readonly P[], perRow: number): P[][] {
  if (points.length === 0) return [];
  const count = Math.ceil(points.length / Math.max(1, perRow));
  const each = Math.ceil(points.length / count);
  return Array.from({ length: count }, (_, row) => points.slice(row * each, (row + 1) * each));
}

/** Where the leads go, as "red lead on +5, black lead on 0V". */
export function figureWords(points: readonly FigurePoint[]): string {
  const leads = (['red', 'black'] as const).flatMap((lead) => {
    const names = points.filter((p) => p.highlight === lead).map((p) => p.name);
    return names.length > 0 ? [`${lead} lead on ${names.join(' and ')}`] : [];
  });
  return leads.length > 0 ? leads.join(', ') : `terminals ${points.map((p) => p.name).join(', ')}`;
}
