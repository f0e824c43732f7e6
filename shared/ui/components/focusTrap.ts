/** Keeps the keyboard inside a dialog. */

const focusable = 'a[href], button:not([disabled]), input:not([disabled]), select:not([disabled]), textarea:not([disabled]), [tabindex]';

/** What inside a box the Tab key reaches, in document order. */
export function tabStops(box: HTMLElement): HTMLElement[] {
  return [...box.querySelectorAll<HTMLElement>(focusable)].filter((e) => e.tabIndex >= 0 && e.getAttribute('aria-disabled') !== 'true');
}

/** Where Tab must go by force: from the last stop to the first and back; null lets the browser move on its own. */
export function wrapTab<T>(stops: readonly T[], current: T | null, backwards: boolean): T | null {
  const at = current === null ? -1 : stops.indexOf(current);
  if (backwards) return at <= 0 ? (stops.at(-1) ?? null) : null;
  return at === -1 || at === stops.length - 1 ? (stops[0] ?? null) : null;
}
