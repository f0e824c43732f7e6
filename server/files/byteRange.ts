/** The one byte range of a request, by RFC 9110 section 14. */
import type { ByteRange } from '../adapters/objectStore';

/**
 * The range that `header` asks of `length` bytes: null for the whole (no header, another unit, or more than one range, which a server
 * may answer in full), `none` when no byte of it is there.
 */
export function byteRange(header: string | undefined, length: number): ByteRange | null | 'none' {
  const found = /^bytes=(\d{0,15})-(\d{0,15})$/.exec(header?.trim() ?? '');
  if (found === null) return null;
  const [, first = '', last = ''] = found;
  if (first === '' && last === '') return null;
  if (first === '') return Number(last) === 0 ? 'none' : { from: Math.max(0, length - Number(last)), to: length - 1 };
  const from = Number(first);
  const to = last === '' ? length - 1 : Math.min(Number(last), length - 1);
  if (last !== '' && Number(last) < from) return null;
  return from >= length ? 'none' : { from, to };
}
