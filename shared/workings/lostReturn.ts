/** Lost return: what happens to rails, boards and diodes when a ground wire comes off, and which wire readings accuse. */
import type { RailState } from '@/shared/workings/lostReturnCases';
import { statesOf } from '@/shared/workings/lostReturnCases';
import { lostReturnExample } from '@/shared/workings/lostReturnExample';
import type { ReturnFault } from '@/shared/workings/lostReturnFault';
import { findFault } from '@/shared/workings/lostReturnFault';
import { lostReturnInputs } from '@/shared/workings/lostReturnInputs';
import type { LostReturnModel } from '@/shared/workings/lostReturnModel';
import { LIMIT_VOLTS_SHARE, lostReturnModel, shortAmps, shortOhms, shortVolts } from '@/shared/workings/lostReturnModel';
import type { JudgedOpening, JudgedOpenings, Occurrence, OpeningVerdict } from '@/shared/workings/lostReturnOpenings';
import { judgeOpenings } from '@/shared/workings/lostReturnOpenings';
import { andList, openingInWords } from '@/shared/workings/lostReturnWords';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { defineSheet } from '@/shared/workings/sheet';

/** A board that an opening exposes. */
export interface ExposedBoard {
  readonly name: string;
  /** Worst volts on it, where `nominalVolts` belong. */
  readonly volts: number;
  readonly nominalVolts: number;
  readonly how: 'reversed' | 'over' | 'hangs on a reversed rail';
}

/** A diode in the openings. */
export interface DiodeStress {
  readonly name: string;
  readonly mostAmps: number;
  readonly ratedAmps: number | null;
  /** Null where its rating is not given. */
  readonly overRated: boolean | null;
}

/** What one opening comes to; all in SI, nothing rounded. */
export interface OpeningResult {
  readonly opens: readonly string[];
  readonly verdict: OpeningVerdict;
  /** The sentence that a step shows. */
  readonly sentence: string;
  readonly reversedRails: readonly { readonly name: string; readonly volts: number }[];
  readonly diodes: readonly DiodeStress[];
  /** Rails that limit in the worst case. */
  readonly limiting: readonly string[];
  /** Those on the reversed or the negative rail first. */
  readonly exposedBoards: readonly ExposedBoard[];
  readonly worstCase: {
    readonly rails: readonly { readonly name: string; readonly state: RailState; readonly volts: number; readonly amps: number }[];
    readonly nodes: readonly { readonly name: string; readonly volts: number }[];
  };
}

/** Result of the sheet. */
export interface LostReturnResult {
  readonly verdict: OpeningVerdict;
  /** With every return in place, all rails on; its verdict is over all states of the rails. */
  readonly closed: OpeningResult;
  /** Each return, then each pair. */
  readonly openings: readonly OpeningResult[];
  /** The opening of the worst verdict, singles before pairs; null when all are harmless. */
  readonly worst: OpeningResult | null;
  readonly solvedCases: number;
  /** Largest share by which the power given and the heat differ in a case. */
  readonly powerImbalance: number;
  readonly fault: ReturnFault | null;
}

function exposedBoards(model: LostReturnModel, { occurrences }: JudgedOpening): readonly ExposedBoard[] {
  const reversed = new Set(occurrences.flatMap(({ kind, at }) => (kind === 'rail-reversed' ? [at] : [])));
  const negative = new Set(model.rails.flatMap(({ volts }, rail) => (volts < 0 ? [rail] : [])));
  const found = new Map<string, { rank: number; size: number; board: ExposedBoard }>();
  const put = (load: number, how: ExposedBoard['how'], volts: number, size: number): void => {
    const { name, nominalVolts, rails } = model.loads[load] ?? { name: '', nominalVolts: null, rails: [] };
    const own = model.loads.flatMap((other) => (other.name === name ? other.rails : []));
    const rank = how === 'reversed' || rails.some((rail) => reversed.has(rail)) ? 0 : own.some((rail) => negative.has(rail)) ? 1 : 2;
    const known = found.get(name);
    if (known !== undefined && (known.rank < rank || (known.rank === rank && known.size >= size))) return;
    found.set(name, { rank, size, board: { name, volts, nominalVolts: nominalVolts ?? 0, how } });
  };
  for (const { kind, at, worst } of occurrences) {
    if (kind === 'load-reversed') put(at, 'reversed', worst.value, 2 + worst.size);
    if (kind === 'load-over') put(at, 'over', worst.value, worst.size);
    if (kind === 'rail-reversed')
      model.loads.forEach(({ rails }, load) => {
        if (rails.includes(at)) put(load, 'hangs on a reversed rail', worst.value, 1);
      });
  }
  return [...found.values()].sort((a, b) => a.rank - b.rank || b.size - a.size).map(({ board }) => board);
}

function resultOf(model: LostReturnModel, opening: JudgedOpening): OpeningResult {
  const { shown, occurrences, verdict } = opening;
  const { volts, outputAmps } = shown.solution;
  const reversedOf = ({ kind, at, worst }: Occurrence) => (kind === 'rail-reversed' ? [{ name: model.rails[at]?.name ?? '', volts: worst.value }] : []);
  const closed = opening.opens.length === 0;
  return {
    opens: opening.opens.map((k) => model.returns[k]?.name ?? ''),
    verdict,
    sentence: closed ? 'With every return in place.' : `${openingInWords(model, opening)}: ${verdict}.`,
    reversedRails: occurrences.flatMap(reversedOf),
    diodes: model.diodes.map(({ name, ratedAmps }, k) => {
      const mostAmps = opening.diodeAmps[k] ?? 0;
      return { name, mostAmps, ratedAmps, overRated: ratedAmps === null ? null : mostAmps > ratedAmps };
    }),
    limiting: opening.limiting.map((rail) => model.rails[rail]?.name ?? ''),
    exposedBoards: exposedBoards(model, opening),
    worstCase: {
      rails: model.network.outputs.map(({ terminal, zero }, rail) => ({
        name: model.rails[rail]?.name ?? '',
        state: shown.states[rail] ?? 'on',
        volts: (volts[terminal] ?? 0) - (volts[zero] ?? 0),
        amps: outputAmps[rail] ?? 0,
      })),
      nodes: model.nodeNames.map((name, node) => ({ name, volts: volts[node] ?? 0 })),
    },
  };
}

const VERDICTS: readonly OpeningVerdict[] = ['harmless', 'out of tolerance', 'destructive'];

function worstOf(openings: readonly OpeningResult[]): OpeningResult | null {
  const worst = openings.reduce<OpeningResult | null>(
    (most, one) => (most === null || VERDICTS.indexOf(one.verdict) > VERDICTS.indexOf(most.verdict) ? one : most),
    null,
  );
  return worst === null || worst.verdict === 'harmless' ? null : worst;
}

function faultInWords({ says, suspects, asItStandsVolts }: ReturnFault): string {
  const [first] = suspects;
  const named = andList(suspects.map(({ name, ohms }) => `${name} at ${shortOhms(ohms)}`));
  if (says === 'nothing amiss') return 'The readings fit good wires throughout.';
  if (says === 'no single wire' || first === undefined)
    return `No single wire explains the readings, which are ${shortVolts(asItStandsVolts)} off: suspect more than one wire, the loads as entered, or the meter’s leads.`;
  if (says === 'one wire') return `${first.name} is at fault: about ${shortOhms(first.ohms)}, where ${shortOhms(first.goodOhms)} belongs.`;
  return `The readings cannot tell ${named} apart: measure each dead, end to end.`;
}

function headlineOf(result: LostReturnResult): string {
  if (result.fault !== null) return faultInWords(result.fault);
  return result.worst?.sentence ?? 'No return, and no pair of them, takes a rail or a board out of tolerance when it opens.';
}

function formulaOf(model: LostReturnModel, judged: JudgedOpenings, result: LostReturnResult): readonly string[] {
  const { network, returns, diodes } = model;
  const states = statesOf(model).length;
  const lines = [
    `${String(result.openings.length + 1)} openings × ${String(states)} states of ${String(model.rails.length)} rails = ${String(judged.solved)} cases of ${String(network.nodes)} nodes, all settled; power balances to ${judged.imbalance < 1e-9 ? 'better than 10⁻⁹' : judged.imbalance.toPrecision(1)}`,
    ...returns.map(({ name, resistor }) => `${name}: ${shortOhms(network.resistors[resistor]?.ohms ?? 0)}`),
    ...diodes.map(({ name }, k) => {
      const card = network.diodes[k];
      return `${name}: IS ${shortAmps(card?.saturationAmps ?? 0)}, N ${String(card?.emission ?? 0)}, ${shortOhms(card?.seriesOhms ?? 0)}`;
    }),
  ];
  if (judged.closed.verdict !== 'harmless') {
    const { occurrences } = judged.closed;
    const boards = occurrences.flatMap(({ kind, at, worst }) => (kind === 'load-out' ? [`${model.loads[at]?.name ?? ''} ${shortVolts(worst.value)}`] : []));
    if (boards.length > 0) lines.push(`before anything opens, out of tolerance: ${andList(boards)}`);
  }
  for (const { sentence, verdict, exposedBoards: boards } of result.openings) {
    if (verdict === 'harmless') continue;
    lines.push(boards.length === 0 ? sentence : `${sentence} Exposed: ${andList(boards.map(({ name }) => name))}.`);
  }
  if (result.fault !== null) lines.push(faultInWords(result.fault));
  return lines;
}

const validity =
  'Direct current, settled. Boards are taken as resistors of their amps at nominal volts; chips that are reversed conduct more than that, so a reversed board passes more and stands less. Diodes at 27 °C, without breakdown; a hot junction drops less. An output that is off is 10 kΩ and the diodes named. With more than three rails each state of each rail and of each pair is worked out, not every mixture. Instants, such as a choke letting go, are not in it.';
const source =
  'Modified nodal analysis with Shockley’s diode equation: any textbook on circuit simulation. Resistivity of copper: IEC 60028. −0.5 V and 7 V on 5 V logic: 74-series data sheets, absolute maximum. Diode cards, 1.4 × nominal on other rails, and what counts as in limit: common practice, no source.';
const caution =
  'Never open a return to see what happens: a return is opened only when proved dead. If one was found off, count every board on its rails as exposed until it is tested. Local codes, the maker’s data and licensed practice come first.';

/** Lost return. */
export const sheet = defineSheet({
  id: 'lost-return',
  title: 'Lost return',
  question: 'What happens when this ground wire comes off, and which wire do the readings accuse?',
  inputs: lostReturnInputs,
  law: [
    'each node: the currents into it add up to nothing',
    'diode: I = IS × (e^((V − I × R) ÷ (N × 25.9 mV)) − 1)',
    'output: holds its volts from 0 A to its limit, gives the limit below that, takes nothing unless it is said to',
    `in limit: its heaviest load all but shorted, so that ${String(LIMIT_VOLTS_SHARE * 100)} % of its volts would draw the limit`,
    'wire: R = 17.241 nΩm × length ÷ area + contacts',
    'destructive: a rail or board reversed by 0.5 V or more, more than 1.4 × its volts, or a diode above its rated amps; out of tolerance: a board whose rails are all on',
    'readings: rails held at what was read at the supply; for each wire the ohms that leave least between readings and network',
  ],
  validity,
  source,
  caution,
  checks: [
    'Every node of more than 200 generated supplies within 1 mV or 0.1 % of ngspice with the same diode cards',
    'Power given and heat balance to 10⁻⁹ in every case',
    'A negative rail rated 5 A may limit only near 20 A, and that is what flows through the other rail’s freewheel diode: common practice, no source',
    'The choke’s few milliohms do not save the diode: common practice, no source',
  ],
  example: lostReturnExample,
  compute(given): SheetAnswer<LostReturnResult> | SheetRefusal {
    const model = lostReturnModel(given);
    if ('ok' in model) return model;
    const judged = judgeOpenings(model);
    const [stuck] = judged.unsettled;
    if (stuck !== undefined) {
      const opened = stuck.opens.length === 0 ? 'every return in place' : `${andList(stuck.opens.map((k) => model.returns[k]?.name ?? ''))} open`;
      return {
        ok: false,
        field: 'rails',
        say: `The network did not settle with ${opened}, so there is no answer: look for ohms or amps that are out by a power of ten.`,
      };
    }
    const fault = given.readings.length === 0 ? null : findFault(model, given.readings);
    if (fault !== null && 'ok' in fault) return fault;
    const openings = judged.openings.map((opening) => resultOf(model, opening));
    const singles = openings.filter(({ opens }) => opens.length === 1);
    const worst = [worstOf(singles), worstOf(openings)].reduce((a, b) =>
      a !== null && b !== null && VERDICTS.indexOf(a.verdict) >= VERDICTS.indexOf(b.verdict) ? a : b,
    );
    const result: LostReturnResult = {
      verdict: worst?.verdict ?? 'harmless',
      closed: resultOf(model, judged.closed),
      openings,
      worst,
      solvedCases: judged.solved,
      powerImbalance: judged.imbalance,
      fault,
    };
    return { ok: true, result, headline: headlineOf(result), formula: formulaOf(model, judged, result), caution, validity, source };
  },
});
