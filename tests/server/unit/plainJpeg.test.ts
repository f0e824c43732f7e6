/** What a device sends and what the server keeps byte for byte must be the same thing. */
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';

import { isPlainJpeg } from '@/server/files/isPlainJpeg';
import { plainJpeg } from '@/shared/ui/screens/run/plainJpeg';

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
