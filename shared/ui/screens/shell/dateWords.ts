/** Dates and times as the pages print them: the reader's own clock, written so that they sort and cannot be misread. */

const two = (n: number) => String(n).padStart(2, '0');

/** `2026-03-01`. */
export function dateWords(instant: string | number): string {
  const d = new Date(instant);
  return Number.isNaN(d.getTime()) ? 'no date' : `${d.getFullYear()}-${two(d.getMonth() + 1)}-${two(d.getDate())}`;
}

/** `14:05`. */
export function clockWords(instant: string | number): string {
  const d = new Date(instant);
  return Number.isNaN(d.getTime()) ? 'no time' : `${two(d.getHours())}:${two(d.getMinutes())}`;
}

/** `14:05:09`. */
export function secondsClockWords(instant: string | number): string {
  const d = new Date(instant);
  return Number.isNaN(d.getTime()) ? 'no time' : `${clockWords(instant)}:${two(d.getSeconds())}`;
}

/** `2026-03-01 14:05`. */
export function dateTimeWords(instant: string | number): string {
  return `${dateWords(instant)} ${clockWords(instant)}`;
}
