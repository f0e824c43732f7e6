/** One reading across a junction: as the meter shows it, and what it can be. */
import { parseReading } from '@/shared/quantity/parseReading';

/** Volts or ohms between two leads, or nothing that the meter can drive through. */
export type JunctionReading =
  { readonly kind: 'volts'; readonly volts: number } | { readonly kind: 'ohms'; readonly ohms: number } | { readonly kind: 'open' };

/**
 * What a reading is by itself: `short`, `low` (between a short and any junction), `low-drop` (Schottky or germanium; which of
 * them the reading cannot tell), `silicon`, `high` (two junctions in series, a light-emitting diode, a Zener the other way),
 * `resistance` (between short and open on the ohms range) or `open`.
 */
export type JunctionKind = 'short' | 'low' | 'low-drop' | 'silicon' | 'high' | 'resistance' | 'open';

/** At or below this a diode test beeps on: shorted (Fluke 80 Series V manual, p. 30). */
export const SHORT_VOLTS = 0.1;
/** Germanium and Schottky from here on (device makers: 0.2 to 0.3 V and 0.2 to 0.4 V). */
const LOW_DROP_VOLTS = 0.2;
/** Silicon from here to `SILICON_MOST_VOLTS`: makers of meters print 0.5 to 0.8, 0.4 to 0.8 and 0.4 to 0.9 V. */
const SILICON_LEAST_VOLTS = 0.45;
const SILICON_MOST_VOLTS = 0.9;
/** Ohms at or below which two leads count as joined, and at or above which as open. Common practice, no source. */
export const SHORT_OHMS = 10;
const OPEN_OHMS = 1e6;

/** Names what a reading is by itself. */
export function junctionKind(reading: JunctionReading): JunctionKind {
  if (reading.kind === 'open') return 'open';
  if (reading.kind === 'ohms') {
    if (reading.ohms <= SHORT_OHMS) return 'short';
    return reading.ohms >= OPEN_OHMS ? 'open' : 'resistance';
  }
  const { volts } = reading;
  if (volts <= SHORT_VOLTS) return 'short';
  if (volts < LOW_DROP_VOLTS) return 'low';
  if (volts < SILICON_LEAST_VOLTS) return 'low-drop';
  return volts <= SILICON_MOST_VOLTS ? 'silicon' : 'high';
}

/**
 * Understands what a meter shows on its diode test or its ohms range.
 * @param shown as typed: `0.612`, `612 mV`, `OL`, `47 Ω`
 * @returns the reading, or a sentence that says what to mend
 */
export function readJunction(shown: string): JunctionReading | { readonly say: string } {
  const volts = parseReading(shown, { quantity: 'diode-volts' });
  if (volts.ok) {
    if (volts.kind === 'over-range') return { kind: 'open' };
    if (volts.value < 0)
      return { say: 'A diode test shows no minus sign: something still holds a charge. Prove it dead, then read again.' };
    return { kind: 'volts', volts: volts.value };
  }
  if (volts.why !== 'wrong-unit' && volts.why !== 'wrong-prefix') return { say: volts.say };
  const ohms = parseReading(shown, { quantity: 'ohms' });
  if (!ohms.ok) return { say: 'Enter volts of the diode test, ohms with their Ω, or OL.' };
  return ohms.kind === 'over-range' ? { kind: 'open' } : { kind: 'ohms', ohms: ohms.value };
}
