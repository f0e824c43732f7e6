/** Where the hands may be at a step, in words that stand before its first line. */
import type { Step } from '@/flows/document/steps';

const WORDS: Readonly<Record<Step['contact'], string>> = {
  none: 'Hands off.',
  cover: 'Covers only, nothing inside.',
  probe: 'One insulated probe, one hand.',
  hands: 'Hands may go in.',
};

/** What may touch the machine at this step. */
export function contactWords(contact: Step['contact']): string {
  return WORDS[contact];
}
