/** Whether a tree applies to a machine. */
import type { Profile } from '@/flows/document/profile';
import type { Tree } from '@/flows/document/tree';

/** What stands against it, in words; empty where it applies. */
export function treeMisfits(tree: Tree, profile: Profile, serial: string): string[] {
  const { appliesTo } = tree;
  const rails = profile.rails.length;
  const misfits: string[] = [];
  if (!appliesTo.protectiveClasses.includes(profile.mains.protectiveClass)) misfits.push(`it is for protective class ${appliesTo.protectiveClasses.join(' or ')}`);
  if (!appliesTo.supplyKinds.includes(profile.supplyKind)) misfits.push(`it is for a supply of the kind ${appliesTo.supplyKinds.join(' or ')}`);
  if (rails < appliesTo.fewestRails || rails > appliesTo.mostRails) misfits.push(`it is for ${appliesTo.fewestRails} to ${appliesTo.mostRails} rails, and this supply has ${rails}`);
  if (appliesTo.serials !== undefined && !appliesTo.serials.includes(serial)) misfits.push(`it is for other serial numbers`);
  return misfits;
}
