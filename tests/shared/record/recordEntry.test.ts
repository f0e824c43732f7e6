import { describe, expect, it } from 'vitest';

import { draftEntrySchema, ENTRY_KINDS, MOST_BODY_CHARACTERS } from '@/shared/record/recordEntry';

const draft = {
  id: '01890a5d-ac96-774b-bcce-b302099a8057',
  run: '3f0e4f8a-0b1d-4c55-9a6e-2f8f5d3b7c11',
  seq: 1,
  at: '2024-05-01T09:30:00.000Z',
  monotonic: 12,
  actor: 'machine',
  kind: 'opened',
  body: { tools: ['meter'] },
};

const nested = (levels: number): unknown => {
  let value: unknown = 0;
  for (let level = 0; level < levels; level += 1) value = [value];
  return value;
};

describe('draftEntrySchema', () => {
  it('takes an entry of every kind', () => {
    for (const kind of ENTRY_KINDS) expect(draftEntrySchema.safeParse({ ...draft, kind }).success).toBe(true);
    expect(ENTRY_KINDS).toHaveLength(30);
  });

  it.each([
    ['an id that is not version 7', { id: '3f0e4f8a-0b1d-4c55-9a6e-2f8f5d3b7c11' }, 'id', /version 7/],
    ['number 0', { seq: 0 }, 'seq', /1 or more/],
    ['half a number', { seq: 1.5 }, 'seq', /whole number/],
    ['a time without milliseconds', { at: '2024-05-01T09:30:00Z' }, 'at', /milliseconds/],
    ['a time with an offset', { at: '2024-05-01T09:30:00.000+02:00' }, 'at', /UTC/],
    ['a day that does not exist', { at: '2024-02-31T09:30:00.000Z' }, 'at', /exists/],
    ['a fraction of a millisecond', { monotonic: 0.5 }, 'monotonic', /whole milliseconds/],
    ['a name for an actor', { actor: 'Ada Marlow' }, 'actor', /an id/],
    ['an unknown kind', { kind: 'edited' }, 'kind', /not a kind/],
    ['a list for a body', { body: [] }, 'body', /an object/],
    ['no body', { body: undefined }, 'body', /an object/],
    ['NaN in a body', { body: { value: Number.NaN } }, 'body', /“value” is not a finite number/],
    ['undefined in a body', { body: { reading: { value: undefined } } }, 'body', /“reading\.value” is undefined/],
    ['U+0000 behind a backslash', { body: { note: '\\\u0000' } }, 'body', /U\+0000/],
    ['a date in a body', { body: { on: new Date(0) } }, 'body', /not plain JSON/],
    ['U+0000 in a body', { body: { note: 'a\u0000b' } }, 'body', /U\+0000/],
    ['half a character in a body', { body: { note: '\ud83d' } }, 'body', /lone surrogate/],
    ['a member named __proto__', { body: JSON.parse('{"__proto__":1}') as unknown }, 'body', /__proto__/],
    ['a very deep body', { body: { deep: nested(10_000) } }, 'body', /nested deeper/],
    ['a very long body', { body: { note: 'x'.repeat(MOST_BODY_CHARACTERS) } }, 'body', /longer than/],
  ])('refuses %s', (_, change, field, message) => {
    const parsed = draftEntrySchema.safeParse({ ...draft, ...change });
    expect(parsed.error?.issues).toHaveLength(1);
    expect(parsed.error?.issues[0]?.path).toEqual([field]);
    expect(parsed.error?.issues[0]?.message).toMatch(message);
  });

  it('takes the text of an escape for what it is', () => {
    expect(draftEntrySchema.safeParse({ ...draft, body: { note: 'C:\\u0000 "__proto__": \\' } }).success).toBe(true);
  });

  it('refuses a key that it does not know', () => {
    expect(draftEntrySchema.safeParse({ ...draft, hash: '0' }).success).toBe(false);
  });
});
