/** What a device sends and what the server keeps byte for byte must be the same thing. */
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';

import { isPlainJpeg, plainJpeg } from '@/shared/contract/plainJpeg';

const picture = () => sharp({ create: { width: 80, height: 50, channels: 3, background: '#4060a0' } });

describe('plainJpeg', () => {
  it.each([
    ['with a position and a camera', () => picture().withExif({ IFD0: { Model: 'X' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } }).jpeg().toBuffer()],
    ['with a colour profile', () => picture().withIccProfile('srgb').jpeg().toBuffer()],
    ['progressive, with XMP', () => picture().withXmp('<x:xmpmeta xmlns:x="adobe:ns:meta/"/>').jpeg({ progressive: true }).toBuffer()],
    ['plain already', () => picture().jpeg().toBuffer()],
  ])('leaves of a picture %s what the server takes as it is, and the same picture', async (_, make) => {
    const sent = await make();
    const plain = plainJpeg(sent);
    if (plain === null) throw new Error('no JPEG');
    expect(isPlainJpeg(Buffer.from(plain))).toBe(true);
    expect(await sharp(plain).raw().toBuffer()).toEqual(await sharp(sent).raw().toBuffer());
    expect(plainJpeg(plain)).toEqual(plain);
  });

  it('knows what is none', async () => {
    const jpeg = await picture().jpeg().toBuffer();
    for (const bytes of [new Uint8Array(), new Uint8Array([0xff, 0xd8]), jpeg.subarray(0, 40), await picture().png().toBuffer(), Buffer.alloc(100, 0xff)]) expect(plainJpeg(bytes)).toBeNull();
  });
});

describe('isPlainJpeg', () => {
  let plain: Buffer;
  let withPosition: Buffer;

  beforeAll(async () => {
    plain = await picture().jpeg().toBuffer();
    withPosition = await picture().withExif({ IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } }).jpeg().toBuffer();
  });

  it('takes a picture and nothing else, baseline or progressive, with restart markers or not', async () => {
    expect(isPlainJpeg(plain)).toBe(true);
    expect(isPlainJpeg(await picture().jpeg({ progressive: true }).toBuffer())).toBe(true);
  });

  it('refuses Exif, a comment, a colour profile, and bytes after the end', async () => {
    expect(isPlainJpeg(withPosition)).toBe(false);
    expect(isPlainJpeg(await picture().withIccProfile('p3').jpeg().toBuffer())).toBe(false);
    expect(isPlainJpeg(Buffer.concat([plain, Buffer.from('<script>')]))).toBe(false);
    expect(isPlainJpeg(Buffer.concat([plain, plain]))).toBe(false);
    const comment = Buffer.from([0xff, 0xfe, 0x00, 0x06, 0x68, 0x69, 0x21, 0x21]);
    expect(isPlainJpeg(Buffer.concat([plain.subarray(0, 2), comment, plain.subarray(2)]))).toBe(false);
  });

  it('refuses what ends too early or is no JPEG at all', () => {
    for (const length of [0, 1, 3, 20, plain.length - 2, plain.length - 1]) expect(isPlainJpeg(plain.subarray(0, length)), String(length)).toBe(false);
    expect(isPlainJpeg(Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'))).toBe(false);
    expect(isPlainJpeg(Buffer.alloc(1000, 0xff))).toBe(false);
  });
});
