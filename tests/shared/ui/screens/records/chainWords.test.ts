import { describe, expect, it } from 'vitest';

import { chainWords } from '@/shared/ui/screens/records/chainWords';
import { goodRun } from '@/tests/shared/ui/screens/sampleRecord';

describe('chainWords', () => {
  const record = goodRun().record();

  it('says how many entries were checked', () => {
    expect(chainWords(record)).toEqual({
      whole: true,
      verdict: 'Chain whole',
      detail: `${record.entries.length} entries, checked on this device`,
    });
  });

  it('names the entry whose words were changed', () => {
    const entries = record.entries.map((e) => (e.seq === 5 ? { ...e, body: { ...e.body, title: 'something else' } } : e));
    const words = chainWords({ ...record, entries });
    expect(words.whole).toBe(false);
    expect(words.detail).toContain('Entry 5');
  });

  it('sees a tail that was cut off', () => {
    const words = chainWords({ ...record, entries: record.entries.slice(0, -2) });
    expect(words).toMatchObject({ whole: false, verdict: 'Chain broken' });
  });
});
