/** A sheet's answer as an event for a run's record. */
import type { BareEvent } from '@/shared/ui/hooks/benchClock';
import type { AnySheet } from '@/shared/workings/list';

type BareNote = Extract<BareEvent, { type: 'NOTE' }>;

/**
 * The note with everything from which its headline can be worked out again.
 * @param inputs in SI, as the sheet takes them
 */
export function noteOf(sheet: AnySheet, inputs: Record<string, unknown>, headline: string): BareNote {
  return { type: 'NOTE', sheet: sheet.id, inputs: inputs as BareNote['inputs'], headline: headline.slice(0, 500) };
}
