import * as fc from 'fast-check';
import { v7 } from 'uuid';
import { describe, expect, it } from 'vitest';

import { GENESIS, hashEntry, sealEntry, verifyChain } from '@/shared/record/chain';
import type { EntryKind, RecordEntry } from '@/shared/record/recordEntry';
import { draftEntrySchema, recordEntrySchema } from '@/shared/record/recordEntry';

const RUN = '3f0e4f8a-0b1d-4c55-9a6e-2f8f5d3b7c11';
const KINDS: readonly EntryKind[] = ['opened', 'warning-read', 'isolated', 'reading', 'energised', 'reading', 'stopped', 'closed'];

function record(count = KINDS.length, run = RUN): RecordEntry[] {
  const entries: RecordEntry[] = [];
  for (let seq = 1; seq <= count; seq += 1) {
    const draft = draftEntrySchema.parse({
      id: v7({ msecs: 1_700_000_000_000 + seq * 1000 }),
      run,
      seq,
      at: new Date(1_700_000_000_000 + seq * 1000).toISOString(),
      monotonic: seq * 1000,
      actor: 'member-7',
      kind: KINDS[(seq - 1) % KINDS.length],
      body: { step: `s-${seq}`, reading: { value: 4.97, unit: 'V' }, seen: [true, null, 'μΩ'] },
    });
    entries.push(sealEntry(draft, new Date(1_700_000_000_500 + seq * 1000).toISOString(), entries.at(-1)?.hash ?? GENESIS));
  }
  return entries;
}

/** A tampered record has entries that no schema would make. */
const tampered = (entries: readonly unknown[]): readonly RecordEntry[] => entries as readonly RecordEntry[];
const rehash = (entry: RecordEntry): RecordEntry => ({ ...entry, hash: hashEntry(entry) });

describe('verifyChain', () => {
  const whole = record();

  it('gives the head of a whole record, and GENESIS for an empty one', () => {
    expect(verifyChain(whole)).toEqual({ ok: true, head: whole.at(-1)?.hash, count: 8 });
    expect(verifyChain([])).toEqual({ ok: true, head: GENESIS, count: 0 });
    for (const entry of whole) expect(recordEntrySchema.parse(entry)).toEqual(entry);
  });

  it('survives a store that sorts keys differently', () => {
    const shuffled = whole.map((entry) => JSON.parse(JSON.stringify(Object.fromEntries(Object.entries(entry).reverse()))) as RecordEntry);
    expect(verifyChain(shuffled)).toMatchObject({ ok: true });
  });

  const fields = Object.keys(record(1)[0] ?? {}) as (keyof RecordEntry)[];
  it.each(fields)('finds and names any entry whose %s was changed, taken out or given another type', (field) => {
    for (const [at, entry] of whole.entries()) {
      const others: readonly unknown[] = [
        typeof entry[field] === 'number'
          ? Number(entry[field]) + 1
          : typeof entry[field] === 'string'
            ? `${entry[field]}0`
            : { step: 's-0' },
        null,
        undefined,
        Number.NaN,
      ];
      for (const other of others) {
        const verdict = verifyChain(tampered(whole.with(at, { ...entry, [field]: other } as RecordEntry)));
        expect(verdict).toMatchObject({ ok: false, fault: 'altered' });
        if (verdict.ok) continue;
        if (field !== 'id') expect(verdict.entryId).toBe(entry.id);
        if (field !== 'seq') expect(verdict.seq).toBe(entry.seq);
        expect(verdict.what).toMatch(/was altered/);
      }
    }
  });

  it('finds any change inside a body, however deep', () => {
    fc.assert(
      fc.property(fc.nat({ max: 7 }), fc.double({ noNaN: true, noDefaultInfinity: true }), (at, value) => {
        const entry = whole[at];
        if (entry === undefined || value === 4.97) return;
        const changed = { ...entry, body: { ...entry.body, reading: { value, unit: 'V' } } };
        expect(verifyChain(whole.with(at, changed))).toMatchObject({ ok: false, fault: 'altered', seq: at + 1, entryId: entry.id });
      }),
    );
  });

  it('finds an added member', () => {
    const [first] = whole;
    expect(verifyChain(tampered([{ ...first, note: 'x' }, ...whole.slice(1)]))).toMatchObject({ ok: false, fault: 'altered', seq: 1 });
  });

  it('finds an entry that was altered and hashed anew', () => {
    const entry = whole[3];
    if (entry === undefined) throw new Error('no entry');
    const verdict = verifyChain(whole.with(3, rehash({ ...entry, body: { ...entry.body, reading: { value: 5.01, unit: 'V' } } })));
    expect(verdict).toMatchObject({ ok: false, fault: 'altered', seq: 4, entryId: entry.id });
    expect(verdict.ok ? '' : verdict.what).toMatch(/not the one that entry 5 was chained to/);
  });

  it('finds the last entry altered and hashed anew when the head is known', () => {
    const last = whole.at(-1);
    if (last === undefined) throw new Error('no entry');
    const forged = whole.with(-1, rehash({ ...last, body: {} }));
    expect(verifyChain(forged)).toMatchObject({ ok: true });
    expect(verifyChain(forged, { head: last.hash, count: 8 })).toMatchObject({ ok: false, fault: 'altered', seq: 8, entryId: last.id });
  });

  it('finds any one entry missing and says which', () => {
    for (let at = 0; at < whole.length; at += 1) {
      const verdict = verifyChain(whole.toSpliced(at, 1), { count: 8 });
      expect(verdict).toMatchObject({ ok: false, fault: 'missing', seq: at + 1 });
    }
  });

  it('finds any two entries changed over', () => {
    fc.assert(
      fc.property(fc.nat({ max: 7 }), fc.nat({ max: 7 }), (a, b) => {
        const [one, two] = [whole[a], whole[b]];
        if (a === b || one === undefined || two === undefined) return;
        const verdict = verifyChain(whole.with(a, two).with(b, one));
        expect(verdict).toMatchObject({ ok: false, fault: 'reordered', entryId: whole[Math.max(a, b)]?.id });
      }),
    );
  });

  it('finds any entry that stands twice', () => {
    for (const [at, entry] of whole.entries()) {
      expect(verifyChain(whole.toSpliced(at, 0, entry))).toMatchObject({ ok: false, fault: 'duplicated', seq: at + 1, entryId: entry.id });
    }
  });

  it('finds an entry put in with a good hash and link, and names the one that was put in', () => {
    for (let at = 1; at < whole.length; at += 1) {
      const [before, twin] = [whole[at - 1], whole[at]];
      if (before === undefined || twin === undefined) throw new Error('no entry');
      const intruder = rehash({ ...twin, id: v7(), body: { step: 'forged' }, prev: before.hash });
      const verdict = verifyChain(whole.toSpliced(at, 0, intruder));
      expect(verdict).toMatchObject({ ok: false, fault: 'inserted', seq: at + 1 });
      // Without a next entry nothing says which of the two is the true one.
      if (!verdict.ok && at < whole.length - 1) expect(verdict.entryId).toBe(intruder.id);
    }
  });

  it('finds an entry of another run', () => {
    const other = record(1, '0b1d4c55-3f0e-4f8a-9a6e-2f8f5d3b7c11');
    expect(verifyChain([...whole, ...other])).toMatchObject({ ok: false, fault: 'foreign' });
  });

  it('checks a record of two thousand entries', () => {
    const long = record(2000);
    expect(verifyChain(long)).toMatchObject({ ok: true, count: 2000 });
    expect(verifyChain([...long, long[5] as RecordEntry])).toMatchObject({ ok: false, fault: 'duplicated', seq: 6 });
  });

  it('finds an entry with a new number that carries an old id', () => {
    const [first] = whole;
    const last = whole.at(-1);
    if (first === undefined || last === undefined) throw new Error('no entry');
    expect(verifyChain([...whole, rehash({ ...last, id: first.id, seq: 9, prev: last.hash })])).toMatchObject({
      fault: 'duplicated',
      seq: 9,
    });
  });

  it('counts more entries than there should be', () => {
    expect(verifyChain(whole, { count: 7 })).toMatchObject({ ok: false, fault: 'inserted', seq: 8 });
  });
});
