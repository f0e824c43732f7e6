/** Whether a tree applies to a machine: asked before a run, and of every profile that a proof for issue goes over. */
import { tripRails } from './profile';
import type { Profile } from './profile';
import type { Tree } from './tree';

/** Why the tree does not apply to the profile, a clause each; empty when it does. `serial` is left out where none is known. */
export function misfits(tree: Tree, profile: Profile, serial?: string): string[] {
  const { appliesTo } = tree;
  const rails = profile.rails.length;
  const has: Record<NonNullable<typeof appliesTo.has>[number], boolean> = {
    returns: profile.conductors.some((c) => c.kind === 'return'),
    raw: profile.raw !== null,
    stores: profile.stores.length > 0,
    devices: profile.devices.length > 0,
    boards: profile.boards.fitted.length > 0,
    heatsinks: profile.heatsinks.length > 0,
  };
  const missing = (appliesTo.rails ?? []).filter((id) => !profile.rails.some((r) => r.id === id));
  const trips = new Set(tree.steps.flatMap((s) => (s.kind === 'prove-trip' ? [s.rail] : [])));
  const noTrip = [...trips].filter((id) => !tripRails(profile).some((r) => r.id === id));
  const fitsBoards = tree.steps.some((s) => s.kind === 'connect-load' && s.load === 'boards');
  const standsOnTrips = fitsBoards || tree.steps.some((s) => s.kind === 'end' && (s.says === 'supply-proven' || s.says === 'in-service'));
  const tripsElsewhere = tree.needsAtStart.includes('trips') || tree.steps.some((s) => s.kind === 'call' && (s.results ?? []).includes('trips'));
  const untested = standsOnTrips && !tripsElsewhere ? tripRails(profile).filter((r) => !trips.has(r.id)) : [];
  return [
    ...(appliesTo.protectiveClasses.includes(profile.mains.protectiveClass) ? [] : [`it is for protective class ${appliesTo.protectiveClasses.join(' or ')}`]),
    ...(appliesTo.supplyKinds.includes(profile.supplyKind) ? [] : [`it is for a supply of the kind ${appliesTo.supplyKinds.join(' or ')}`]),
    ...(rails < appliesTo.fewestRails || rails > appliesTo.mostRails ? [`it is for ${appliesTo.fewestRails} to ${appliesTo.mostRails} rails, and this supply has ${rails}`] : []),
    ...missing.map((id) => `it speaks of a rail “${id}”, which this supply does not have`),
    ...noTrip.map((id) => `it tests the over-voltage trip of “${id}”, which this supply does not have`),
    ...untested.map((r) => `it does not test the over-voltage trip of ${r.name}, on which it would have to stand`),
    ...(fitsBoards && !profile.boards.removable ? ['it fits boards, and those of this machine cannot be parted from the supply'] : []),
    ...(appliesTo.has ?? []).filter((what) => !has[what]).map((what) => `its profile names no ${what}`),
    ...(serial !== undefined && appliesTo.serials !== undefined && !appliesTo.serials.includes(serial) ? ['it is for other serial numbers'] : []),
  ];
}
