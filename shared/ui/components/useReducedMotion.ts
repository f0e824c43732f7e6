/** Whether the person asked their device for less movement. */
import { useSyncExternalStore } from 'react';

const query = '(prefers-reduced-motion: reduce)';

function list(): MediaQueryList | null {
  return typeof globalThis.matchMedia === 'function' ? globalThis.matchMedia(query) : null;
}

function subscribe(changed: () => void): () => void {
  const media = list();
  media?.addEventListener('change', changed);
  return () => media?.removeEventListener('change', changed);
}

/** True while the device asks for reduced motion. */
export function useReducedMotion(): boolean {
  return useSyncExternalStore(subscribe, () => list()?.matches ?? false);
}
