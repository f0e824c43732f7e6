/** The sheet of workings that a step shows, filled in from the machine's profile. */
import { sheetById } from '@/shared/workings/list';
import type { AnySheet } from '@/shared/workings/list';

import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Limit, Step } from '../document/steps';
import { partsToDischarge } from '../facts/stores';

type Reference = NonNullable<Step['workings']>;

export interface StepWorkings {
  sheet: AnySheet;
  /** inputs as the sheet takes them, SI */
  inputs: Record<string, unknown>;
  answer: ReturnType<AnySheet['compute']>;
}

/** The workings of a step for this machine, or null where it shows none or the profile cannot fill it. */
export function workingsOf(step: Step, profile: Profile, settings: Settings): StepWorkings | null {
  if (step.workings === undefined) return null;
  const lamp = step.kind === 'energise' || step.kind === 'raise' ? step.lampWatts : undefined;
  return fill({ ...(lamp === undefined ? {} : { lampWatts: lamp }), ...step.workings }, profile, settings);
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

function fill(reference: Reference, profile: Profile, settings: Settings): StepWorkings | null {
  const sheet = sheetById(reference.sheet);
  const inputs = inputsOf(reference, profile, settings);
  if (sheet === undefined || inputs === null) return null;
  const parsed = sheet.inputs.safeParse(inputs);
  return parsed.success ? { sheet, inputs, answer: sheet.compute(parsed.data) } : null;
}

function inputsOf(reference: Reference, profile: Profile, settings: Settings): Record<string, unknown> | null {
  const { mains } = profile;
  switch (reference.sheet) {
    case 'series-lamp':
      return reference.lampWatts === undefined
        ? null
        : { supplyVolts: mains.volts, lampVolts: mains.volts, lampWatts: reference.lampWatts, load: profile.supplyKind === 'switch-mode' ? 'switch-mode' : 'rectifier', loadWatts: mains.voltAmps * (reference.loadShare ?? 1) };
    case 'bleed-down': {
      const stores = partsToDischarge(profile, settings).length > 0 ? partsToDischarge(profile, settings) : profile.stores;
      const store = profile.stores.find((s) => s.id === reference.store) ?? [...stores].sort((a, b) => b.farads * b.voltsWorked ** 2 - a.farads * a.voltsWorked ** 2)[0];
      return store === undefined ? null : { farads: store.farads, volts: store.voltsWorked, safeVolts: settings.deadVolts, bleederOhms: null, toolOhms: reference.toolOhms ?? null };
    }
    case 'rail-limits':
    case 'reading-limit': {
      const rail = profile.rails.find((r) => r.id === reference.rail) ?? profile.rails[0];
      if (rail === undefined) return null;
      if (reference.sheet === 'rail-limits') return { nominalVolts: rail.nominal, tolerancePercent: rail.tolerance * 100 };
      const edges = [rail.nominal * (1 - rail.tolerance), rail.nominal * (1 + rail.tolerance)];
      return { quantity: 'volts-dc', reading: rail.nominal, low: Math.min(...edges), high: Math.max(...edges) };
    }
  }
}

function numberAt(result: unknown, path: string): number | null {
  const found = path.split('.').reduce<unknown>((value, key) => (typeof value === 'object' && value !== null && Object.hasOwn(value, key) ? (value as Record<string, unknown>)[key] : undefined), result);
  return typeof found === 'number' && Number.isFinite(found) ? found : null;
}
