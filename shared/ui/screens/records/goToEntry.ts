/** Leads from a remark to the entry that it is about. */

/** Name of an entry's row on the page. */
export const entryAnchor = (id: string): string => `entry-${id}`;

/** Brings the entry into sight and gives it the focus, so that a keyboard and a screen reader go there too. */
export function goToEntry(id: string): void {
  const row = document.getElementById(entryAnchor(id));
  row?.scrollIntoView({ block: 'center' });
  row?.focus({ preventScroll: true });
}
