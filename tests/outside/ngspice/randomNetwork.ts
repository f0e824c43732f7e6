/** Supplies with their wires, loads and diodes, made at random from a seed: what a lost return is worked out on. */
import type { Network, Output, Resistor, Variation } from '@/shared/workings/network/network';

/** Numbers from 0 up to 1 that a seed fixes (mulberry32, public domain). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), state | 1);
    t = (t + Math.imul(t ^ (t >>> 7), t | 61)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** One network with the returns that may be opened, and a case of it. */
export interface RandomCase {
  readonly network: Network;
  readonly returns: readonly number[];
  readonly variation: Variation;
}

/**
 * A supply of 2 to `rails` rails on one 0 V bar: feeds, far ends joined by returns, loads to 0 V and between rails, a freewheel
 * diode at most rails and a clamp here and there.
 */
export function randomCase(seed: number, size: { rails: number; places: number } = { rails: 5, places: 5 }): RandomCase {
  const next = seeded(seed);
  const between = (low: number, high: number): number => low * (high / low) ** next();
  const pick = (count: number): number => Math.floor(next() * count);
  const rails = 2 + pick(size.rails - 1);
  const places = 1 + pick(size.places);
  const terminals = Array.from({ length: rails }, (_, k) => k);
  const placeOf = (k: number): number => rails + k;
  const farOf = (rail: number, place: number): number => rails + places + rail * places + place;
  const nodes = rails + places + rails * places + 1;
  const zero = nodes - 1;
  const outputs: Output[] = terminals.map((terminal) => ({
    terminal,
    zero,
    volts: (terminal === 1 || (terminal > 1 && next() < 0.4) ? -1 : 1) * [3.3, 5, 12, 15, 24][pick(5)]!,
    limitAmps: between(0.5, 30),
    takes: next() < 0.15,
    outputOhms: between(1e-3, 20e-3),
  }));
  const resistors: Resistor[] = [];
  const returns: number[] = [];
  for (let place = 0; place < places; place += 1) {
    for (let wires = 1 + pick(2); wires > 0; wires -= 1) {
      returns.push(resistors.length);
      resistors.push({ from: zero, to: placeOf(place), ohms: between(1e-3, 50e-3) });
    }
    for (const rail of terminals) {
      const volts = Math.abs(outputs[rail]!.volts);
      resistors.push({ from: rail, to: farOf(rail, place), ohms: between(1e-3, 50e-3) });
      resistors.push({ from: farOf(rail, place), to: placeOf(place), ohms: volts / between(0.02, 8) });
      if (next() < 0.15) resistors.push({ from: farOf(rail, place), to: farOf(pick(rails), place), ohms: between(2, 500) });
    }
    if (place > 0 && next() < 0.3) resistors.push({ from: placeOf(place), to: placeOf(place - 1), ohms: between(5e-3, 0.2) });
  }
  const card = () => ({ saturationAmps: between(1e-13, 1e-7), emission: 1 + next(), seriesOhms: between(1e-3, 50e-3) });
  const diodes = outputs.flatMap(({ volts, terminal }) => {
    if (next() < 0.15) return [];
    return [volts > 0 ? { ...card(), anode: zero, cathode: terminal } : { ...card(), anode: terminal, cathode: zero }];
  });
  if (next() < 0.3) diodes.push({ ...card(), anode: placeOf(0), cathode: zero });
  const off = terminals.filter(() => next() < 0.25);
  const wanted = pick(3);
  const open = returns.filter(() => next() < wanted / returns.length);
  const short = pick(rails);
  const limits = next() < 0.3 && !off.includes(short);
  const overload = { from: farOf(short, 0), to: placeOf(0), ohms: Math.abs(outputs[short]!.volts) / (10 * outputs[short]!.limitAmps) };
  return { network: { nodes, resistors, diodes, outputs }, returns, variation: { off, open, added: limits ? [overload] : [] } };
}
