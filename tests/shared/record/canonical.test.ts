import { runInNewContext } from 'node:vm';

import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { canonicalJson } from '@/shared/record/canonical';

describe('canonicalJson', () => {
  it('gives text that reads back as the same value, whatever the order of its members', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        // JSON has no minus zero.
        const clean = JSON.parse(JSON.stringify(value)) as unknown;
        const text = canonicalJson(clean);
        expect(JSON.parse(text)).toEqual(clean);
        expect(canonicalJson(JSON.parse(text))).toBe(text);
      }),
    );
  });

  it('takes a plain object of another realm, as from another window', () => {
    expect(canonicalJson(runInNewContext('({ b: [1], a: null })'))).toBe('{"a":null,"b":[1]}');
  });

  it.each([
    ['undefined', { a: [{ b: undefined }] }, '“a[0].b” is undefined.'],
    ['a hole in a list', { a: [1, , 2] }, '“a[1]” is undefined.'],
    ['a date', { at: new Date(0) }, '“at” is not plain JSON.'],
    ['a map', new Map(), 'The value is not plain JSON.'],
    ['a big integer', { n: 1n }, '“n” is not plain JSON.'],
    ['a function', { f: () => 1 }, '“f” is not plain JSON.'],
    ['an infinity', [Number.POSITIVE_INFINITY], '“[0]” is not a finite number.'],
    ['half a character in a name', { '\ud83d': 1 }, /half a character/],
  ])('refuses %s and says where', (_, value, say) => {
    expect(() => canonicalJson(value)).toThrow(say);
  });
});
