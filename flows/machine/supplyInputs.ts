/** What the sheets about a supply's parts want to know of this machine. */
import type { Profile, Rail, Store } from '../document/profile';

/** Years without volts where a tree says nothing: long enough for the most careful plan. Common practice, no source. */
const LONG_YEARS = 20;

/** A part that stores energy, to be formed to the volts that it works at. */
export function reformInputs(store: Store | undefined, storageYears = LONG_YEARS): Record<string, unknown> | null {
  if (store === undefined) return null;
  return { farads: store.farads, ratedVolts: store.voltsRated, targetVolts: store.voltsWorked, ageYears: Math.max(LONG_YEARS, storageYears), storageYears };
}

/** The rail that is named, or all of them, with their minimum loads and the rails that boards want first. */
export function loadPlanInputs(profile: Profile, railId: string | undefined): Record<string, unknown> {
  const first = new Set(profile.boards.fitted.map((board) => board.biasFirst));
  const named = profile.rails.filter((rail) => rail.id === railId);
  const rails = (named.length > 0 ? named : profile.rails).slice(0, 12).map((rail) => ({
    name: rail.name,
    nominalVolts: rail.nominal,
    tolerancePercent: Number((rail.tolerance * 100).toPrecision(12)),
    maxAmps: rail.maxAmps,
    minimumAmps: Math.min(rail.maxAmps, profile.minimumLoad.find((least) => least.rail === rail.id)?.amps ?? 0),
    sense: rail.sense,
    first: first.has(rail.id) ? 'yes' : 'no',
  }));
  return { rails, load: 'electronic' };
}

/** The pass device between the raw node and a rail, at a share of the rail's rating; null without a raw node above the rail. */
export function passInputs(profile: Profile, rail: Rail | undefined, share = 1): Record<string, unknown> | null {
  if (profile.raw === null || rail === undefined || profile.raw.volts <= Math.abs(rail.nominal)) return null;
  const style = profile.supplyKind === 'linear' ? 'linear' : 'switching';
  return { inputVolts: profile.raw.volts, outputVolts: Math.abs(rail.nominal), amps: rail.maxAmps * share, style };
}
