/** Lost return: what happens to rails, boards and diodes when a ground wire comes off, and which wire readings accuse. */
import { lostReturnExample } from '@/shared/workings/lostReturnExample';
import { findFault } from '@/shared/workings/lostReturnFault';
import { faultInWords, lostReturnFormula } from '@/shared/workings/lostReturnFormula';
import { lostReturnInputs } from '@/shared/workings/lostReturnInputs';
import { LIMIT_VOLTS_SHARE, lostReturnModel } from '@/shared/workings/lostReturnModel';
import { judgeOpenings } from '@/shared/workings/lostReturnOpenings';
import { lostReturnDrawing } from '@/shared/workings/lostReturnDrawing';
import { openingResult } from '@/shared/workings/lostReturnReport';
import type { LostReturnResult, OpeningResult } from '@/shared/workings/lostReturnResult';
import { lostReturnResult, VERDICTS } from '@/shared/workings/lostReturnResult';
import { andList } from '@/shared/workings/lostReturnWords';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { defineSheet } from '@/shared/workings/sheet';

function worstOf(openings: readonly OpeningResult[]): OpeningResult | null {
  const worst = openings.reduce<OpeningResult | null>(
    (most, one) => (most === null || VERDICTS.indexOf(one.verdict) > VERDICTS.indexOf(most.verdict) ? one : most),
    null,
  );
  return worst === null || worst.verdict === 'harmless' ? null : worst;
}

function headlineOf(result: LostReturnResult): string {
  if (result.fault !== null) return faultInWords(result.fault);
  return result.worst?.sentence ?? 'No return, and no pair of them, takes a rail or a board out of tolerance when it opens.';
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
  output: lostReturnResult,
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
      const opened =
        stuck.opens.length === 0 ? 'every return in place' : `${andList(stuck.opens.map((k) => model.returns[k]?.name ?? ''))} open`;
      return {
        ok: false,
        field: 'rails',
        say: `The network did not settle with ${opened}, so there is no answer: look for ohms or amps that are out by a power of ten.`,
      };
    }
    const fault = given.readings.length === 0 ? null : findFault(model, given.readings);
    if (fault !== null && 'ok' in fault) return fault;
    const openings = judged.openings.map((opening) => openingResult(model, opening));
    const singles = openings.filter(({ opens }) => opens.length === 1);
    const worst = [worstOf(singles), worstOf(openings)].reduce((a, b) =>
      a !== null && b !== null && VERDICTS.indexOf(a.verdict) >= VERDICTS.indexOf(b.verdict) ? a : b,
    );
    const result: LostReturnResult = {
      verdict: worst?.verdict ?? 'harmless',
      closed: openingResult(model, judged.closed),
      openings,
      worst,
      solvedCases: judged.solved,
      powerImbalance: judged.imbalance,
      fault,
    };
    const shown = worst === null ? judged.closed : (judged.openings[openings.indexOf(worst)] ?? judged.closed);
    const drawing = lostReturnDrawing(model, shown, fault);
    return {
      ok: true,
      result,
      headline: headlineOf(result),
      formula: lostReturnFormula(model, judged, shown, result),
      drawing,
      caution,
      validity,
      source,
    };
  },
});
