/** Sets of facts as bits: what may be 0 and what may be 1 over all ways to a place. */

/** Names for bits, numbered as they are first asked for. */
export class BitNames {
  private readonly numbers = new Map<string, number>();
  private readonly names: string[] = [];
  /** answers of `startingWith`, good while no name has come since */
  private readonly prefixes = new Map<string, { size: number; bits: readonly number[] }>();

  /** The number of a name; a new one for a new name. */
  of(name: string): number {
    const known = this.numbers.get(name);
    if (known !== undefined) return known;
    this.numbers.set(name, this.numbers.size);
    this.names.push(name);
    return this.numbers.size - 1;
  }

  /** The number of a name that has been asked for before, or undefined. */
  known(name: string): number | undefined {
    return this.numbers.get(name);
  }

  /** Numbers of all names that begin so. */
  startingWith(prefix: string): readonly number[] {
    const known = this.prefixes.get(prefix);
    if (known !== undefined && known.size === this.names.length) return known.bits;
    const bits = this.names.flatMap((name, bit) => (name.startsWith(prefix) ? [bit] : []));
    this.prefixes.set(prefix, { size: this.names.length, bits });
    return bits;
  }

  /** The name of a number. */
  nameOf(bit: number): string {
    return this.names[bit] ?? '';
  }

  /** Words of 32 bits that hold them all. */
  get words(): number {
    return Math.max(1, Math.ceil(this.numbers.size / 32));
  }

  get size(): number {
    return this.numbers.size;
  }
}

/** What an action does to every bit: set, clear, or leave; afterwards `copies` may raise a bit where another may be 0. */
export interface Effect {
  gen: Uint32Array;
  kill: Uint32Array;
  copies: readonly { raise: number; where0: number }[];
}

/** May-be-0 and may-be-1, a word for every 32 bits. */
export interface MayState {
  may0: Uint32Array;
  may1: Uint32Array;
}

/** Leaves everything as it is; states pass through it untouched. */
export const NO_EFFECT: Effect = { gen: new Uint32Array(0), kill: new Uint32Array(0), copies: [] };

/** True when the bit is in the set. */
export function hasBit(set: Uint32Array, bit: number): boolean {
  return ((set[bit >>> 5] ?? 0) & (1 << (bit & 31))) !== 0;
}

/** Puts the bit into the set. */
export function putBit(set: Uint32Array, bit: number): void {
  set[bit >>> 5] = ((set[bit >>> 5] ?? 0) | (1 << (bit & 31))) >>> 0;
}

/** The state after an effect. A set bit wins over a cleared one within one effect. */
export function through(state: MayState, effect: Effect): MayState {
  if (effect === NO_EFFECT) return state;
  const { gen, kill, copies } = effect;
  const words = state.may0.length;
  const may0 = new Uint32Array(words);
  const may1 = new Uint32Array(words);
  for (let w = 0; w < words; w += 1) {
    const g = gen[w] ?? 0;
    const k = kill[w] ?? 0;
    may0[w] = ((state.may0[w] ?? 0) | k) & ~g;
    may1[w] = ((state.may1[w] ?? 0) & ~k) | g;
  }
  for (const { raise, where0 } of copies) if (hasBit(may0, where0)) putBit(may1, raise);
  return { may0, may1 };
}

/** Joins a state into another; true when that one grew. */
export function join(into: MayState, from: MayState): boolean {
  let grew = false;
  for (let w = 0; w < into.may0.length; w += 1) {
    const a0 = (into.may0[w] ?? 0) | (from.may0[w] ?? 0);
    const a1 = (into.may1[w] ?? 0) | (from.may1[w] ?? 0);
    if (a0 >>> 0 !== into.may0[w] || a1 >>> 0 !== into.may1[w]) grew = true;
    into.may0[w] = a0;
    into.may1[w] = a1;
  }
  return grew;
}
