/** How high a point can be while the supply is on. */
import type { Profile } from '../document/profile';
import type { ReadingRow } from './rows';

/** DC volts of the point that a row reads, or null where the profile does not say: such a point counts as mains. */
export function exposedVolts(row: ReadingRow, profile: Profile): number | null {
  const rail = profile.rails.find((r) => r.id === row.red?.rail);
  if (rail !== undefined) return Math.abs(rail.nominal);
  if (row.red === null) return null;
  if (row.red.id === profile.raw?.point) return profile.raw.volts;
  const store = profile.stores.find((s) => s.point === row.red?.id);
  if (store !== undefined) return store.voltsWorked;
  return row.red.id === profile.zeroPoint ? 0 : null;
}
