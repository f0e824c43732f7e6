/** How the parts of a plot are told apart: by weight and dash first, so that no colour has to be seen. */
import type { Palette } from '@/shared/ui/theme/palette';
import type { Plot, PlotCurve } from '@/shared/workings/plot';

export interface Stroke {
  color: string;
  width: number;
  /** SVG dash pattern; `none` is a whole line */
  dash: string;
}

const OTHER_DASHES = ['12 5', '4 4', '14 4 3 4'] as const;

/** Line of a curve; `index` counts the curves of its role from 0. */
export function curveStroke(role: PlotCurve['role'], index: number, colors: Palette): Stroke {
  if (role === 'main') return { color: colors.ink, width: index === 0 ? 3 : 2, dash: index === 0 ? 'none' : '18 5' };
  if (role === 'bound') return { color: colors.inkSoft, width: 2, dash: '2 4' };
  return { color: colors.action, width: 2.5, dash: OTHER_DASHES[index % OTHER_DASHES.length] ?? '4 4' };
}

/** Line of a limit. */
export function limitStroke(colors: Palette): Stroke {
  return { color: colors.brass, width: 2, dash: '9 4 2 4' };
}

/** Each curve with its line, in the order in which they are drawn: the main one last, on top. */
export function strokedCurves(plot: Plot, colors: Palette): { curve: PlotCurve; stroke: Stroke }[] {
  const seen = new Map<string, number>();
  const stroked = plot.curves.map((curve) => {
    const index = seen.get(curve.role) ?? 0;
    seen.set(curve.role, index + 1);
    return { curve, stroke: curveStroke(curve.role, index, colors) };
  });
  return stroked.sort((a, b) => Number(a.curve.role === 'main') - Number(b.curve.role === 'main'));
}
