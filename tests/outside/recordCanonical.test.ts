import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { canonicalBytes, canonicalJson } from '@/shared/record/canonical';
import { sha256HexOf } from '@/shared/record/chain';

const data = (name: string): string => readFileSync(new URL(`rfc8785/${name}`, import.meta.url), 'utf8');

const doubleOf = (hex: string): number => {
  const view = new DataView(new ArrayBuffer(8));
  view.setBigUint64(0, BigInt(`0x${hex}`));
  return view.getFloat64(0);
};

describe('canonicalJson against RFC 8785', () => {
  // Inputs and outputs: the RFC author's test data (see rfc8785/README.md); hashes computed over the outputs.
  it.each([
    ['values', '2d5e01a318d0f0879ab568c4be289c8b1f64ef8921a53c6277d5e069978baacb'],
    ['arrays', '099601b171cafed97c333f8878d68e7f8c8f795412adb34b2fdcf0e7c7beac42'],
    ['structures', '605f65004ec2db7692522a0852c22f1c989e036d547e88963d1a3143cf3195d5'],
    ['french', 'd99d0ebdcb0033cb858cfa830ae46bc0fb3309413b271f1da828c89901a27ed5'],
    ['unicode', '0d99aad92a125196ff887876643fd3206786a84ddce2cee52ba4ad256d2381d3'],
    ['weird', '6af595a9aa80110b964b4de3f82a05fa6ae7423005019bacfa2620dddc4e94d1'],
  ])('writes %s byte for byte', (name, hash) => {
    const bytes = canonicalBytes(JSON.parse(data(`${name}.json`)));
    expect(Buffer.from(bytes).toString('hex')).toBe(data(`${name}.hex.txt`).replace(/\s/g, ''));
    expect(sha256HexOf(bytes)).toBe(hash);
  });

  it('sorts by UTF-16 code units, the sample of section 3.2.3', () => {
    const sample =
      '{"\\u20ac":"Euro Sign","\\r":"Carriage Return","\\ufb33":"Hebrew Letter Dalet With Dagesh","1":"One","\\ud83d\\ude00":"Emoji: Grinning Face","\\u0080":"Control","\\u00f6":"Latin Small Letter O With Diaeresis"}';
    expect(Object.values(JSON.parse(canonicalJson(JSON.parse(sample))) as object)).toEqual([
      // A reader that keeps insertion order shows the integer-like key first.
      'One',
      'Carriage Return',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ]);
    expect(canonicalJson(JSON.parse(sample)).indexOf('Carriage')).toBeLessThan(canonicalJson(JSON.parse(sample)).indexOf('One'));
  });

  // Appendix B.
  it.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['8000000000000001', '-5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['ffefffffffffffff', '-1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['c340000000000000', '-9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['44b52d02c7e14af7', '1.0000000000000001e+23'],
    ['444b1ae4d6e2ef4e', '999999999999999700000'],
    ['444b1ae4d6e2ef4f', '999999999999999900000'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555553', '333333333.3333332'],
    ['41b3de4355555554', '333333333.33333325'],
    ['41b3de4355555555', '333333333.3333333'],
    ['41b3de4355555556', '333333333.3333334'],
    ['41b3de4355555557', '333333333.33333343'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('prints the number %s as %s', (hex, text) => {
    expect(canonicalJson(doubleOf(hex))).toBe(text);
  });

  it.each(['7fffffffffffffff', '7ff0000000000000', 'fff0000000000000'])('refuses the number %s (NaN and the infinities)', (hex) => {
    expect(() => canonicalJson({ value: doubleOf(hex) })).toThrow('“value” is not a finite number.');
  });

  it('prints the first 10 000 numbers of the author’s number stream; hashes of 1 000 and 10 000 lines computed from its generator', () => {
    const fixed = data('numbers.hex.txt').trim().split('\n');
    let block = Buffer.alloc(32);
    let queue: bigint[] = [];
    const random = (): bigint => {
      if (queue.length === 0) {
        block = Buffer.from(sha256HexOf(block), 'hex');
        queue = [0, 8, 16, 24].map((at) => block.readBigUInt64LE(at));
      }
      return queue.shift() ?? 0n;
    };
    let text = '';
    const hashes: Record<number, string> = {};
    for (let line = 1; line <= 10_000; line += 1) {
      const serial = line - 1 - fixed.length;
      let bits = serial < 0 ? BigInt(`0x${fixed[line - 1] ?? '0'}`) : serial < 2000 ? 0x0010000000000000n + BigInt(serial) : random();
      let value = doubleOf(bits.toString(16));
      while (serial >= 2000 && (value === 0 || !Number.isFinite(value))) {
        bits = random();
        value = doubleOf(bits.toString(16));
      }
      text += `${bits.toString(16)},${canonicalJson(value)}\n`;
      if (line === 1000 || line === 10_000) hashes[line] = sha256HexOf(Buffer.from(text));
    }
    expect(hashes).toEqual({
      1000: 'be18b62b6f69cdab33a7e0dae0d9cfa869fda80ddc712221570f9f40a5878687',
      10000: 'b9f7a8e75ef22a835685a52ccba7f7d6bdc99e34b010992cbc5864cd12be6892',
    });
  });
});

describe('sha256HexOf', () => {
  it('hashes "abc" as FIPS 180-4’s example does', () => {
    expect(sha256HexOf(Buffer.from('abc'))).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  });
});
