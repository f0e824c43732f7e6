import { describe, expect, it } from 'vitest';

import { exceptionsOf } from '@/shared/ui/screens/records/exceptionsOf';
import { replayRecord } from '@/shared/ui/screens/records/replayRecord';
import { goodRun, RecordedBench, tester } from '@/tests/shared/ui/screens/sampleRecord';

function told(bench: RecordedBench, instruments = [tester]) {
  const record = bench.record();
  const replay = replayRecord(record);
  expect(replay.broken).toBeNull();
  return exceptionsOf(replay.entries, instruments, record.settings);
}

const upToEarth = (bench = new RecordedBench()) => bench.pass().answer('sound').dead();

describe('exceptionsOf', () => {
  it('finds nothing in a run that went well and took its time', () => {
    expect(told(goodRun())).toEqual([]);
  });

  it('tells a reading out of its limit by how far it lies outside, and leads to its entry', () => {
    const bench = upToEarth();
    bench.pass({ earth: 0.4 });
    const [first] = told(bench);
    expect(first).toMatchObject({
      kind: 'out',
      title: expect.stringContaining('Earth pin') as string,
      detail: expect.stringContaining('250 mΩ outside its limit') as string,
    });
    expect(bench.entries.find((e) => e.id === first?.entry)?.kind).toBe('reading');
  });

  it('tells a reading that is in but inside the guard band, with what the meter can be off', () => {
    const bench = upToEarth();
    bench.pass({ earth: 0.1496 });
    expect(told(bench)[0]).toMatchObject({
      kind: 'close',
      title: expect.stringContaining('in, but close') as string,
      detail: expect.stringContaining('meter ± 1 mΩ') as string,
    });
  });

  it('tells a doubt with the row that it was about', () => {
    const bench = upToEarth();
    bench.pass({ earth: 'not-sure' });
    expect(told(bench)).toMatchObject([
      { kind: 'unsure', title: 'Answered “not sure”', detail: expect.stringContaining('Earth pin') as string },
    ]);
  });

  it('puts Stop before everything else', () => {
    const bench = upToEarth();
    bench.pass({ earth: 0.4 });
    bench.do({ type: 'STOP' });
    const kinds = told(bench).map((e) => e.kind);
    expect(kinds[0]).toBe('stopped');
    expect(kinds).toContain('out');
  });

  it('tells a refused countersign with its reason', () => {
    const bench = upToEarth().pass().pass().dead();
    bench
      .do({ type: 'WARNING_READ', step: 'lamp' })
      .do({ type: 'HOLD_ASKED', step: 'lamp' })
      .do({ type: 'HOLD_REFUSED', step: 'lamp', by: 'sam', reason: 'fit the fan first' });
    expect(told(bench)).toContainEqual(expect.objectContaining({ kind: 'hold-refused', detail: '“fit the fan first”' }));
  });

  it('tells what a page that was loaded anew took back', () => {
    const bench = upToEarth();
    bench.boot = 'boot-2';
    bench.do({ type: 'RESTART' });
    expect(told(bench)).toContainEqual(expect.objectContaining({ kind: 'lapsed', title: 'The page was loaded anew' }));
  });

  it('tells answers that came sooner than the act can be done once a step, with their number', () => {
    const bench = new RecordedBench();
    bench.paceMs = -600;
    bench.pass();
    const hurried = told(bench).filter((e) => e.kind === 'hurried');
    expect(hurried).toHaveLength(1);
    expect(hurried[0]?.title).toMatch(/^\d+ answers in a hurry$/);
    expect(hurried[0]?.detail).toContain('0.4 s after the one before');
  });

  it('names an instrument that was out of date on the day of the reading', () => {
    const bench = upToEarth();
    const late = told(bench, [{ ...tester, calibratedUntil: '2026-01-04' }]);
    expect(late).toMatchObject([
      {
        kind: 'instrument',
        title: 'Two-pole tester was out of date',
        detail: expect.stringMatching(/calibrated until 2026-01-04; \d+ readings/) as string,
      },
    ]);
    expect(told(bench, [{ ...tester, calibratedUntil: '2026-01-05' }])).toEqual([]);
  });
});
