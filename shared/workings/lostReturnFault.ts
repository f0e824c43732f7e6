/** The other way round: from readings of a machine that runs, the wire at fault and its ohms. */
import type { LostReturnInputs } from '@/shared/workings/lostReturnInputs';
import type { LostReturnModel, ModelWire } from '@/shared/workings/lostReturnModel';
import type { ReturnFault, WireSuspect } from '@/shared/workings/lostReturnResult';
import type { Network } from '@/shared/workings/network/network';
import { lay, prepare, solveLaid } from '@/shared/workings/network/network';
import type { SheetRefusal } from '@/shared/workings/sheet';

/** Doubt of a pair of readings: 5 mV and 0.3 %, two hand meters' worth. Common practice, no source. */
const doubtVolts = (volts: number): number => 0.005 + 0.003 * Math.abs(volts);
/** Readings are explained when they are no further off than this many doubts, r.m.s. */
const EXPLAINED = 1.5;
const MOST_OHMS = 1e6;

interface Pair {
  readonly from: number;
  readonly to: number;
  readonly volts: number;
}

function pairsOf(model: LostReturnModel, readings: LostReturnInputs['readings']): readonly Pair[] | SheetRefusal {
  const pairs: Pair[] = [];
  for (const [k, { rail, load, loadVolts }] of readings.entries()) {
    const place = model.rails.findIndex(({ name }) => name === rail);
    if (place < 0) return { ok: false, field: `readings.${String(k)}.rail`, say: `There is no rail “${rail}” among the rails above.` };
    if (!model.loads.some(({ name }) => name === load))
      return { ok: false, field: `readings.${String(k)}.load`, say: `There is no board “${load}” among the loads above.` };
    const own = model.loads.find(({ name, rails }) => name === load && rails.length === 1 && rails[0] === place);
    if (own === undefined)
      return { ok: false, field: `readings.${String(k)}.load`, say: `“${load}” has no load between ${rail} and a return.` };
    // A load may be written either way round; the reading is always rail against 0 V.
    const turned = Math.sign(own.nominalVolts ?? 0) !== Math.sign(model.rails[place]?.volts ?? 0);
    pairs.push({ from: turned ? own.to : own.from, to: turned ? own.from : own.to, volts: loadVolts });
  }
  return pairs;
}

/** The network with each rail held at what was read at the supply. */
function heldNetwork(model: LostReturnModel, readings: LostReturnInputs['readings']): Network {
  const outputs = model.network.outputs.map((output, k) => {
    const read = readings.find(({ rail }) => rail === model.rails[k]?.name);
    return { ...output, volts: read?.supplyVolts ?? output.volts, limitAmps: 1e6, takes: true, outputOhms: 1e-4 };
  });
  return { ...model.network, outputs: outputs.filter(({ volts }) => volts !== 0) };
}

/** Least of a function of one number between two ends, by thirds of the golden section. */
function leastBetween(f: (x: number) => number, low: number, high: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  let [x, y] = [b - golden * (b - a), a + golden * (b - a)];
  let [fx, fy] = [f(x), f(y)];
  for (let step = 0; step < 40; step += 1) {
    if (fx <= fy) {
      [b, y, fy] = [y, x, fx];
      x = b - golden * (b - a);
      fx = f(x);
    } else {
      [a, x, fx] = [x, y, fy];
      y = a + golden * (b - a);
      fy = f(y);
    }
  }
  return (a + b) / 2;
}

function fit(network: Network, wire: ModelWire, kind: WireSuspect['kind'], pairs: readonly Pair[]): WireSuspect {
  const resistor = network.resistors[wire.resistor] ?? { from: 0, to: 0, ohms: 1 };
  const prepared = prepare(network, [wire.resistor], [resistor]);
  const left = (logOhms: number): number => {
    const laid = lay(prepared, { open: [wire.resistor], added: [{ ...resistor, ohms: 10 ** logOhms }] });
    return apart(solveLaid(laid, []).volts, pairs);
  };
  const [low, high] = [Math.log10(resistor.ohms), Math.log10(Math.max(MOST_OHMS, 10 * resistor.ohms))];
  const grid = Array.from({ length: 25 }, (_, k) => low + ((high - low) * k) / 24);
  const best = grid.map((x) => ({ x, left: left(x) })).reduce((a, b) => (b.left < a.left ? b : a));
  const step = (high - low) / 24;
  const x = leastBetween(left, Math.max(low, best.x - step), Math.min(high, best.x + step));
  return { name: wire.name, kind, ohms: 10 ** x, goodOhms: resistor.ohms, leftVolts: left(x) };
}

/** Distance of readings from a solution, each weighed by its doubt, as an r.m.s. in units of the doubt. */
function apart(volts: Float64Array, pairs: readonly Pair[]): number {
  const sum = pairs.reduce(
    (all, pair) => all + (((volts[pair.from] ?? 0) - (volts[pair.to] ?? 0) - pair.volts) / doubtVolts(pair.volts)) ** 2,
    0,
  );
  return Math.sqrt(sum / pairs.length);
}

/**
 * Finds the one wire whose ohms would explain the readings.
 * @returns what they say, or the reading that fits no row
 */
export function findFault(model: LostReturnModel, readings: LostReturnInputs['readings']): ReturnFault | SheetRefusal {
  const pairs = pairsOf(model, readings);
  if ('ok' in pairs) return pairs;
  const network = heldNetwork(model, readings);
  const asItStands = apart(solveLaid(lay(prepare(network, [], []), { open: [], added: [] }), []).volts, pairs);
  // Readings in units of their own doubt, told in volts of the typical one.
  const typical = pairs.reduce((sum, { volts }) => sum + doubtVolts(volts), 0) / pairs.length;
  const inVolts = (suspect: WireSuspect): WireSuspect => ({ ...suspect, leftVolts: suspect.leftVolts * typical });
  if (asItStands <= 1) return { asItStandsVolts: asItStands * typical, suspects: [], says: 'nothing amiss' };
  const fitted = [
    ...model.returns.map((wire) => fit(network, wire, 'return', pairs)),
    ...model.feeds.map((wire) => fit(network, wire, 'feed', pairs)),
  ].sort((a, b) => a.leftVolts - b.leftVolts);
  const suspects = fitted.filter(({ leftVolts }) => leftVolts <= EXPLAINED);
  const says = suspects.length === 0 ? 'no single wire' : suspects.length === 1 ? 'one wire' : 'one of several';
  return { asItStandsVolts: asItStands * typical, suspects: suspects.map(inVolts), says };
}
