/** The instrument last used for a quantity, kept on this device. */
import type { Quantity } from '@/flows/document/ids';

const key = (quantity: Quantity) => `lampstep.meter.${quantity}`;

/** Id of the instrument used last, or null. */
export function rememberedMeter(quantity: Quantity): string | null {
  try {
    return globalThis.localStorage.getItem(key(quantity));
  } catch {
    return null;
  }
}

/** Keeps it; a browser that refuses storage is asked again at the next reading. */
export function rememberMeter(quantity: Quantity, instrument: string): void {
  try {
    globalThis.localStorage.setItem(key(quantity), instrument);
  } catch {
    // private windows may refuse storage
  }
}
