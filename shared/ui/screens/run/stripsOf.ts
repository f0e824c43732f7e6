/** The terminal strips that a step draws: every screw of the connectors that its leads go to. Pure. */
import type { Point, Profile } from '@/flows/document/profile';
import type { Step } from '@/flows/document/steps';
import { resolvePoint } from '@/flows/document/profile';
import type { Row } from '@/flows/machine/rows';
import type { FigurePoint } from '@/shared/ui/components/figureWords';

export interface Strips {
  strips: { title: string; points: FigurePoint[] }[];
  /** what lies beside the leads and must not be touched */
  neighbours: string[];
}

/** Strips for the row that is read now, or for the points that the step names; null where there is nothing to draw. */
export function stripsOf(profile: Profile, step: Step, row: Row | null): Strips | null {
  if (row?.ask === 'reading' && row.red !== null) return draw(profile, [row.red], row.black === null ? [] : [row.black]);
  if (row !== null || step.figure === undefined || !('points' in step.figure)) return null;
  const { points } = step.figure;
  const zero = profile.points.filter((p) => p.id === profile.zeroPoint);
  const black = points.includes('zero') ? zero : [];
  const red = points.filter((name) => name !== 'zero').flatMap((name) => resolved(profile, name));
  return red.length + black.length === 0 ? null : draw(profile, red, black);
}

function resolved(profile: Profile, name: string): Point[] {
  if (name === 'each-rail') return profile.points.filter((p) => p.rail !== null);
  if (name === 'each-store') return profile.points.filter((p) => profile.stores.some((s) => s.point === p.id));
  const point = resolvePoint(profile, name, null);
  return point === null ? [] : [point];
}

function draw(profile: Profile, red: readonly Point[], black: readonly Point[]): Strips {
  const leads = [...red, ...black];
  const connectors = [...new Set(leads.map((p) => p.connector))];
  const lead = (p: Point) => (red.some((r) => r.id === p.id) ? 'red' : black.some((b) => b.id === p.id) ? 'black' : null);
  const strips = connectors.map((connector) => ({
    title: connector,
    points: profile.points
      .filter((p) => p.connector === connector)
      .map((p): FigurePoint => ({ id: p.id, name: shortName(p), highlight: lead(p) })),
  }));
  const bare = (words: string) => words.replaceAll(' ', '');
  const own = leads.flatMap((p) => [p.name, shortName(p), `${p.connector}-${p.pin}`]).map(bare);
  // a neighbour that carries the other lead is no danger
  const neighbours = [...new Set(leads.flatMap((p) => p.neighbours))].filter(
    (name) => !own.some((is) => bare(name) === is || bare(name).startsWith(`${is}(`)),
  );
  return { strips, neighbours };
}

/** What is printed at a screw: its volts where the name says them, otherwise its pin. */
function shortName(point: Point): string {
  const volts = /[+−-]?\d+(?:\.\d+)? ?V\b/.exec(point.name)?.[0];
  return volts === undefined ? `${point.connector}-${point.pin}` : volts.replace(' ', '');
}
