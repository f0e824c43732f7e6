import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';

import { isPlainJpeg } from '@/server/files/isPlainJpeg';

describe('isPlainJpeg', () => {
  let plain: Buffer;
  let withPosition: Buffer;
  const picture = () => sharp({ create: { width: 60, height: 40, channels: 3, background: '#c08040' } });

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
