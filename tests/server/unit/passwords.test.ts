import { describe, expect, it } from 'vitest';

import { checkPassword, hashPassword } from '@/server/session/passwords';

/** High enough that hashing outweighs everything else by far. */
const COST = 9;

async function fastestOf(times: number, work: () => Promise<unknown>): Promise<number> {
  let best = Infinity;
  for (let i = 0; i < times; i += 1) {
    const begin = performance.now();
    await work();
    best = Math.min(best, performance.now() - begin);
  }
  return best;
}

describe('checkPassword', () => {
  it('takes the right password and no other', async () => {
    const stored = await hashPassword('brass lamp', 4);
    expect(await checkPassword('brass lamp', stored, 4)).toBe(true);
    for (const wrong of ['', 'Brass lamp', 'brass lamp ', stored]) expect(await checkPassword(wrong, stored, 4), wrong).toBe(false);
    expect(await checkPassword('no account has this password', undefined, 4)).toBe(false);
  });

  it('takes as long for an account that is not there', async () => {
    const stored = await hashPassword('brass lamp', COST);
    await checkPassword('x', undefined, COST);
    const known = await fastestOf(3, () => checkPassword('x', stored, COST));
    const unknown = await fastestOf(3, () => checkPassword('x', undefined, COST));
    expect(unknown).toBeGreaterThan(known / 2);
    expect(unknown).toBeLessThan(known * 2);
  });

  it('refuses what bcrypt would cut off, both when it is set and when it is tried', async () => {
    await expect(hashPassword('é'.repeat(37), 4)).rejects.toThrow('a password has at most 72 bytes');
    const stored = await hashPassword('a'.repeat(72), 4);
    expect(await checkPassword('a'.repeat(73), stored, 4)).toBe(false);
  });

  it('stores the cost with the hash', async () => {
    expect(await hashPassword('x', 4)).toMatch(/^\$2[aby]\$04\$/);
  });
});
