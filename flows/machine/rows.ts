/** The rows by which a step is answered: one for each rail, return, part or pair that the profile has for it. */
import { formatQuantity } from '@/shared/quantity/formatQuantity';

import type { Quantity } from '../document/ids';
import type { RowResult } from '../document/outcomes';
import { connectorsOf } from '../document/connectors';
import { resolvePoint } from '../document/profile';
import type { Point, Profile, Rail } from '../document/profile';
import type { Limit, Step, StepOf } from '../document/steps';
import type { StepScope } from '../facts/effects';
import { dischargeSeconds, dischargeTool, partsOf } from './dischargeTool';
import { NO_EARTH } from './noEarth';
import { workingsLimits } from './stepWorkings';

/** When a row may be answered: seconds after the step was entered, or after another row was answered. */
export interface RowWait {
  seconds: number;
  from: 'entry' | { row: string };
}

interface RowBase {
  id: string;
  label: string;
  wait: RowWait | null;
  /** what hangs on this row, for whoever answers it and for the record */
  note?: string;
}

export interface WordRow extends RowBase {
  ask: 'word';
  words: { word: string; label: string; result: RowResult | string }[];
}

export interface ReadingRow extends RowBase {
  ask: 'reading';
  quantity: Quantity;
  /** signed limits in SI; null where there is none */
  low: number | null;
  high: number | null;
  nominal: number | null;
  /** judged by size alone: a meter held the other way round reads the same fault */
  bySize: boolean;
  /** judged without a guard band: proving dead and discharging ask for a plain "below" */
  plain: boolean;
  /** a charge that is seen to fall is an answer of its own */
  mayFall: boolean;
  red: Point | null;
  black: Point | null;
  /** set where a point is held against its twin: the twin's own row is taken down and not judged, the other has its limits from it */
  twin?: TwinPart;
}

export type TwinPart = { is: 'twin' } | { is: 'like'; row: string; within: number; /** of the twin's reading, at the limits */ uncertainty: number };

export type Row = WordRow | ReadingRow;

const YES: WordRow['words'][number] = { word: 'done', label: 'Yes', result: 'done' };
const NO: WordRow['words'][number] = { word: 'cannot', label: 'No', result: 'cannot' };
const NOT_SURE: WordRow['words'][number] = { word: 'not-sure', label: 'Not sure', result: 'not-sure' };

/** The rows of a step for this profile; empty for a step that is answered in one word. */
export function rowsOf(step: Step, scope: StepScope): Row[] {
  switch (step.kind) {
    case 'isolate':
      return isolateRows(scope.profile);
    case 'discharge':
      return dischargeRows(step, scope);
    case 'prove-dead':
      return proveDeadRows(scope);
    case 'prove-earth':
      if (scope.profile.mains.protectiveClass === 'II') return [NO_EARTH];
      return [reading('earth', 'Earth pin of the plug to bare metal of the case', { quantity: 'ohms', high: scope.settings.earthOhms + scope.profile.mains.earthLeadOhms })];
    case 'prove-insulation': {
      const { mains } = scope.profile;
      const low = mains.protectiveClass === 'I' ? scope.settings.insulationOhmsClassI : scope.settings.insulationOhmsClassII;
      return [reading('insulation', `Line and neutral together to the case, at ${mains.insulationTestVolts} V DC, switch on`, { quantity: 'ohms', low })];
    }
    case 'prove-returns':
      return scope.profile.conductors
        .filter((c) => c.kind === 'return')
        .map((c) => reading(c.id, `${c.name}: ${c.from} to ${c.to}, ${c.connector} pin ${c.pin}`, { quantity: 'ohms', high: c.maxOhms, bySize: true }));
    case 'prove-trip': {
      const rail = scope.profile.rails.find((r) => r.id === step.rail);
      if (!rail?.trip) return [];
      return [reading(rail.id, `${rail.name}: volts at which the trip fires`, { quantity: 'volts-dc', low: rail.trip.lowVolts, high: rail.trip.highVolts, bySize: true, red: resolvePoint(scope.profile, 'each-rail', rail.id), black: zero(scope) })];
    }
    case 'prove-rails':
      return scope.profile.rails.map((rail) => railRow(rail, scope));
    case 'measure':
      return measureRows(step, scope);
    case 'soak':
      return soakRows(step, scope);
    case 'observe':
      return step.each === undefined
        ? []
        : eachOf(step.each, scope.profile).map((item): WordRow => ({
            id: item.id,
            label: item.name,
            ...(item.note === undefined ? {} : { note: item.note }),
            ask: 'word',
            wait: null,
            words: step.exits.flatMap((e) => (e.on.includes('answer') ? [{ word: e.id, label: e.label ?? e.id, result: e.id }] : [])).concat([NOT_SURE, { word: 'cannot', label: 'Cannot see', result: 'cannot' }]),
          }));
    default:
      return [];
  }
}

/** The rows of the bench opening: the day's checks of the bench, then what the tree asks for. */
export function openingRows(lists: { tools: string[]; instruments: string[]; parts: string[]; conditions: { id: string; name: string }[] }, profile: Profile, caution: string): WordRow[] {
  const row = (id: string, label: string, yes = 'Yes'): WordRow => ({ id, label, ask: 'word', wait: null, words: [{ ...YES, label: yes }, NO] });
  const guard =
    profile.mains.protection === 'rcd'
      ? row('rcd', 'RCD of 30 mA or less: test button pressed today, it tripped')
      : row('transformer', 'Isolating transformer: this one load only, no earth on its outlet, second person here');
  return [
    row('caution', caution, 'I have read this'),
    row('emergency-off', 'Emergency-off of this bench: tried today, it cuts the power'),
    guard,
    row('proving-unit', 'Proving unit: works, and the two-pole tester shows it'),
    ...(lists.instruments.length > 0 ? [row('instruments', `Instruments here and in date: ${lists.instruments.join(', ')}`)] : []),
    ...(lists.tools.length + lists.parts.length > 0 ? [row('tools', `Tools and parts here: ${[...lists.tools, ...lists.parts].join(', ')}`)] : []),
    row('within-call', 'Somebody is within call and knows where the emergency-off is'),
    ...lists.conditions.map((c) => row(c.id, c.name)),
  ];
}

interface ReadingOptions {
  quantity: Quantity;
  low?: number | null;
  high?: number | null;
  nominal?: number | null;
  bySize?: boolean;
  plain?: boolean;
  mayFall?: boolean;
  red?: Point | null;
  black?: Point | null;
  wait?: RowWait | null;
  twin?: TwinPart;
}

function reading(id: string, label: string, o: ReadingOptions): ReadingRow {
  return {
    id,
    label,
    ask: 'reading',
    quantity: o.quantity,
    low: o.low ?? null,
    high: o.high ?? null,
    nominal: o.nominal ?? null,
    bySize: o.bySize ?? false,
    plain: o.plain ?? false,
    mayFall: o.mayFall ?? false,
    red: o.red ?? null,
    black: o.black ?? null,
    wait: o.wait ?? null,
    ...(o.twin === undefined ? {} : { twin: o.twin }),
  };
}

function zero(scope: StepScope): Point | null {
  return resolvePoint(scope.profile, 'zero', null);
}

function railRow(rail: Rail, scope: StepScope, suffix = '', wait: RowWait | null = null): ReadingRow {
  const [low, high] = railLimits(rail.nominal, rail.tolerance);
  return reading(`${rail.id}${suffix}`, rail.name, { quantity: 'volts-dc', low, high, nominal: rail.nominal, red: resolvePoint(scope.profile, 'each-rail', rail.id), black: zero(scope), wait });
}

/** Signed limits of a rail, low below high; for a negative rail "low" in size lies above. */
function railLimits(nominal: number, tolerance: number): [number, number] {
  const a = nominal * (1 - tolerance);
  const b = nominal * (1 + tolerance);
  return a < b ? [a, b] : [b, a];
}

function isolateRows(profile: Profile): WordRow[] {
  const words: WordRow['words'] = [
    { word: 'out', label: 'Out', result: 'out' },
    { word: 'not-out', label: 'Not out', result: 'not-out' },
    { word: 'not-sure', label: 'Not sure', result: 'not-sure' },
  ];
  const row = (id: string, label: string): WordRow => ({ id, label, ask: 'word', wait: null, words });
  return [
    row('mains', `Mains: plug out of the wall and in sight, or locked off. A switch does not count. (${profile.mains.inlet})`),
    row('bench', 'Bench supply: off, and its leads off the machine'),
    ...profile.sources.map((s) => row(s.id, `${s.name}: disconnected`)),
  ];
}

function dischargeRows(step: StepOf<'discharge'>, scope: StepScope): Row[] {
  const { profile, settings } = scope;
  const parts = partsOf(profile, settings);
  if (parts.length === 0) return [{ id: 'none', label: 'No part of this machine stores energy', ask: 'word', wait: null, words: [{ word: 'in', label: 'Go on', result: 'in' }, NOT_SURE] }];
  const tool = dischargeTool(step, profile, settings);
  const through = `${formatQuantity(tool.ohms, 'Ω', { digits: 3 })}, ${tool.watts} W`;
  return parts.map((s) =>
    reading(s.id, `${s.name}: through ${through}; then volts DC across it`, {
      quantity: 'volts-dc',
      high: settings.deadVolts,
      bySize: true,
      plain: true,
      red: resolvePoint(profile, 'each-store', s.id),
      black: zero(scope),
      wait: { seconds: dischargeSeconds(s, tool, settings), from: 'entry' },
    }),
  );
}

function proveDeadRows(scope: StepScope): Row[] {
  const { profile, settings } = scope;
  const dead = { high: settings.deadVolts, bySize: true, plain: true } as const;
  const proof = (id: string, label: string): WordRow => ({ id, label, ask: 'word', wait: null, words: [{ ...YES, label: 'It shows the source' }, { word: 'cannot', label: 'It does not', result: 'cannot' }, NOT_SURE] });
  const pair = (id: string, label: string): ReadingRow => reading(id, `${label}: the larger of AC and DC`, { quantity: 'volts-ac', ...dead });
  const pairs = profile.mains.protectiveClass === 'I' ? [pair('pair-l-n', 'Line to neutral'), pair('pair-l-e', 'Line to earth'), pair('pair-n-e', 'Neutral to earth')] : [pair('pair-l-n', 'Line to neutral')];
  const others = profile.sources.map((s) => pair(`pair-${s.id}`, `${s.name}: across its terminals`));
  const part = (id: string, label: string, name: string, wait: RowWait | null) =>
    reading(id, label, { quantity: 'volts-dc', ...dead, mayFall: true, red: resolvePoint(profile, 'each-store', name), black: zero(scope), wait });
  return [
    proof('proof-before', 'Two-pole tester on the proving unit, before'),
    ...pairs,
    ...others,
    ...(profile.raw ? [reading('node-raw', `${profile.raw.name} to 0 V`, { quantity: 'volts-dc', ...dead, mayFall: true, red: resolvePoint(profile, 'raw', null), black: zero(scope) })] : []),
    ...profile.stores.map((s) => part(`part-${s.id}`, `${s.name}: volts DC across it`, s.id, null)),
    ...profile.stores.filter((s) => s.rebounds).map((s) => part(`again-${s.id}`, `${s.name}: again, after its wait`, s.id, { seconds: s.reboundWaitSeconds, from: { row: `part-${s.id}` } })),
    proof('proof-after', 'Two-pole tester on the proving unit, after'),
  ];
}

function eachOf(each: 'rails' | 'returns' | 'stores' | 'points' | 'connectors', profile: Profile): { id: string; name: string; note?: string }[] {
  switch (each) {
    case 'rails':
      return profile.rails;
    case 'returns':
      return profile.conductors.filter((c) => c.kind === 'return');
    case 'stores':
      return profile.stores;
    case 'points':
      return profile.points;
    case 'connectors':
      return connectorsOf(profile);
  }
}

function measureRows(step: StepOf<'measure'> | StepOf<'soak'>, scope: StepScope, suffix = '', wait: RowWait | null = null): ReadingRow[] {
  const black = resolvePoint(scope.profile, step.points?.black ?? 'zero', null);
  if (step.limit.is === 'twin') return twinRows(step, step.limit, scope, black);
  if (step.each === undefined) {
    const red = step.points?.red === undefined ? null : resolvePoint(scope.profile, step.points.red, null);
    const { low, high, nominal } = limitsOf(step, null, null, scope);
    return [reading(`reading${suffix}`, red?.name ?? step.title, { quantity: step.quantity, low, high, nominal, bySize: isBySize(step), red, black: step.quantity === 'celsius' ? null : black, wait })];
  }
  if (step.each === 'rails') {
    return scope.profile.rails.map((rail) => {
      const { low, high, nominal } = limitsOf(step, rail, rail.id, scope);
      return reading(`${rail.id}${suffix}`, rail.name, { quantity: step.quantity, low, high, nominal, bySize: isBySize(step), red: resolvePoint(scope.profile, 'each-rail', rail.id), black, wait });
    });
  }
  return eachOf(step.each, scope.profile).map((item) => {
    const { low, high, nominal } = limitsOf(step, null, item.id, scope);
    return reading(`${item.id}${suffix}`, item.name, { quantity: step.quantity, low, high, nominal, bySize: isBySize(step), red: resolvePoint(scope.profile, step.each === 'stores' ? 'each-store' : item.id, item.id), black, wait });
  });
}

/** The twin first: its reading is what the other one is held against. */
function twinRows(step: StepOf<'measure'> | StepOf<'soak'>, limit: Extract<Limit, { is: 'twin' }>, scope: StepScope, black: Point | null): ReadingRow[] {
  const at = (name: string | undefined) => (name === undefined ? null : resolvePoint(scope.profile, name, null));
  const [red, twin] = [at(step.points?.red), at(step.points?.twin)];
  const common = { quantity: step.quantity, black: step.quantity === 'celsius' ? null : black };
  return [
    reading('twin', `Twin: ${limit.of}${twin === null ? '' : `, ${twin.name}`}`, { ...common, red: twin, twin: { is: 'twin' } }),
    reading('reading', red?.name ?? step.title, { ...common, red, twin: { is: 'like', row: 'twin', within: limit.within, uncertainty: 0 } }),
  ];
}

/** A row that is held against its twin, with the limits that the twin's reading gives; as it was while the twin has not been read. */
export function likeTwin(row: Row, twin: { value: number | 'over' | null; uncertainty?: number } | undefined): Row {
  if (row.ask !== 'reading' || row.twin?.is !== 'like' || twin === undefined || twin.value === null) return row;
  // an open twin: nothing that can be read is like it
  if (twin.value === 'over') return { ...row, low: Infinity, high: null };
  const [low, high] = railLimits(twin.value, row.twin.within);
  return { ...row, low, high, nominal: twin.value, twin: { ...row.twin, uncertainty: (twin.uncertainty ?? 0) * (1 + row.twin.within) } };
}

function soakRows(step: StepOf<'soak'>, scope: StepScope): ReadingRow[] {
  const times = Math.floor(step.holdMinutes / step.everyMinutes);
  return Array.from({ length: times }, (_, i) => {
    const minutes = (i + 1) * step.everyMinutes;
    return measureRows(step, scope, `-${i + 1}`, { seconds: minutes * 60, from: 'entry' }).map((row) => ({ ...row, label: `${row.label}, at ${minutes} min` }));
  }).flat();
}

/** “Below” and “above” speak of size: 20 mA the wrong way round is not below 5 mA. Degrees have a sign of their own. */
function isBySize(step: StepOf<'measure'> | StepOf<'soak'>): boolean {
  return (step.limit.is === 'below' || step.limit.is === 'above') && step.quantity !== 'celsius';
}

/** The limit of a row as signed low and high; both null where a sheet cannot be filled, which the layout reports as a fault. */
function limitsOf(step: StepOf<'measure'> | StepOf<'soak'>, rail: Rail | null, row: string | null, scope: StepScope): { low: number | null; high: number | null; nominal: number | null } {
  const { limit } = step;
  switch (limit.is) {
    case 'nominal': {
      const nominal = limit.of === 'row' ? (rail?.nominal ?? 0) : limit.of;
      const tolerance = limit.tolerance === 'row' ? (rail?.tolerance ?? 0) : limit.tolerance;
      const [low, high] = railLimits(nominal, tolerance);
      return { low, high, nominal };
    }
    case 'between':
      return { low: limit.low, high: limit.high, nominal: null };
    case 'below':
      return { low: null, high: limit.high, nominal: null };
    case 'above':
      return { low: limit.low, high: null, nominal: null };
    case 'twin':
      return { low: null, high: null, nominal: null };
    case 'workings':
      return { low: null, high: null, ...workingsLimits(limit, row, step.workings, scope.profile, scope.settings), nominal: rail?.nominal ?? null };
  }
}
