/** Examples of RFC 9110 section 14.1.2, for a content of 10 000 bytes. */
import { describe, expect, it } from 'vitest';

import { byteRange } from '@/server/files/byteRange';

describe('byteRange', () => {
  it.each([
    ['bytes=0-499', { from: 0, to: 499 }],
    ['bytes=500-999', { from: 500, to: 999 }],
    ['bytes=-500', { from: 9500, to: 9999 }],
    ['bytes=9500-', { from: 9500, to: 9999 }],
    ['bytes=9000-20000', { from: 9000, to: 9999 }],
    ['bytes=-20000', { from: 0, to: 9999 }],
  ])('%s', (header, range) => {
    expect(byteRange(header, 10_000)).toEqual(range);
  });

  it.each([undefined, '', 'bytes=', 'bytes=-', 'bytes=0-1,5-6', 'items=0-1', 'bytes=5-4', 'bytes=a-b'])('gives the whole for %s', (header) => {
    expect(byteRange(header, 10_000)).toBeNull();
  });

  it.each(['bytes=10000-', 'bytes=10000-10001', 'bytes=-0'])('has nothing for %s', (header) => {
    expect(byteRange(header, 10_000)).toBe('none');
  });
});
