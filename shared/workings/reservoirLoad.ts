/** A rectifier with a large reservoir behind a series resistance, in closed form: it takes its current in short pulses. */
import { bisect } from '@/shared/workings/bisect';

/** Settled state of the circuit; volts and amps of the source side are r.m.s. */
export interface ReservoirLoadState {
  /** Half the angle of conduction of each pulse, in radians. */
  readonly halfAngle: number;
  /** Reservoir volts as a share of the peak, cos θ. */
  readonly share: number;
  readonly seriesVolts: number;
  readonly inletVolts: number;
  readonly amps: number;
  readonly seriesWatts: number;
  readonly loadWatts: number;
  readonly peakAmps: number;
}

/** Below this the differences are taken from their series, or they would lose their figures. */
const SMALL = 0.3;

function powerSeries(x: number, first: number, term: (k: number) => number): number {
  let [sum, factorial] = [0, 1];
  for (let k = 1; k <= 12; k += 1) {
    factorial *= 2 * k * (2 * k + 1);
    if (k >= first) sum += ((k % 2 === 0 ? 1 : -1) * term(k) * x ** (2 * k + 1)) / factorial;
  }
  return sum;
}

/** sin θ − θ cos θ, to all its figures. */
const pulseArea = (theta: number): number =>
  theta < SMALL ? -powerSeries(theta, 1, (k) => 2 * k) : Math.sin(theta) - theta * Math.cos(theta);

/** θ (1 + 2 cos² θ) − 3 sin θ cos θ, to all its figures. */
const pulseSquare = (theta: number): number =>
  theta < SMALL ? powerSeries(2 * theta, 2, (k) => k - 1) : theta * (1 + 2 * Math.cos(theta) ** 2) - 3 * Math.sin(theta) * Math.cos(theta);

/**
 * Solves tan θ − θ = π R series ÷ 2 R load, full wave, ideal diodes, a reservoir without ripple.
 * @param supplyVolts r.m.s.
 * @param seriesOhms more than zero
 * @param loadOhms across the reservoir, as seen from the source side, more than zero
 */
export function reservoirBehind(supplyVolts: number, seriesOhms: number, loadOhms: number): ReservoirLoadState {
  const peak = supplyVolts * Math.SQRT2;
  const ratio = (Math.PI * seriesOhms) / (2 * loadOhms);
  const theta = bisect((angle) => pulseArea(angle) - ratio * Math.cos(angle), 0, Math.PI / 2);
  const share = Math.cos(theta);
  const amps = (peak / seriesOhms) * Math.sqrt(pulseSquare(theta) / Math.PI);
  const idle = Math.PI / 2 - theta - Math.sin(theta) * share;
  return {
    halfAngle: theta,
    share,
    seriesVolts: amps * seriesOhms,
    inletVolts: peak * Math.sqrt((2 * theta * share * share + idle) / Math.PI),
    amps,
    seriesWatts: amps * amps * seriesOhms,
    loadWatts: (peak * share) ** 2 / loadOhms,
    peakAmps: (peak * (1 - share)) / seriesOhms,
  };
}
