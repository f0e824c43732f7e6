/** A rectifier into a reservoir capacitor, stepped through one period of its ripple until it repeats itself. */
import { bisect } from '@/shared/workings/bisect';

/** The circuit: |sine| or half sine less the diodes' drop, source ohms, reservoir, and a load of steady amps and siemens. */
export interface ReservoirCircuit {
  /** Of the sine at the secondary. */
  readonly peakVolts: number;
  readonly mainsHertz: number;
  /** Two pulses a mains period, or one. */
  readonly fullWave: boolean;
  /** Of all the diodes in the way of the current together. */
  readonly dropVolts: number;
  /** Windings, diodes and leads in the way of the charging current; more than zero. */
  readonly sourceOhms: number;
  readonly farads: number;
  /** Load that takes steady amps as long as there are volts. */
  readonly loadAmps: number;
  /** Load that is a resistance, as 1/R. */
  readonly loadSiemens: number;
}

/** One instant of the settled period. */
export interface ReservoirInstant {
  readonly seconds: number;
  readonly volts: number;
  readonly diodeAmps: number;
}

/** The settled state. */
export interface ReservoirState {
  readonly instants: readonly ReservoirInstant[];
  readonly lowVolts: number;
  readonly highVolts: number;
  readonly rippleVolts: number;
  readonly meanVolts: number;
  readonly meanAmps: number;
  readonly peakDiodeAmps: number;
  /** Charging current as r.m.s., over the whole period. */
  readonly diodeRmsAmps: number;
  readonly capacitorRmsAmps: number;
  /** Share of a pulse's period in which the diodes conduct. */
  readonly conductionShare: number;
}

/** Steps of one period. The source is taken as straight between two steps; within a step everything is exact. */
const STEPS = 2000;

interface Slope {
  readonly from: number;
  readonly perSecond: number;
}

/** What a time does to the linear circuit v' = −a v + (b + c t): v becomes v × decay + b × first + c × second. */
interface Propagator {
  readonly decay: number;
  readonly first: number;
  readonly second: number;
}

/** Without loss of figures for small a. */
function propagator(a: number, seconds: number): Propagator {
  const x = a * seconds;
  const decay = Math.exp(-x);
  if (x < 1e-4) {
    return { decay, first: seconds * (1 - x / 2 + (x * x) / 6), second: seconds * seconds * (1 / 2 - x / 6 + (x * x) / 24) };
  }
  const first = -Math.expm1(-x) / a;
  return { decay, first, second: (seconds - first) / a };
}

const coasting = ({ loadSiemens, farads }: ReservoirCircuit, seconds: number): Propagator => propagator(loadSiemens / farads, seconds);
const charging = ({ sourceOhms, loadSiemens, farads }: ReservoirCircuit, seconds: number): Propagator =>
  propagator((1 / sourceOhms + loadSiemens) / farads, seconds);

/** Reservoir alone with its load; stops at nothing. */
const coast = (circuit: ReservoirCircuit, volts: number, over: Propagator): number =>
  Math.max(0, volts * over.decay - (circuit.loadAmps / circuit.farads) * over.first);

/** Diodes conducting from a source that rises or falls straight. A load that wants more than the source gives pulls the reservoir to nothing, not below. */
function charge(circuit: ReservoirCircuit, volts: number, source: Slope, over: Propagator): number {
  const { sourceOhms, farads, loadAmps } = circuit;
  const steady = (source.from / sourceOhms - loadAmps) / farads;
  return Math.max(0, volts * over.decay + steady * over.first + (source.perSecond / sourceOhms / farads) * over.second);
}

/** The two ways over a whole step, worked out once. */
interface WholeStep {
  readonly seconds: number;
  readonly coasting: Propagator;
  readonly charging: Propagator;
}

/** One step, split where the diodes begin or cease to conduct. */
function step(circuit: ReservoirCircuit, volts: number, source: Slope, whole: WholeStep): number {
  const { seconds } = whole;
  const { from, perSecond } = source;
  const conducts = from > volts || (from === volts && perSecond > 0);
  const end = conducts ? charge(circuit, volts, source, whole.charging) : coast(circuit, volts, whole.coasting);
  const last = from + perSecond * seconds;
  if (conducts ? last >= end : last <= end) return end;
  const move = (time: number): number =>
    conducts ? charge(circuit, volts, source, charging(circuit, time)) : coast(circuit, volts, coasting(circuit, time));
  const above = (time: number): number => from + perSecond * time - move(time);
  const turn = bisect((time) => (conducts ? -above(time) : above(time)), 0, seconds);
  const there = move(turn);
  const rest = seconds - turn;
  if (conducts) return coast(circuit, there, coasting(circuit, rest));
  return charge(circuit, there, { from: from + perSecond * turn, perSecond }, charging(circuit, rest));
}

const sourceTable = (circuit: ReservoirCircuit): readonly number[] =>
  Array.from({ length: STEPS + 1 }, (_, i) => {
    const angle = (i / STEPS) * (circuit.fullWave ? Math.PI : 2 * Math.PI);
    return circuit.peakVolts * (i === STEPS ? 0 : Math.sin(angle)) - circuit.dropVolts;
  });

/** Length of one period of the ripple, in seconds. */
export const pulseSeconds = (circuit: Pick<ReservoirCircuit, 'mainsHertz' | 'fullWave'>): number =>
  1 / (circuit.mainsHertz * (circuit.fullWave ? 2 : 1));

function walk(circuit: ReservoirCircuit, source: readonly number[], start: number, note?: (volts: number, i: number) => void): number {
  const seconds = pulseSeconds(circuit) / STEPS;
  const whole: WholeStep = { seconds, coasting: coasting(circuit, seconds), charging: charging(circuit, seconds) };
  let volts = start;
  for (let i = 0; i < STEPS; i += 1) {
    note?.(volts, i);
    const from = source[i] ?? 0;
    volts = step(circuit, volts, { from, perSecond: ((source[i + 1] ?? 0) - from) / seconds }, whole);
  }
  return volts;
}

/**
 * The state that repeats itself. Two runs from different volts never cross, so that the volts after a period rise with those
 * before it and the one place where they agree can be searched for, however long the circuit would take to settle.
 * @returns null where the source never reaches above the drop of the diodes
 */
export function settledReservoir(circuit: ReservoirCircuit): ReservoirState | null {
  const most = circuit.peakVolts - circuit.dropVolts;
  if (!(most > 0)) return null;
  const source = sourceTable(circuit);
  const gain = (volts: number): number => walk(circuit, source, volts) - volts;
  return measured(circuit, source, fallsThroughZero(gain, most));
}

/** Where a falling function passes zero between 0 and a top: false position, an end that stays put halved (Illinois). */
function fallsThroughZero(f: (x: number) => number, top: number): number {
  let [low, atLow, high, atHigh] = [0, f(0), top, f(top)];
  if (atLow <= 0) return 0;
  if (atHigh >= 0) return top;
  let kept = 0;
  for (let i = 0; i < 100; i += 1) {
    const x = Math.min(high, Math.max(low, (low * atHigh - high * atLow) / (atHigh - atLow)));
    const y = f(x);
    if (Math.abs(y) <= 1e-12 * top || high - low <= 1e-12 * top) return x;
    if (y > 0) {
      [low, atLow] = [x, y];
      if (kept === 1) atHigh /= 2;
      kept = 1;
    } else {
      [high, atHigh] = [x, y];
      if (kept === -1) atLow /= 2;
      kept = -1;
    }
  }
  return (low + high) / 2;
}

function measured(circuit: ReservoirCircuit, source: readonly number[], start: number): ReservoirState {
  const { sourceOhms, loadAmps, loadSiemens } = circuit;
  const seconds = pulseSeconds(circuit) / STEPS;
  const instants: ReservoirInstant[] = [];
  let [low, high, sum, squares, capacitorSquares, load, peak, conducting] = [start, start, 0, 0, 0, 0, 0, 0];
  walk(circuit, source, start, (volts, i) => {
    const diode = Math.max(0, ((source[i] ?? 0) - volts) / sourceOhms);
    const taken = (volts > 0 ? loadAmps : Math.min(loadAmps, diode)) + loadSiemens * volts;
    if (i % (STEPS / 400) === 0) instants.push({ seconds: i * seconds, volts, diodeAmps: diode });
    [low, high, peak] = [Math.min(low, volts), Math.max(high, volts), Math.max(peak, diode)];
    sum += volts;
    squares += diode * diode;
    capacitorSquares += (diode - taken) ** 2;
    load += taken;
    if (diode > 0) conducting += 1;
  });
  return {
    instants,
    lowVolts: low,
    highVolts: high,
    rippleVolts: high - low,
    meanVolts: sum / STEPS,
    meanAmps: load / STEPS,
    peakDiodeAmps: peak,
    diodeRmsAmps: Math.sqrt(squares / STEPS),
    capacitorRmsAmps: Math.sqrt(capacitorSquares / STEPS),
    conductionShare: conducting / STEPS,
  };
}
