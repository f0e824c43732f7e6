/** The named choices of sheets in words. */
import { QUANTITIES } from '@/shared/quantity/quantities';
import type { Quantity } from '@/shared/quantity/quantities';

const WORDS: Readonly<Record<string, string>> = {
  resistance: 'a resistance',
  rectifier: 'transformer, rectifier and reservoir',
  'switch-mode': 'switch-mode supply',
  short: 'a dead short',
  solid: 'solid or stiff strands (class 1 or 2)',
  flexible: 'flexible (class 5)',
  'flexible-tinned': 'flexible, tinned (class 5)',
  'iec-60127': 'IEC 60127',
  'ul-248-14': 'UL/CSA 248-14',
  fast: 'F, fast',
  slow: 'T, slow',
  'zener-gate': 'Zener into the gate',
  divider: 'divider against a reference',
  'set-point': 'trip point as stated',
  zener: 'Zener diode',
  'npn-transistor': 'NPN transistor',
  'pnp-transistor': 'PNP transistor',
};

/** A choice as a person reads it; one without words of its own is printed with its dashes as spaces. */
export function choiceWords(choice: string): string {
  if (choice in QUANTITIES) return QUANTITIES[choice as Quantity].name;
  return WORDS[choice] ?? choice.replaceAll('-', ' ');
}
