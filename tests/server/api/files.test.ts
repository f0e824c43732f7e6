/** Photos and papers: what is kept of them, who sees them, and what is refused. */
import { createHash, randomBytes } from 'node:crypto';
import { request } from 'node:http';
import { deflateRawSync, deflateSync } from 'node:zlib';

import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { FILE_LIMIT_BYTES } from '@/shared/contract/files';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { makeWorkshop } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openObjectStore } from '@/tests/setup/objectStore';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
const picture = (width = 64, height = 48) => sharp({ create: { width, height, channels: 3, background: '#b87333' } });

describe('files', () => {
  let server: TestServer;
  let store: Awaited<ReturnType<typeof openObjectStore>>;
  let here: TestWorkshop;
  let there: TestWorkshop;
  let device: BenchDevice;
  let restorer: HttpClient;
  let senior: HttpClient;
  let plain: Buffer;

  beforeAll(async () => {
    store = await openObjectStore();
    server = await openServer({ objectStore: store.config });
    [here, there] = [await makeWorkshop(server.database.ownerUrl), await makeWorkshop(server.database.ownerUrl)];
    restorer = await server.as(here.restorer);
    senior = await server.as(here.senior);
    device = await BenchDevice.start(restorer, server, { machine: here.machine }, here.instruments.tester);
    plain = await picture().jpeg().toBuffer();
  });
  afterAll(async () => {
    await server.stop();
    await store.stop();
  });

  const hashOf = (answer: { status: number; body: Record<string, unknown>; text: string }): string => {
    expect(answer.status, answer.text).toBe(201);
    return String(answer.body['hash']);
  };
  const refused = (answer: { status: number; body: Record<string, unknown>; text: string }, status: number, code: string, say?: RegExp) => {
    expect([answer.status, answer.body['code']], answer.text).toEqual([status, code]);
    if (say !== undefined) expect(answer.body['say']).toMatch(say);
  };

  it('keeps a plain JPEG byte for byte, so that a device knows its hash before it is sent; twice is once', async () => {
    const first = await restorer.upload(`/api/files?run=${device.run}`, plain);
    expect(first.body).toEqual({ hash: sha256(plain), media: 'image/jpeg', bytes: plain.length, width: 64, height: 48 });
    const again = await restorer.upload(`/api/files?run=${device.run}`, plain);
    expect(again.body).toEqual(first.body);
    expect(await server.query(`select 1 from file_uses where hash = $1`, [sha256(plain)])).toHaveLength(1);
    const seen = await restorer.get(`/api/files/${sha256(plain)}`);
    expect(sha256(seen.bytes)).toBe(sha256(plain));
  });

  it('turns upright, shrinks and strips everything but the picture', async () => {
    const sent = await picture(4000, 2000)
      .withMetadata({ orientation: 6 })
      .withExifMerge({ IFD0: { ImageDescription: 'secret words' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } })
      .jpeg()
      .toBuffer();
    expect((await sharp(sent).metadata()).exif).toBeDefined();
    const answer = await restorer.upload(`/api/files?run=${device.run}`, sent);
    expect(answer.body).toMatchObject({ width: 1500, height: 3000 });
    const { bytes } = await restorer.get(`/api/files/${hashOf(answer)}`);
    const kept = await sharp(bytes).metadata();
    expect([kept.format, kept.exif, kept.icc, kept.xmp, kept.orientation]).toEqual(['jpeg', undefined, undefined, undefined, undefined]);
    expect(Buffer.from(bytes).includes('secret words')).toBe(false);
    const small = await restorer.get(`/api/files/${hashOf(answer)}?size=small`);
    const shrunk = await sharp(small.bytes).metadata();
    expect(Math.max(shrunk.width, shrunk.height)).toBe(480);
  });

  it('takes PNG and WebP, whatever they are called', async () => {
    for (const bytes of [await picture(30, 20).png().toBuffer(), await picture(31, 20).webp().toBuffer()]) {
      const hash = hashOf(await senior.upload('/api/files', bytes, 'x.exe'));
      const { headers } = await senior.get(`/api/files/${hash}`);
      expect(headers.get('content-type')).toBe('image/jpeg');
    }
  });

  it('is served to this reader’s cache alone, with an ETag, by ranges, and runs nothing', async () => {
    const path = `/api/files/${hashOf(await senior.upload('/api/files', plain))}`;
    const whole = await senior.get(path);
    expect(whole.headers.get('cache-control')).toBe('private, max-age=31536000, immutable');
    expect(whole.headers.get('content-security-policy')).toContain("default-src 'none'");
    expect(whole.headers.get('x-content-type-options')).toBe('nosniff');
    const etag = whole.headers.get('etag') ?? '';
    const known = await senior.get(path, { headers: { 'if-none-match': etag } });
    expect([known.status, known.bytes.length]).toEqual([304, 0]);
    const part = await senior.get(path, { headers: { range: 'bytes=10-19' } });
    expect([part.status, part.headers.get('content-range')]).toEqual([206, `bytes 10-19/${String(plain.length)}`]);
    expect(Buffer.from(part.bytes)).toEqual(plain.subarray(10, 20));
    const tail = await senior.get(path, { headers: { range: 'bytes=-5', 'if-range': etag } });
    expect(Buffer.from(tail.bytes)).toEqual(plain.subarray(-5));
    expect((await senior.get(path, { headers: { range: 'bytes=0-4', 'if-range': '"other"' } })).status).toBe(200);
    const beyond = await senior.get(path, { headers: { range: 'bytes=999999999-' } });
    refused(beyond, 416, 'bad-range');
    expect(beyond.headers.get('content-range')).toBe(`bytes */${String(plain.length)}`);
  });

  it('shows a photo of a run to those who may read that run, and to nobody of another workshop', async () => {
    const own = await picture(50, 40).jpeg().toBuffer();
    const path = `/api/files/${hashOf(await restorer.upload(`/api/files?run=${device.run}`, own))}`;
    for (const person of [here.senior, here.reviewer, here.keeper, here.reviewer2]) expect((await (await server.as(person)).get(path)).status).toBe(200);
    refused(await (await server.as(here.restorer2)).get(path), 404, 'not-found');
    refused(await (await server.as(there.keeper)).get(path), 404, 'not-found');
    refused(await server.stranger().get(path), 401, 'signed-out');
  });

  it('is added to a run by its restorer while it is open, and to the workshop by a senior or a keeper', async () => {
    refused(await (await server.as(here.restorer2)).upload(`/api/files?run=${device.run}`, plain), 403, 'not-your-run');
    refused(await senior.upload(`/api/files?run=${device.run}`, plain), 403, 'not-your-run');
    refused(await (await server.as(there.restorer)).upload(`/api/files?run=${device.run}`, plain), 404, 'not-found');
    refused(await restorer.upload('/api/files', plain), 403, 'role-missing');
    refused(await (await server.as(here.reviewer)).upload('/api/files', plain), 403, 'role-missing');
    refused(await server.stranger().upload('/api/files', plain), 401, 'signed-out');
    hashOf(await (await server.as(here.keeper)).upload('/api/files', plain));
    const machine = { machine: here.machine };
    await device.pass().do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();
    refused(await restorer.upload(`/api/files?run=${device.run}`, plain), 409, 'wrong-state');
    device = await BenchDevice.start(restorer, server, machine, here.instruments.tester);
  });

  it('refuses an entry whose photo has not come', async () => {
    const photo = sha256(randomBytes(8));
    const entry = { id: '01900000-0000-7000-8000-000000000001', seq: device.seq + 1, event: { ...device.stamp({ type: 'PHOTO', step: 'x', photo }) } };
    refused(await restorer.post(`/api/runs/${device.run}/entries`, { entries: [entry] }), 409, 'photo-missing');
    // one that was sent for another run does not count
    const elsewhere = hashOf(await senior.upload('/api/files', await picture(70, 30).jpeg().toBuffer()));
    refused(await restorer.post(`/api/runs/${device.run}/entries`, { entries: [{ ...entry, event: { ...entry.event, photo: elsewhere } }] }), 409, 'photo-missing');
  });

  it('keeps a PDF as a paper only, and serves it to be saved and not shown', async () => {
    const pdf = Buffer.from('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n');
    refused(await senior.upload('/api/files', pdf), 422, 'bad-file', /PDF/);
    refused(await senior.upload('/api/files?as=paper', pdf.subarray(0, 30)), 422, 'bad-file', /not whole/);
    const { headers } = await senior.get(`/api/files/${hashOf(await senior.upload('/api/files?as=paper', pdf))}`);
    expect(headers.get('content-disposition')).toMatch(/^attachment/);
  });

  describe('hostile', () => {
    const send = (bytes: Uint8Array, name?: string) => senior.upload('/api/files', bytes, name);

    it('two kinds in one file: what is kept holds the picture alone', async () => {
      const page = Buffer.from('<html><script>alert(1)</script></html>');
      const hash = hashOf(await send(Buffer.concat([plain, page]), 'page.html'));
      const { bytes, headers } = await senior.get(`/api/files/${hash}`);
      expect(Buffer.from(bytes).includes('script')).toBe(false);
      expect(headers.get('content-type')).toBe('image/jpeg');
    });

    it('a picture that unpacks to more than a machine holds', async () => {
      const bomb = bigPng(30_000, 30_000);
      expect(bomb.length).toBeLessThan(2_000_000);
      refused(await send(bomb), 422, 'bad-file', /million pixels/);
    });

    it('a drawing with a script, a zip, a text, nothing at all, random bytes under a picture’s name', async () => {
      const zip = Buffer.concat([Buffer.from('PK\x03\x04', 'latin1'), deflateRawSync(Buffer.alloc(1000))]);
      for (const bytes of [Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>'), zip, Buffer.from('photo.jpg'), randomBytes(5000)]) {
        refused(await send(bytes, 'photo.jpg'), 422, 'bad-file');
      }
      refused(await send(Buffer.alloc(0)), 422, 'bad-input', /No file came/);
    });

    it('a HEIC photo is refused with what to do', async () => {
      const heic = Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic'), Buffer.alloc(200)]);
      refused(await send(heic, 'IMG_1.HEIC'), 422, 'bad-file', /JPEG/);
    });

    it('a picture that breaks off, or is damaged inside', async () => {
      const large = await sharp(randomBytes(300 * 200 * 3), { raw: { width: 300, height: 200, channels: 3 } }).png().toBuffer();
      refused(await send(large.subarray(0, large.length / 2)), 422, 'bad-file', /cannot be read/);
      refused(await send(plain.subarray(0, plain.length - 40)), 422, 'bad-file', /cannot be read/);
    });

    it.each([
      ['of a folder above', '../../etc/passwd'],
      ['of a drive', '..\\..\\boot.ini'],
      ['of a device', '/dev/sda'],
      ['with a zero in it', 'a\0b.jpg'],
      ['of 3000 letters', `${'x'.repeat(3000)}.jpg`],
      ['of another alphabet', 'schön 😀.jpg'],
    ])('a name %s is never a path', async (_, name) => {
      expect([201, 422]).toContain((await send(plain, name)).status);
      expect((await senior.get('/healthz')).status).toBe(200);
    });

    it('more than one file, another field, no form', async () => {
      refused(await senior.upload('/api/files', plain, 'x.jpg', 'other'), 422, 'bad-input');
      const two = new FormData();
      for (const name of ['a', 'b']) two.append('file', new Blob([Uint8Array.from(plain)]), name);
      refused(await senior.post('/api/files', undefined, { raw: two }), 422, 'bad-input');
      refused(await senior.post('/api/files', undefined, { raw: '{}' }), 422, 'bad-input');
      refused(await senior.post('/api/files', undefined, { raw: '--x\r\nbroken', headers: { 'content-type': 'multipart/form-data; boundary=x' } }), 422, 'bad-input');
      refused(await senior.post('/api/files?as=song', undefined, { raw: two }), 422, 'bad-input');
    });

    it('200 megabytes, whether announced or not', async () => {
      refused(await send(Buffer.alloc(FILE_LIMIT_BYTES + 1, 0xff)), 413, 'too-large', /25 megabytes/);
      expect(await announce(server.url, [...senior.cookies].map(([k, v]) => `${k}=${v}`).join('; '), 200_000_000)).toBe(413);
      expect((await senior.get('/healthz')).status).toBe(200);
    });
  });
});

/** A PNG of one colour: some kilobytes that unpack to `width` × `height` pixels. */
function bigPng(width: number, height: number): Buffer {
  const chunk = (type: string, data: Buffer) => {
    const body = Buffer.concat([Buffer.from(type), data]);
    const crc = Buffer.alloc(4);
    crc.writeUInt32BE(crc32(body));
    const length = Buffer.alloc(4);
    length.writeUInt32BE(data.length);
    return Buffer.concat([length, body, crc]);
  };
  const head = Buffer.alloc(13);
  head.writeUInt32BE(width, 0);
  head.writeUInt32BE(height, 4);
  head.set([1, 0, 0, 0, 0], 8);
  return Buffer.concat([Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'), chunk('IHDR', head), chunk('IDAT', deflateSync(Buffer.alloc((width / 8 + 1) * height))), chunk('IEND', Buffer.alloc(0))]);
}

function crc32(bytes: Buffer): number {
  let crc = 0xffffffff;
  for (const byte of bytes) {
    crc ^= byte;
    for (let i = 0; i < 8; i += 1) crc = (crc >>> 1) ^ (crc & 1 ? 0xedb88320 : 0);
  }
  return (crc ^ 0xffffffff) >>> 0;
}

/** Announces a body of `length` bytes and sends only its beginning; resolves to the status of the answer. */
function announce(url: string, cookie: string, length: number): Promise<number> {
  return new Promise((resolve, reject) => {
    const sent = request(`${url}/api/files`, { method: 'POST', headers: { cookie, 'content-length': length, 'content-type': 'multipart/form-data; boundary=x' } }, (answer) => {
      answer.resume();
      resolve(answer.statusCode ?? 0);
      sent.destroy();
    });
    sent.on('error', reject);
    sent.write('--x\r\nContent-Disposition: form-data; name="file"; filename="x"\r\n\r\n');
  });
}
