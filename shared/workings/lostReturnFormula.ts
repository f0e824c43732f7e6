/** The lost-return sheet’s formulas with the numbers in them. */
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { statesOf } from '@/shared/workings/lostReturnCases';
import type { LostReturnModel } from '@/shared/workings/lostReturnModel';
import { shortAmps, shortOhms, shortVolts } from '@/shared/workings/lostReturnModel';
import type { JudgedOpening, JudgedOpenings } from '@/shared/workings/lostReturnOpenings';
import type { LostReturnResult, OpeningResult, ReturnFault } from '@/shared/workings/lostReturnResult';
import { VERDICTS } from '@/shared/workings/lostReturnResult';
import { andList } from '@/shared/workings/lostReturnWords';
import { THERMAL_VOLTS } from '@/shared/workings/network/diode';

/** What the readings say, in a sentence or two. */
export function faultInWords({ says, suspects, asItStandsVolts }: ReturnFault): string {
  const [first] = suspects;
  const named = andList(suspects.map(({ name, ohms }) => `${name} at ${shortOhms(ohms)}`));
  if (says === 'nothing amiss') return 'The readings fit good wires throughout.';
  if (says === 'no single wire' || first === undefined)
    return `No single wire explains the readings, which are ${shortVolts(asItStandsVolts)} off: suspect more than one wire, the loads as entered, or the meter’s leads.`;
  if (says === 'one wire') return `${first.name} is at fault: about ${shortOhms(first.ohms)}, where ${shortOhms(first.goodOhms)} belongs.`;
  return `The readings cannot tell ${named} apart: measure each dead, end to end.`;
}

/** A return by its ohms, and how they come about. */
function wireLine(model: LostReturnModel, k: number): string {
  const row = model.returnRows[k];
  const total = shortOhms(model.network.resistors[model.returns[k]?.resistor ?? -1]?.ohms ?? 0);
  if (row === undefined || row.ohms !== null || row.squareMillimetres === null || row.metres === null)
    return `${row?.name ?? ''}: ${total} as measured`;
  return `${row.name}: 17.241 nΩm × ${formatNumber(row.metres, 3)} m ÷ ${formatNumber(row.squareMillimetres, 3)} mm² + ${shortOhms(row.contactOhms)} = ${total}`;
}

/** A diode by its drop in the case shown, or by its card where it does not conduct. */
function diodeLine({ diodes, network }: LostReturnModel, k: number, amps: number): string {
  const [name, card] = [diodes[k]?.name ?? '', network.diodes[k]];
  if (card === undefined) return name;
  const { saturationAmps, emission, seriesOhms } = card;
  const saturation = formatQuantity(saturationAmps, 'A', { digits: 2 });
  const shockley = `${formatNumber(emission, 3)} × ${formatNumber(THERMAL_VOLTS * 1000, 3)} mV`;
  if (amps < 0.01) return `${name}: blocks in that case; IS ${saturation}, N × Vt ${shockley}, ${shortOhms(seriesOhms)}`;
  const volts = emission * THERMAL_VOLTS * Math.log1p(amps / saturationAmps) + amps * seriesOhms;
  return `${name}: ${shockley} × ln(1 + ${shortAmps(amps)} ÷ ${saturation}) + ${shortAmps(amps)} × ${shortOhms(seriesOhms)} = ${shortVolts(volts)}`;
}

/** Pairs that are no worse than one of their two alone are only counted. */
function openingLines(openings: readonly OpeningResult[]): readonly string[] {
  const rank = ({ verdict }: OpeningResult): number => VERDICTS.indexOf(verdict);
  const single = new Map(openings.flatMap((one) => (one.opens.length === 1 ? [[one.opens[0] ?? '', rank(one)] as const] : [])));
  const told = openings.filter(
    (one) => one.verdict !== 'harmless' && (one.opens.length === 1 || one.opens.every((name) => (single.get(name) ?? 0) < rank(one))),
  );
  const alike = openings.filter((one) => one.opens.length === 2 && one.verdict !== 'harmless' && !told.includes(one)).length;
  const lines = told.map(({ sentence, exposedBoards }) =>
    exposedBoards.length === 0 ? sentence : `${sentence} Exposed: ${andList(exposedBoards.map(({ name }) => name))}.`,
  );
  return alike === 0
    ? lines
    : [...lines, `${String(alike)} ${alike === 1 ? 'pair is' : 'pairs are'} no worse by verdict than one of the two alone`];
}

/**
 * The lines under the answer.
 * @param shown the opening whose worst case is drawn
 */
export function lostReturnFormula(
  model: LostReturnModel,
  judged: JudgedOpenings,
  shown: JudgedOpening,
  result: LostReturnResult,
): readonly string[] {
  const lines = [
    `${String(result.openings.length + 1)} openings × ${String(statesOf(model).length)} states of ${String(model.rails.length)} rails = ${String(judged.solved)} cases of ${String(model.network.nodes)} nodes, all settled; power balances to ${judged.imbalance < 1e-9 ? 'better than 10⁻⁹' : judged.imbalance.toPrecision(1)}`,
    ...model.returns.map((_, k) => wireLine(model, k)),
    ...model.diodes.map((_, k) => diodeLine(model, k, shown.shown.solution.diodeAmps[k] ?? 0)),
  ];
  const before = judged.closed.occurrences.flatMap(({ kind, at, worst }) =>
    kind === 'load-out' ? [`${model.loads[at]?.name ?? ''} ${shortVolts(worst.value)}`] : [],
  );
  if (before.length > 0) lines.push(`before anything opens, out of tolerance: ${andList(before)}`);
  lines.push(...openingLines(result.openings));
  if (result.fault !== null) lines.push(faultInWords(result.fault));
  return lines;
}
