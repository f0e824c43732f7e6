/** Where a person goes after signing in: back to where the session ran out, and never to another site. */

const home = '/bench';

/**
 * The address to go on at.
 * @param from what stood in the address of the sign-in page; anything that is not a plain path of this app leads home
 */
export function returnPath(from: string | string[] | undefined): string {
  if (typeof from !== 'string' || !/^\/(?![/\\])/.test(from)) return home;
  // control characters and backslashes are read by browsers in ways of their own
  if (/[\u0000-\u001f\\]/.test(from) || /^\/sign-in(\W|$)/.test(from)) return home;
  return from === '/' ? home : from;
}
