import { createHash } from 'node:crypto';

import { describe, expect, it } from 'vitest';

import { canonicalJson } from '@/shared/record/canonical';
import { hashEntry } from '@/shared/record/chain';
import { exportBytes, readExport } from '@/shared/record/exportFormat';
import { sampleExport } from '@/tests/shared/record/sampleExport';

const fileOf = (payload: string | Uint8Array): string =>
  JSON.stringify({ payload: Buffer.from(payload).toString('base64url'), protected: 'eyJhbGciOiJFZERTQSJ9', signature: 'AA' });

describe('readExport', () => {
  it('gives back what was exported, with the hash of the exact bytes', () => {
    const exported = sampleExport();
    const bytes = exportBytes(exported);
    const read = readExport(fileOf(bytes));
    expect(read).toMatchObject({ ok: true, record: exported.record, entries: exported.entries, chain: { ok: true, count: 5 } });
    expect(read.ok && read.sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
  });

  it('names the entry that was changed before export', () => {
    const exported = sampleExport();
    const [first, second] = exported.entries;
    if (first === undefined || second === undefined) throw new Error('no entries');
    const changed = { ...exported, entries: exported.entries.with(1, { ...second, body: { step: 's-9' } }) };
    expect(readExport(fileOf(exportBytes(changed)))).toMatchObject({ ok: true, chain: { ok: false, seq: 2, entryId: second.id } });
  });

  it('sees a tail that was cut off, and a run that is another one', () => {
    const exported = sampleExport();
    const cut = { ...exported, entries: exported.entries.slice(0, -1) };
    expect(readExport(fileOf(exportBytes(cut)))).toMatchObject({ ok: true, chain: { ok: false, fault: 'missing', seq: 5 } });
    const other = { ...exported, record: { ...exported.record, run: '0b1d4c55-3f0e-4f8a-9a6e-2f8f5d3b7c11' } };
    expect(readExport(fileOf(exportBytes(other)))).toMatchObject({ ok: true, chain: { ok: false, fault: 'foreign', seq: 1 } });
  });

  it('says what is wrong with a file that it cannot read', () => {
    const exported = sampleExport();
    const text = canonicalJson(exported);
    const cases: readonly (readonly [string, RegExp])[] = [
      ['nothing', /not JSON/],
      ['[]', /payload, protected and signature/],
      ['{"payload":"AA"}', /payload, protected and signature/],
      [JSON.stringify({ payload: '***', protected: 'AA', signature: 'AA' }), /damaged/],
      [fileOf(new Uint8Array([0xff, 0xfe])), /damaged/],
      [fileOf('{"format":2}'), /format 1: “format”/],
      [fileOf(text.replace('"seq":3', '"seq":"3"')), /“entries\.2\.seq”/],
      [fileOf(` ${text}`), /canonical form/],
      [fileOf(text.replace('"format":1', '"format":1,"format":1')), /canonical form/],
    ];
    for (const [file, say] of cases) {
      const read = readExport(file);
      expect(read.ok ? '' : read.say).toMatch(say);
    }
  });

  it('hashes an entry without its hash only', () => {
    const [first] = sampleExport().entries;
    if (first === undefined) throw new Error('no entries');
    const { hash, ...content } = first;
    expect(createHash('sha256').update(canonicalJson(content)).digest('hex')).toBe(hash);
    expect(hashEntry(content)).toBe(hash);
  });
});
