/** Turns a judged opening into what the sheet tells of it. */
import type { LostReturnModel } from '@/shared/workings/lostReturnModel';
import type { JudgedOpening, Occurrence } from '@/shared/workings/lostReturnOpenings';
import type { ExposedBoard, OpeningResult } from '@/shared/workings/lostReturnResult';
import { openingInWords } from '@/shared/workings/lostReturnWords';

function exposedBoards(model: LostReturnModel, { occurrences }: JudgedOpening): readonly ExposedBoard[] {
  const reversed = new Set(occurrences.flatMap(({ kind, at }) => (kind === 'rail-reversed' ? [at] : [])));
  const onNegative = new Set(
    model.loads.flatMap(({ name, rails }) => (rails.some((rail) => (model.rails[rail]?.volts ?? 0) < 0) ? [name] : [])),
  );
  const found = new Map<string, { rank: number; size: number; board: ExposedBoard }>();
  const put = (load: number, how: ExposedBoard['how'], volts: number, size: number): void => {
    const { name, nominalVolts, rails } = model.loads[load] ?? { name: '', nominalVolts: null, rails: [] };
    const rank = how === 'reversed' || rails.some((rail) => reversed.has(rail)) ? 0 : onNegative.has(name) ? 1 : 2;
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

/** What the sheet tells of one opening. */
export function openingResult(model: LostReturnModel, opening: JudgedOpening): OpeningResult {
  const { shown, occurrences, verdict } = opening;
  const { volts, outputAmps } = shown.solution;
  const reversedOf = ({ kind, at, worst }: Occurrence) =>
    kind === 'rail-reversed' ? [{ name: model.rails[at]?.name ?? '', volts: worst.value }] : [];
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
    exposedBoards: [...exposedBoards(model, opening)],
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
