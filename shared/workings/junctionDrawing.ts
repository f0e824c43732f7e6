/** A part drawn from its junctions, with what was read over each, and the pair of leads that the finding is about. */
import type { Circuit, CircuitBranch } from '@/shared/workings/plot';

/** A way from lead to lead: what it was read as, where it was read. */
export interface JunctionWay {
  readonly red: string;
  readonly black: string;
  readonly conducts: boolean;
  /** As the meter showed it; null where it was not read. */
  readonly shown: string | null;
  readonly accused: boolean;
}

/** Leads that are drawn left: where a current goes in, or what controls it. */
const LEFT = new Set(['base', 'gate', 'anode']);

const unread = 'not read yet';

/**
 * The drawing. Each junction is a diode from the lead that wants red to the one that wants black; a pair that should block is drawn only
 * when the finding is about it.
 */
export function junctionDrawing(title: string, leads: readonly string[], ways: readonly JunctionWay[], finding: string): Circuit {
  const left = leads.filter((lead) => LEFT.has(lead));
  const isLeft = (lead: string): boolean => (left.length > 1 && left.length === leads.length ? lead === left[0] : LEFT.has(lead));
  const drawn = ways.filter((way) => way.conducts || way.accused);
  return {
    title,
    nodes: leads.map((lead) => ({ id: lead, label: lead, side: isLeft(lead) ? ('supply' as const) : ('load' as const) })),
    branches: drawn.map(
      (way): CircuitBranch => ({
        id: `${way.red}-${way.black}`,
        kind: way.conducts ? 'diode' : 'resistor',
        label: `${way.red} to ${way.black}: ${way.shown ?? unread}`,
        from: way.red,
        to: way.black,
        lit: way.shown !== null && !way.accused,
        ...(way.accused ? { mark: 'accused' as const } : {}),
      }),
    ),
    words: `${drawn.map((way) => `${way.conducts ? 'Junction' : 'Way'} from ${way.red} to ${way.black}: ${way.shown ?? unread}.`).join(' ')} ${finding}`,
  };
}
