import { describe, expect, it } from 'vitest';

import { powerSegments } from '@/shared/ui/screens/records/powerSegments';
import { readingsOf } from '@/shared/ui/screens/records/readingsOf';
import { replayRecord } from '@/shared/ui/screens/records/replayRecord';
import { timelineOf } from '@/shared/ui/screens/records/timelineOf';
import { goodRun, people, RecordedBench } from '@/tests/shared/ui/screens/sampleRecord';

describe('replayRecord', () => {
  it('comes to the end that the run came to', () => {
    const replay = replayRecord(goodRun().record());
    expect(replay.broken).toBeNull();
    expect(replay.end?.end?.says).toBe('cleared');
  });

  it('says at which entry the story and the machine part, and shows the rest from the entries alone', () => {
    const bench = goodRun();
    const at = bench.entries.findIndex((e) => e.kind === 'energised');
    const entries = bench.entries.filter((_, i) => i !== at);
    const replay = replayRecord({ ...bench.record(), entries });
    expect(replay.broken?.seq).toBe(entries[at]?.seq);
    expect(replay.entries).toHaveLength(entries.length);
    expect(replay.entries.at(-1)?.after).toBeNull();
  });
});

describe('powerSegments', () => {
  it('shows the lamp between proved dead and proved dead, and leaves the review out', () => {
    const bench = goodRun();
    bench.at += 86_400_000;
    bench.keep('submitted', people.ann, {});
    const course = powerSegments(replayRecord(bench.record()).entries);
    const states = course.segments.map((s) => s.state);
    expect(states[0]).toBe('unknown');
    expect(states).toContain('lamp');
    expect(states[states.indexOf('lamp') - 1]).toBe('proved-dead');
    expect(states[states.indexOf('lamp') + 1]).toBe('off');
    const seconds = course.segments.reduce((sum, s) => sum + s.seconds, 0);
    expect(seconds).toBe(((course.to ?? 0) - (course.from ?? 0)) / 1000);
    expect(seconds).toBeLessThan(3600);
  });
});

describe('readingsOf', () => {
  it('judges a reading beyond the limit but within the meter’s doubt as out, but close', () => {
    const bench = new RecordedBench();
    bench.pass().answer('sound').dead().pass({ earth: 0.1504 });
    const lines = readingsOf(replayRecord(bench.record()).entries);
    expect(lines.at(-1)).toMatchObject({
      mark: 'close',
      verdict: 'out, but close',
      out: true,
      unit: 'Ω',
      high: expect.closeTo(0.15, 9) as number,
    });
  });

  it('marks the readings of proving dead as plain, without a guard band', () => {
    const lines = readingsOf(replayRecord(goodRun().record()).entries);
    const pair = lines.find((l) => l.label.startsWith('Line to neutral'));
    expect(pair).toMatchObject({ plain: true, guard: 0, verdict: 'in' });
  });
});

describe('timelineOf', () => {
  it('hangs the entries on the studs of their steps, and the review at the end', () => {
    const bench = goodRun();
    bench.keep('submitted', people.ann, {});
    const groups = timelineOf(replayRecord(bench.record()).entries);
    expect(groups.find((g) => g.title === 'Through the lamp')?.stud).toBe('6');
    expect(groups.at(-1)?.title).toBe('Review');
    expect(groups.flatMap((g) => g.entries)).toHaveLength(bench.entries.length);
  });
});
