/** The named choices of sheets in words. */
import { QUANTITIES } from '@/shared/quantity/quantities';
import type { Quantity } from '@/shared/quantity/quantities';

const WORDS: Readonly<Record<string, string>> = {
  resistance: 'a resistance',
  rectifier: 'transformer, rectifier and reservoir',
  'switch-mode': 'switch-mode supply',
  short: 'a dead short',
};

/** A choice as a person reads it; one without words of its own is printed with its dashes as spaces. */
export function choiceWords(choice: string): string {
  if (choice in QUANTITIES) return QUANTITIES[choice as Quantity].name;
  return WORDS[choice] ?? choice.replaceAll('-', ' ');
}
