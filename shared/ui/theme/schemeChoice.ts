/** Which scheme a person chose, kept on this device; without a choice the system's is followed. */
import type { Scheme } from '@/shared/ui/theme/palette';

export type SchemeChoice = Scheme | 'system';

const key = 'lampstep.scheme';

/** The scheme to draw, from the person's choice and the system's own (null when it does not say). */
export function schemeFor(choice: SchemeChoice, system: string | null | undefined): Scheme {
  if (choice !== 'system') return choice;
  return system === 'dark' ? 'dark' : 'light';
}

/** The kept choice; `system` when there is none, it is not one of ours, or the browser keeps nothing. */
export function readSchemeChoice(): SchemeChoice {
  try {
    const kept = globalThis.localStorage.getItem(key);
    return kept === 'light' || kept === 'dark' ? kept : 'system';
  } catch {
    return 'system';
  }
}

/** Keeps a choice; a browser that refuses storage still gets it for this page. */
export function keepSchemeChoice(choice: SchemeChoice): void {
  try {
    if (choice === 'system') globalThis.localStorage.removeItem(key);
    else globalThis.localStorage.setItem(key, choice);
  } catch {
    // private windows may refuse storage: the choice then lasts as long as the page
  }
}
