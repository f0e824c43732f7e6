/** Which radio a key leads to, after the pattern of the WAI-ARIA Authoring Practices. */

/** Index of the next radio, or null when the key is not one of the group's; `at` is -1 with none chosen. */
export function choiceKey(key: string, at: number, count: number): number | null {
  if (count === 0) return null;
  if (key === 'ArrowDown' || key === 'ArrowRight') return (at + 1) % count;
  if (key === 'ArrowUp' || key === 'ArrowLeft') return at <= 0 ? count - 1 : at - 1;
  return null;
}
