/** The sentence in which an opening of returns is told at the bench. */
import type { RailState } from '@/shared/workings/lostReturnCases';
import type { LostReturnModel } from '@/shared/workings/lostReturnModel';
import { shortAmps, shortVolts } from '@/shared/workings/lostReturnModel';
import type { JudgedOpening, Occurrence } from '@/shared/workings/lostReturnOpenings';

/** Amps from which a diode is said to conduct. */
const SPEAKS_FROM_AMPS = 0.01;

/** Reverse volts below which any junction would hold it, conducting or not. */
const UNHELD_VOLTS = 0.3;

/** Names in a row: “a”, “a and b”, “a, b and c”. */
export function andList(names: readonly string[]): string {
  const last = names[names.length - 1] ?? '';
  return names.length < 2 ? last : `${names.slice(0, -1).join(', ')} and ${last}`;
}

function statesInWords(states: ReadonlySet<RailState>): string | null {
  if (states.has('on')) return states.has('off') ? null : 'on';
  if (states.has('off')) return states.has('limit') ? 'off or in limit' : 'off';
  return 'in limit';
}

/** What must be so for it to come up; rails whose state makes no difference are left out. */
export function conditionsOf(model: Pick<LostReturnModel, 'rails'>, { kind, states }: Pick<Occurrence, 'kind' | 'states'>): string {
  const said = model.rails.flatMap(({ name }, rail) => {
    const words = statesInWords(states[rail] ?? new Set());
    return words === null ? [] : [{ words, name }];
  });
  const on = said.filter(({ words }) => words === 'on').map(({ name }) => `${name} on`);
  const rest = said.filter(({ words }) => words !== 'on').map(({ words, name }) => `${name} ${words}`);
  // Something has to drive a rail backwards, also where no one rail alone is needed for it.
  const driven = kind === 'rail-reversed' || kind === 'load-reversed';
  const parts = [...on, ...rest, ...(driven && on.length === 0 ? ['another rail on'] : [])];
  return parts.length === 0 ? 'Whatever the rails do' : `With ${andList(parts)}`;
}

/** The diode that holds a reversed rail, with the most that flows through it. */
function holdingDiode(
  model: LostReturnModel,
  { at, diodeAmps }: Occurrence,
): { name: string; part: string; amps: number; rated: number | null } | null {
  const terminal = model.network.outputs[at]?.terminal;
  const held = model.network.diodes
    .flatMap(({ anode, cathode }, k) => (anode === terminal || cathode === terminal ? [{ k, amps: diodeAmps[k] ?? 0 }] : []))
    .filter(({ amps }) => amps >= SPEAKS_FROM_AMPS)
    .sort((a, b) => b.amps - a.amps)[0];
  const row = held === undefined ? undefined : model.diodes[held.k];
  return held === undefined || row === undefined ? null : { name: row.name, part: row.part, amps: held.amps, rated: row.ratedAmps };
}

const PARTS: Readonly<Record<string, string>> = { freewheel: 'freewheel diode', rectifier: 'rectifier', clamp: 'clamp diode' };

function whatHappens(model: LostReturnModel, occurrence: Occurrence): string {
  const { kind, at, worst } = occurrence;
  const value = shortVolts(worst.value);
  const load = model.loads[at];
  const belongs = shortVolts(load?.nominalVolts ?? 0);
  switch (kind) {
    case 'rail-reversed': {
      const name = model.rails[at]?.name ?? '';
      const diode = holdingDiode(model, occurrence);
      if (diode === null) return `pulls ${name} to ${value}${Math.abs(worst.value) < UNHELD_VOLTS ? '' : ', with no diode to hold it'}`;
      const over = diode.rated !== null && diode.amps > diode.rated ? `, above its rated ${shortAmps(diode.rated)}` : '';
      const part = diode.name.toLowerCase().includes(diode.part) ? diode.name : `${PARTS[diode.part] ?? 'diode'} ${diode.name}`;
      return `pulls ${name} to ${value} through its ${part} at up to ${shortAmps(diode.amps)}${over}`;
    }
    case 'diode-over': {
      const row = model.diodes[at];
      return `puts ${shortAmps(worst.value)} through ${row?.name ?? ''}, rated ${shortAmps(row?.ratedAmps ?? 0)}`;
    }
    case 'rail-over':
      return `pushes ${model.rails[at]?.name ?? ''} up to ${value}`;
    case 'load-reversed':
    case 'load-over':
      return `puts ${value} on ${load?.name ?? ''} where ${belongs} belongs`;
    case 'load-out':
      return `leaves ${load?.name ?? ''} ${value} of ${belongs}`;
  }
}

/** One sentence without its full stop: what must be so, what is opened, what follows. */
export function openingInWords(model: LostReturnModel, { opens, occurrences }: JudgedOpening): string {
  const names = andList(opens.map((k) => model.returns[k]?.name ?? ''));
  const [worst] = occurrences;
  if (worst === undefined) return `Opening ${names} leaves every rail and board within tolerance`;
  return `${conditionsOf(model, worst)}, opening ${names} ${whatHappens(model, worst)}`;
}
