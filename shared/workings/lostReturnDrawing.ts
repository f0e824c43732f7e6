/** The circuit of the lost-return sheet's worst case, with its volts and amps. */
import type { LostReturnModel, ModelWire } from '@/shared/workings/lostReturnModel';
import { shortAmps } from '@/shared/workings/lostReturnModel';
import type { JudgedOpening } from '@/shared/workings/lostReturnOpenings';
import type { ReturnFault } from '@/shared/workings/lostReturnResult';
import { openingInWords } from '@/shared/workings/lostReturnWords';
import type { Circuit, CircuitBranch, CircuitNode } from '@/shared/workings/plot';

/** Share of the largest current from which a branch counts as on the way that it takes. */
const LIT_SHARE = 0.3;

/** A diode's trouble, a source's, or none. */
const trouble = (words: string | null) => (words === null ? {} : { trouble: words });

/** Draws the case shown of an opening; wires that the readings accuse are marked in the network as it stands. */
export function lostReturnDrawing(model: LostReturnModel, opening: JudgedOpening, fault: ReturnFault | null): Circuit {
  const { network, nodeNames, rails } = model;
  const { solution, states } = opening.shown;
  const { volts, outputAmps, diodeAmps } = solution;
  const open = new Set(opening.opens.flatMap((k) => model.returns[k]?.resistor ?? []));
  const accused = new Set(fault?.suspects.map(({ name }) => name) ?? []);
  const id = (node: number): string => `n${String(node)}`;
  const across = (from: number, to: number): number => (volts[from] ?? 0) - (volts[to] ?? 0);
  const atSupply = new Set(network.outputs.flatMap(({ terminal, zero }) => [terminal, zero]));
  const reversed = new Set(
    opening.occurrences.flatMap(({ kind, at }) => {
      if (kind === 'rail-reversed') return [network.outputs[at]?.terminal ?? -1];
      if (kind !== 'load-reversed') return [];
      const load = model.loads[at];
      return load === undefined ? [] : [load.from];
    }),
  );
  const nodes = nodeNames.map((label, node): CircuitNode => ({
    id: id(node),
    label,
    volts: volts[node] ?? null,
    side: atSupply.has(node) ? 'supply' : 'load',
    ...trouble(reversed.has(node) ? 'reversed' : null),
  }));
  const wire = ({ name, resistor }: ModelWire): CircuitBranch[] => {
    const found = network.resistors[resistor];
    if (found === undefined) return [];
    const isOpen = open.has(resistor);
    const mark: Pick<CircuitBranch, 'mark'> = isOpen ? { mark: 'opened' } : accused.has(name) ? { mark: 'accused' } : {};
    const amps = isOpen ? 0 : across(found.from, found.to) / found.ohms;
    return [{ id: `r${String(resistor)}`, kind: 'conductor', label: name, from: id(found.from), to: id(found.to), amps, ...mark }];
  };
  const firstLoad = network.resistors.length - model.loads.length;
  const branches: CircuitBranch[] = [
    ...network.outputs.map(({ terminal, zero }, rail): CircuitBranch => {
      const state = states[rail] === 'off' ? 'off' : opening.limiting.includes(rail) ? 'in limit' : null;
      return {
        id: `s${String(rail)}`,
        kind: 'source',
        label: rails[rail]?.name ?? '',
        from: id(terminal),
        to: id(zero),
        amps: -(outputAmps[rail] ?? 0),
        ...trouble(state),
      };
    }),
    ...model.feeds.flatMap(wire),
    ...model.returns.flatMap(wire),
    ...model.loads.map(({ name, from, to }, k): CircuitBranch => {
      const resistor = network.resistors[firstLoad + k];
      const extra = opening.shown.added.filter((one) => one.from === from && one.to === to);
      const amps = [resistor, ...extra].reduce((sum, one) => sum + (one === undefined ? 0 : across(from, to) / one.ohms), 0);
      return {
        id: `l${String(k)}`,
        kind: 'load',
        label: name,
        from: id(from),
        to: id(to),
        amps,
        ...trouble(extra.length > 0 ? 'all but shorted' : null),
      };
    }),
    ...network.diodes.map(({ anode, cathode }, k): CircuitBranch => {
      const row = model.diodes[k];
      const amps = diodeAmps[k] ?? 0;
      const rated = row?.ratedAmps ?? null;
      const over = rated !== null && amps > rated ? `above its ${shortAmps(rated)}` : null;
      return { id: `d${String(k)}`, kind: 'diode', label: row?.name ?? '', from: id(anode), to: id(cathode), amps, ...trouble(over) };
    }),
  ];
  const most = Math.max(0, ...branches.map(({ amps }) => Math.abs(amps ?? 0)));
  const drawn = branches.map((branch) =>
    opening.opens.length > 0 && Math.abs(branch.amps ?? 0) >= LIT_SHARE * most && most > 0 ? { ...branch, lit: true } : branch,
  );
  const drawnWith = rails.map(({ name }, rail) => `${name} ${states[rail] === 'limit' ? 'in limit' : (states[rail] ?? 'on')}`).join(', ');
  const says = opening.opens.length === 0 ? 'Every return in place' : openingInWords(model, opening);
  return {
    title: opening.opens.length === 0 ? 'As it stands' : 'Worst case',
    nodes,
    branches: drawn,
    words: `${says}. Drawn with ${drawnWith}.`,
  };
}
