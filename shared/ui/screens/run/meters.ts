/** Which instrument a reading is taken with, and how exact it is. Pure. */
import type { Quantity } from '@/flows/document/ids';
import type { Step } from '@/flows/document/steps';
import type { Tree } from '@/flows/document/tree';
import { QUANTITIES } from '@/flows/document/ids';
import type { Instrument, InstrumentRange } from '@/shared/contract/instruments';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { uncertaintyOf } from '@/shared/workings/readingLimit';

export interface Meter {
  instrument: Instrument;
  /** why it cannot be used here, or null */
  barred: string | null;
}

interface Wish {
  quantity: Quantity;
  /** what the step does: proving dead takes a two-pole tester, insulation a tester with its own volts */
  kind: Step['kind'];
  /** the one with which this proof was begun, or null */
  only: string | null;
}

/** Instruments that read the quantity, those that can be used first. */
export function metersFor(instruments: readonly Instrument[], { quantity, kind, only }: Wish): Meter[] {
  const barred = (i: Instrument): string | null => {
    if (i.outOfDate) return `Out of date since ${i.calibratedUntil}`;
    if (kind === 'prove-dead' && !i.twoPole) return 'Not a two-pole tester';
    if (kind === 'prove-insulation' && i.kind !== 'insulation-tester') return 'It does not test with the volts that the step asks for';
    return only !== null && i.id !== only ? 'One instrument for the whole proof' : null;
  };
  return instruments
    .filter((i) => i.ranges.some((r) => r.quantity === quantity))
    .map((instrument) => ({ instrument, barred: barred(instrument) }))
    .sort((a, b) => Number(a.barred !== null) - Number(b.barred !== null));
}

/**
 * The instrument to begin with: the one used before for this quantity where it is exact enough here, else the most exact one of the tree's opening
 * list, else the most exact.
 * @param about the reading that is expected, in SI: most instruments can be used, and few are exact at that size
 */
export function firstMeter(
  meters: readonly Meter[],
  remembered: string | null,
  tree: Tree,
  { quantity, about }: { quantity: Quantity; about: number },
): Instrument | null {
  const doubt = (i: Instrument) => {
    const range = rangeFor(i, quantity, about);
    return range === null ? Infinity : uncertaintyOf(range, about);
  };
  const usable = meters
    .filter((m) => m.barred === null)
    .map((m) => m.instrument)
    .sort((a, b) => doubt(a) - doubt(b));
  const listed = tree.opening.instruments.filter((i) => i.reads.includes(quantity)).map((i) => i.kind);
  const exact = (i: Instrument) => doubt(i) <= EXACT_SHARE * Math.abs(about);
  return (
    usable.find((i) => i.id === remembered && exact(i)) ?? usable.find((i) => listed.includes(i.kind) && exact(i)) ?? usable[0] ?? null
  );
}

/** An instrument whose uncertainty is more than a tenth of the reading is not taken without being asked for. Common practice, no source. */
const EXACT_SHARE = 0.1;

/** The range that reads the value most exactly; null when it lies beyond the largest. */
export function rangeFor(instrument: Instrument, quantity: Quantity, value: number): InstrumentRange | null {
  const covering = instrument.ranges.filter((r) => r.quantity === quantity && Math.abs(value) <= r.fullScale);
  return covering.reduce<InstrumentRange | null>(
    (best, r) => (best === null || uncertaintyOf(r, value) < uncertaintyOf(best, value) ? r : best),
    null,
  );
}

/** `M3, 60 V`: sticker and range, or the sticker alone while nothing is read. */
export function meterWords(instrument: Instrument, range: InstrumentRange | null): string {
  return range === null ? instrument.tag : `${instrument.tag}, ${formatQuantity(range.fullScale, QUANTITIES[range.quantity])}`;
}
