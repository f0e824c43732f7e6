/** Password hashes. */
import { compare, hash, truncates } from 'bcryptjs';

/** Hashes a password. Throws on one above bcrypt's 72 bytes, of which the rest would not count. */
export async function hashPassword(password: string, cost: number): Promise<string> {
  if (truncates(password)) throw new Error('a password has at most 72 bytes');
  return hash(password, cost);
}

const decoys = new Map<number, Promise<string>>();

/** True when `password` fits `stored`. Without a stored hash it takes the same time, so that nobody learns who has an account. */
export async function checkPassword(password: string, stored: string | undefined, cost: number): Promise<boolean> {
  let decoy = decoys.get(cost);
  if (decoy === undefined) {
    decoy = hash('no account has this password', cost);
    decoys.set(cost, decoy);
  }
  const fits = await compare(password, stored ?? (await decoy));
  return stored !== undefined && fits && !truncates(password);
}
