/** Parts that store energy, against the limits of the workshop (H3). */
import type { Profile, Store } from '../document/profile';
import type { Settings } from '../document/settings';

/** Energy in joules that the part can hold at its working volts: ½ C V². */
export function storedJoules(store: Store): number {
  return 0.5 * store.farads * store.voltsWorked ** 2;
}

/** A part that can hold more than 60 V DC with more than 350 mJ, or more than 10 J at any voltage, is discharged before it is proved. */
export function needsDischarge(store: Store, settings: Settings): boolean {
  const joules = storedJoules(store);
  return (store.voltsWorked > settings.storedVolts && joules > settings.storedJoules) || joules > settings.storedJoulesAnyVolts;
}

/** The parts of the profile that H3 names. */
export function partsToDischarge(profile: Profile, settings: Settings): Store[] {
  return profile.stores.filter((s) => needsDischarge(s, settings));
}
