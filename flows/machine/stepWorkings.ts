/** The sheet of workings that a step shows, filled in from the machine's profile. */
import { copperOhmsPerMetre, mostOhmsPerMetre } from '@/shared/workings/copper';
import { FUSE_MOST_VOLTS } from '@/shared/workings/fuse';
import { sheetById } from '@/shared/workings/list';
import type { AnySheet } from '@/shared/workings/list';
import { uncertaintyOf } from '@/shared/workings/readingLimit';
import type { AccuracySpec } from '@/shared/workings/readingLimit';

import type { Quantity } from '../document/ids';
import type { Profile, Rail, Store } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Limit, Step } from '../document/steps';
import { partsToDischarge } from '../facts/stores';
import { dischargeTool } from './dischargeTool';
import { lostReturnOf } from './lostReturnOf';
import { loadPlanInputs, passInputs, reformInputs } from './supplyInputs';

type Reference = NonNullable<Step['workings']>;

export interface StepWorkings {
  sheet: AnySheet;
  /** inputs as the sheet takes them, SI */
  inputs: Record<string, unknown>;
  answer: ReturnType<AnySheet['compute']>;
}

/** The row that is to be read now and what is read there, with the accuracy of the instrument in hand on its range. */
export interface ReadingNow {
  /** id of the row: a rail, a conductor, a part, or the step's own reading */
  row: string;
  quantity: Quantity;
  /** signed limits in SI, or of size where the row is judged by size; null where there is none */
  low: number | null;
  high: number | null;
  accuracy: Pick<AccuracySpec, 'percent' | 'counts' | 'resolution'>;
  /** as the row judges it; null while nothing is typed, or over range */
  value: number | null;
}

/** Where the run stands: the step's own key and the counted exits so far. */
export type WorkingsPlace = { key: string; counters: readonly { key: string; n: number }[] };

/** The workings of a step for this machine, or null where it shows none or what is known cannot fill it. A reading is set against its limit only with the instrument that takes it. */
export function workingsOf(step: Step, profile: Profile, settings: Settings, now: ReadingNow | null = null, place: WorkingsPlace | null = null): StepWorkings | null {
  if (step.workings === undefined) return null;
  if (step.workings.sheet === 'reading-limit') return now === null ? null : work('reading-limit', { quantity: now.quantity, reading: now.value, low: now.low, high: now.high, ...now.accuracy });
  if (step.workings.sheet === 'lost-return') return lostReturn(profile);
  const lamp = step.kind === 'energise' || step.kind === 'raise' ? step.lampWatts : undefined;
  // a soak reads each row again and again: `p5-2` is the second reading of p5
  const row = now === null ? {} : ofRow(isOfProfile(profile, now.row) ? now.row : now.row.replace(/-\d+$/, ''));
  const reference = { ...(lamp === undefined ? {} : { lampWatts: lamp }), ...row, ...toolOf(step, profile, settings), ...step.workings };
  const inputs = inputsOf(reference, profile, settings, boardsIn(step.workings, place));
  return inputs === null ? null : work(reference.sheet, { ...inputs, ...(now === null ? {} : taken(reference.sheet, step.kind, now, inputs)) });
}

/** A discharge step has its own tool, or the one that the machine chooses for it. */
function toolOf(step: Step, profile: Profile, settings: Settings): Pick<Reference, 'toolOhms' | 'toolWatts'> {
  if (step.kind !== 'discharge') return {};
  const { ohms, watts } = dischargeTool(step, profile, settings);
  return { toolOhms: ohms, toolWatts: watts };
}

/** How many boards are in, by the counted exit that the author names; null where nothing says it. A step of a called tree counts in its own call. */
function boardsIn({ boardsIn: exit }: Reference, place: WorkingsPlace | null): number | null {
  if (exit === undefined || place === null) return null;
  const call = place.key.slice(0, place.key.lastIndexOf('/') + 1);
  return place.counters.find((c) => c.key === `${call}${exit.step}>${exit.exit}`)?.n ?? 0;
}

const ofRow = (id: string) => ({ rail: id, conductor: id, store: id });

const isOfProfile = ({ rails, conductors, stores }: Profile, id: string) => [...rails, ...conductors, ...stores].some((thing) => thing.id === id);

/** What is being read, where the sheet has a place for it. */
function taken(sheet: Reference['sheet'], kind: Step['kind'], { quantity, value, accuracy }: ReadingNow, inputs: Record<string, unknown>): Record<string, unknown> {
  if (value === null) return {};
  const doubt = uncertaintyOf(accuracy, value);
  if (sheet === 'rail-limits' && quantity === 'volts-dc') return { readingVolts: value, guardVolts: doubt };
  // the row of a trip test is judged by size, the sheet wants the sign of the rail
  if (sheet === 'over-voltage-trip' && kind === 'prove-trip') return { readVolts: value * Math.sign(Number(inputs['nominalVolts'])), meterVolts: doubt };
  return sheet === 'wire-drop' && quantity === 'ohms' ? { readOhms: value } : {};
}

/** Limits that come from a sheet: the named numbers of its result. Null where the profile cannot fill the sheet or the result has no such number. */
export function workingsLimits(limit: Extract<Limit, { is: 'workings' }>, row: string | null, reference: Reference | undefined, profile: Profile, settings: Settings): { low: number | null; high: number | null } | null {
  const sheet = limit.sheet as Reference['sheet'];
  const filled = fill({ ...reference, sheet, ...(row === null ? {} : { rail: row, store: row }) }, profile, settings);
  if (filled === null || !filled.answer.ok) return null;
  const result = filled.answer.result;
  const low = limit.low === null ? null : numberAt(result, limit.low);
  const high = limit.high === null ? null : numberAt(result, limit.high);
  if ((limit.low !== null && low === null) || (limit.high !== null && high === null)) return null;
  return low !== null && high !== null && low > high ? { low: high, high: low } : { low, high };
}

/** Hundreds of networks are solved for a lost return, and the machine alone says which: once for each profile is enough. */
const lostReturns = new WeakMap<Profile, { workings: StepWorkings | null }>();

function lostReturn(profile: Profile): StepWorkings | null {
  const known = lostReturns.get(profile);
  if (known !== undefined) return known.workings;
  const inputs = lostReturnOf(profile);
  const workings = inputs === null ? null : work('lost-return', { ...inputs });
  lostReturns.set(profile, { workings });
  return workings;
}

function fill(reference: Reference, profile: Profile, settings: Settings): StepWorkings | null {
  if (reference.sheet === 'lost-return') return lostReturn(profile);
  const inputs = inputsOf(reference, profile, settings);
  return inputs === null ? null : work(reference.sheet, inputs);
}

function work(id: string, inputs: Record<string, unknown>): StepWorkings | null {
  const sheet = sheetById(id);
  const parsed = sheet?.inputs.safeParse(inputs);
  return sheet !== undefined && parsed?.success === true ? { sheet, inputs, answer: sheet.compute(parsed.data) } : null;
}

function inputsOf(reference: Reference, profile: Profile, settings: Settings, boards: number | null = null): Record<string, unknown> | null {
  const { mains } = profile;
  switch (reference.sheet) {
    case 'series-lamp':
      return reference.lampWatts === undefined
        ? null
        : { supplyVolts: mains.volts, lampVolts: mains.volts, lampWatts: reference.lampWatts, load: profile.supplyKind === 'switch-mode' ? 'switch-mode' : 'rectifier', loadWatts: mains.voltAmps * (reference.loadShare ?? 1) };
    case 'bleed-down':
      return bleedInputs(reference, profile, settings);
    case 'reforming':
      return reformInputs(storesOf(reference, profile, settings)[0], reference.storageYears);
    case 'rail-load-plan':
      return loadPlanInputs(profile, reference.rail);
    case 'pass-element':
      return passInputs(profile, heaviestRail(reference, profile.rails), reference.loadShare);
    case 'rail-limits': {
      const rail = railOf(reference, profile.rails);
      return rail === undefined ? null : { nominalVolts: rail.nominal, tolerancePercent: percent(rail.tolerance) };
    }
    case 'reading-limit':
      // the limits of a step never come from it: it wants a reading
      return null;
    case 'wire-drop':
      return wireInputs(reference, profile);
    case 'fuse-inrush':
      return fuseInputs(profile);
    case 'lost-return':
      return lostReturnOf(profile);
    case 'over-voltage-trip':
      return tripInputs(railOf(reference, profile.rails.filter((r) => r.trip !== null)));
    case 'refit-trip':
      return refitInputs(reference, profile, boards);
  }
}

/** The part that is named, else all that must be discharged, the one with most energy first. */
function storesOf(reference: Reference, profile: Profile, settings: Settings): readonly Store[] {
  const named = profile.stores.filter((s) => s.id === reference.store);
  if (named.length > 0) return named;
  const must = partsToDischarge(profile, settings);
  return [...(must.length > 0 ? must : profile.stores)].sort((a, b) => b.farads * b.voltsWorked ** 2 - a.farads * a.voltsWorked ** 2);
}

/** Bleeders are not trusted: the tool alone must do it, on one part after the other. */
function bleedInputs(reference: Reference, profile: Profile, settings: Settings): Record<string, unknown> | null {
  const [store, ...others] = storesOf(reference, profile, settings);
  if (store === undefined) return null;
  return {
    farads: store.farads,
    volts: store.voltsWorked,
    safeVolts: settings.deadVolts,
    toolOhms: reference.toolOhms ?? null,
    ...(reference.toolWatts !== undefined && { toolWatts: reference.toolWatts }),
    others: others.slice(0, 24).map(({ name, farads, voltsWorked }) => ({ name: name.slice(0, 40), farads, volts: voltsWorked })),
  };
}

/** The rail that the author or the row names, else the one of most watts. */
function heaviestRail(reference: Reference, rails: readonly Rail[]): Rail | undefined {
  const watts = ({ nominal, maxAmps }: Rail): number => Math.abs(nominal) * maxAmps;
  return rails.find((r) => r.id === reference.rail) ?? [...rails].sort((a, b) => watts(b) - watts(a))[0];
}

/** The rail that the author or the row names, else the first. */
function railOf(reference: Reference, rails: readonly Rail[]): Rail | undefined {
  return rails.find((r) => r.id === reference.rail) ?? rails[0];
}

/** A tolerance is a fraction in the profile and percent on a sheet; twelve figures drop what binary adds. */
const percent = (fraction: number) => Number((fraction * 100).toPrecision(12));

/** The sheet gives a reading a tenth to spare, and the profile's limit is to be the edge of that. */
const SPARE = 1.1;

/** A return or feed end to end at the most amps of the rails that it serves; its two contacts have what the limit of the profile leaves them. */
function wireInputs(reference: Reference, profile: Profile): Record<string, unknown> | null {
  const wire = profile.conductors.find((c) => c.id === reference.conductor) ?? profile.conductors.find((c) => c.kind === 'return') ?? profile.conductors[0];
  if (wire === undefined) return null;
  const amps = Math.max(0, ...profile.rails.filter((r) => wire.rails.includes(r.id)).map((r) => r.maxAmps));
  const copper = wire.metres * (mostOhmsPerMetre(wire.squareMillimetres, 'flexible') ?? copperOhmsPerMetre(wire.squareMillimetres));
  const contactOhms = Math.min(10, Math.max(0, wire.maxOhms / SPARE - copper) / 2);
  return { squareMillimetres: wire.squareMillimetres, metres: wire.metres, amps, contacts: 2, contactOhms, ...(amps > 0 && { allowedVolts: amps * wire.maxOhms }) };
}

/** Below 200 V the fuse of the plate is taken for one to UL 248-14, else to IEC 60127: common practice, no source. */
function fuseInputs({ mains }: Profile): Record<string, unknown> {
  return { standard: mains.volts < 200 ? 'ul-248-14' : 'iec-60127', speed: mains.fuse.kind, ratedAmps: mains.fuse.amps, ...(mains.volts <= FUSE_MOST_VOLTS && { volts: mains.volts }), loadAmps: mains.voltAmps / mains.volts };
}

/** Most volts of 54 and 74 series logic, taken for what stands on a rail of 5 V (data sheets, absolute maximum). */
const LOGIC_MOST_VOLTS = 7;

function tripInputs(rail: Rail | undefined): Record<string, unknown> | null {
  if (rail === undefined || rail.trip === null) return null;
  const { lowVolts, highVolts } = rail.trip;
  const middle = (lowVolts + highVolts) / 2;
  return {
    nominalVolts: rail.nominal,
    tolerancePercent: percent(rail.tolerance),
    mostVolts: Math.abs(rail.nominal) === 5 ? LOGIC_MOST_VOLTS : null,
    kind: 'set-point',
    tripVolts: middle,
    tripTolerancePercent: percent((highVolts - lowVolts) / 2 / middle),
    limitAmps: rail.limitAmps,
  };
}

/**
 * The board that the author names, else the next after those that are in, on the rail that it draws most from; those before it in the profile are in.
 * Null where neither is known: the first board's limit shown at each of them would be wrong at all others.
 */
function refitInputs(reference: Reference, { boards: { fitted }, rails }: Profile, boards: number | null): Record<string, unknown> | null {
  const at = reference.board === undefined ? (boards ?? -1) : fitted.findIndex((b) => b.id === reference.board);
  const drawn = [...(fitted[at]?.draws ?? [])].sort((a, b) => b.amps - a.amps).find((d) => d.amps > 0 && (reference.rail === undefined || d.rail === reference.rail));
  const rail = rails.find((r) => r.id === drawn?.rail);
  if (drawn === undefined || rail === undefined) return null;
  const before = fitted.slice(0, at).flatMap((b) => b.draws.filter((d) => d.rail === rail.id));
  return { nominalVolts: rail.nominal, lastAmps: before.reduce((sum, d) => sum + d.amps, 0), boardAmps: drawn.amps, railAmps: rail.maxAmps, ownLimitAmps: rail.limitAmps };
}

function numberAt(result: unknown, path: string): number | null {
  const found = path.split('.').reduce<unknown>((value, key) => (typeof value === 'object' && value !== null && Object.hasOwn(value, key) ? (value as Record<string, unknown>)[key] : undefined), result);
  return typeof found === 'number' && Number.isFinite(found) ? found : null;
}
