/** The authored documents as they cross the wire, each under one name in the description of the interface. */
import { profileShape } from '@/flows/document/profile';
import { settingsSchema } from '@/flows/document/settings';
import { fittedSchema } from '@/flows/document/steps';
import { treeShape } from '@/flows/document/tree';

export const treeDocument = treeShape.meta({ id: 'Tree' });
export const profileDocument = profileShape.meta({ id: 'Profile' });
export const settingsDocument = settingsSchema.meta({ id: 'Settings' });
export const fittedThing = fittedSchema.meta({ id: 'FittedThing' });
