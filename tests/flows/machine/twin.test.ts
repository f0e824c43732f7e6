/** A reading that is held against the same point of an identical circuit: common practice, no source. */
import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import { rehearse } from '@/flows/rehearsal/rehearse';
import { Bench, program } from '../support/bench';
import { dead, end, look, step, treeOf } from '../support/steps';

type Reading = number | 'over' | string;
const reads = ['in', 'close', 'low', 'high', 'reversed', 'not-sure', 'cannot'];
const twin = (over: Record<string, unknown> = {}) =>
  step('measure', 'junction', 'alike', {
    contact: 'hands',
    probe: 'hand',
    quantity: 'diode-volts',
    power: 'dead',
    limit: { is: 'twin', of: 'The same junction of the twin board', within: 0.1 },
    exits: [
      { id: 'in', on: ['in'], to: 'alike', evidence: [{ suspect: 'pass', says: 'rules-out' }] },
      { id: 'off', on: ['low', 'high'], to: 'differs', evidence: [{ suspect: 'pass', says: 'all-but-proves' }] },
      { id: 'rest', on: reads.slice(1).filter((o) => o !== 'low' && o !== 'high'), to: 'refer' },
    ],
    ...over,
  });
const tree = (over: Record<string, unknown> = {}) =>
  treeOf([look('d1'), dead('d1', 'junction'), twin(over), end('alike', 'cleared'), end('differs', 'fault-found', { suspect: 'pass', retest: 'The junction.' })], { reentries: [] });

/** A run that is asked for its first reading. */
function atJunction(): Bench {
  const bench = new Bench(program(tree())).answer('good').dead();
  while (bench.view.phase === 'warning') bench.do({ type: 'WARNING_READ', step: 'junction' });
  return bench;
}

/** Plays the two readings; the end that they lead to. */
function played(of: Reading, own: Reading, uncertainty = 0.001): string | null {
  const bench = atJunction();
  const say = (row: string, value: Reading) =>
    typeof value === 'string' && value !== 'over'
      ? bench.do({ type: 'ROW', step: 'junction', row, word: value })
      : bench.do({ type: 'READING', step: 'junction', row, value: value as number | 'over', typed: String(value), instrument: { id: 'tester', twoPole: true, uncertainty } });
  say('twin', of);
  if (bench.view.key === 'junction') say('reading', own);
  return bench.view.end?.key ?? (bench.view.purpose.is === 'end' ? bench.view.purpose.key : bench.view.key);
}

describe('a reading held against its twin', () => {
  it.each<[string, Reading, Reading, string]>([
    ['the same', 0.6, 0.6, 'alike'],
    ['within its share', 0.6, 0.63, 'alike'],
    ['above its share', 0.6, 0.7, 'differs'],
    ['below its share', 0.6, 0.5, 'differs'],
    ['both over range: open alike', 'over', 'over', 'alike'],
    ['the twin reads, this one is open', 0.6, 'over', 'differs'],
    ['the twin is open, this one reads', 'over', 0.6, 'differs'],
    ['a twin below zero has its limits the right way round', -0.6, -0.62, 'alike'],
    ['the sign is the wrong way round', 0.6, -0.6, 'refer'],
    ['a twin at nothing can be told from nothing', 0, 0, 'refer'],
    ['no twin here: the other one is not asked', 'cannot', 0.6, 'refer'],
    ['the twin is not sure', 'not-sure', 0.6, 'refer'],
  ])('%s: %s and %s', (_, of, own, to) => {
    expect(played(of, own)).toBe(to);
  });

  it('carries the uncertainty of both meters: 0.63 against 0.6 within 10 % is too close at ± 0.03 each', () => {
    // limit 0.66; 0.63 + √(0.03² + 0.033²) = 0.675
    expect(played(0.6, 0.63, 0.03)).toBe('refer');
    expect(played(0.6, 0.63, 0.01)).toBe('alike');
  });

  it('shows the limits that the twin gave, and says how both are read', () => {
    const bench = atJunction();
    expect(bench.view.notes).toEqual([{ name: 'Like its twin', say: 'Read The same junction of the twin board first, with the same meter, range and probes. The two lie within 10 %.' }]);
    expect(bench.view.rows.map((r) => r.row.label)).toEqual(['Twin: The same junction of the twin board', 'junction']);
    bench.row({ twin: 0.5 });
    const own = bench.view.current?.row;
    expect(own?.ask === 'reading' && [own.low, own.high, own.nominal]).toEqual([0.45, 0.55, 0.5]);
  });

  it('is rehearsed like any other', () => {
    const { suspects, sound } = rehearse(program(tree()), 'pass');
    expect(suspects[0]).toMatchObject({ reached: 'verdict', end: { key: 'differs' } });
    expect(sound.end?.key).toBe('alike');
  });

  it.each<[string, Record<string, unknown>, RegExp]>([
    ['a share of nothing', { limit: { is: 'twin', of: 'The twin', within: 0 } }, />=\s*0\.001/],
    ['a row each', { each: 'rails' }, /one point is held against its twin/],
    ['a clip', { probe: 'clipped', contact: 'none', quantity: 'volts-dc' }, /a clip stays where it is/],
    ['a twin point without a twin', { limit: { is: 'below', high: 1 }, points: { twin: 'zero' } }, /only a reading that is held against its twin/],
  ])('is refused in the document with %s', (_, over, say) => {
    const parsed = parseTree(JSON.parse(JSON.stringify({ ...tree(), steps: tree().steps.map((s) => (s.id === 'junction' ? { ...s, ...over } : s)) })));
    expect(parsed.ok ? '' : parsed.faults.map((f) => `${f.step} ${f.key} ${f.message}`).join('\n')).toMatch(say);
  });
});
