import { describe, expect, it } from 'vitest';

import { noteWords } from '@/shared/ui/screens/records/noteWords';
import { entryWords } from '@/shared/ui/screens/records/entryWords';
import { exceptionsOf } from '@/shared/ui/screens/records/exceptionsOf';
import { replayRecord } from '@/shared/ui/screens/records/replayRecord';
import { timelineOf } from '@/shared/ui/screens/records/timelineOf';
import { RecordedBench } from '@/tests/shared/ui/screens/sampleRecord';

const stamp = { type: 'NOTE', at: 0, monotonic: 0, boot: 'b' } as const;
const inputs = { nominalVolts: 5, tolerancePercent: 5 };
const headline = '4.75 V to 5.25 V.';

describe('noted workings in a record', () => {
  it('stand at the step at which they were noted, with their inputs', () => {
    const bench = new RecordedBench();
    bench.pass().do({ type: 'NOTE', sheet: 'rail-limits', inputs, headline });
    const record = bench.record();
    const { entries, broken } = replayRecord(record);
    expect(broken).toBeNull();
    const last = timelineOf(entries).at(-1);
    expect(last?.title).toBe('Look it over');
    const replayed = last?.entries.at(-1);
    if (replayed === undefined) throw new Error('the note is not there');
    expect(entryWords(replayed, { entries: record.entries, readings: new Map(), instruments: [] })).toEqual({
      what: 'Workings, Rail limits: 4.75 V to 5.25 V.',
      detail: 'from Nominal volts 5 V, Tolerance 5 %. Worked out again: the same.',
    });
  });

  it('are worked out again: a headline that the sheet does not give is told', () => {
    const told = noteWords({ ...stamp, sheet: 'rail-limits', inputs, headline: '4 V to 6 V.' });
    expect(told.detail).toContain('Worked out again, the sheet says: 4.75 V to 5.25 V.');
    expect(noteWords({ ...stamp, sheet: 'rail-limits', inputs: { nominalVolts: 5 }, headline }).detail).toContain(
      'does not take these inputs',
    );
    expect(noteWords({ ...stamp, sheet: 'no-such', inputs, headline }).detail).toContain('no such sheet');
  });

  it('are not taken for an answer given in a hurry', () => {
    const bench = new RecordedBench();
    bench.pass();
    bench.at -= 900;
    bench.do({ type: 'NOTE', sheet: 'rail-limits', inputs, headline });
    const record = bench.record();
    const hurried = exceptionsOf(replayRecord(record).entries, [], record.settings).filter((e) => e.kind === 'hurried');
    expect(hurried).toEqual([]);
  });
});
