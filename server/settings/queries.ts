/** The settings of a workshop; one that has set nothing has the loosest allowed. */
import type { Tx } from '@/db/createDb';
import { defaultSettings, settingsSchema } from '@/flows/document/settings';
import type { Settings } from '@/flows/document/settings';

import { hashOf } from '../program/hashOf';

/** The settings in force and their content hash. */
export async function getSettings(tx: Tx): Promise<{ settings: Settings; hash: string }> {
  const row = await tx.selectFrom('settings').select('document').executeTakeFirst();
  const settings = row === undefined ? defaultSettings : settingsSchema.parse(row.document);
  return { settings, hash: hashOf(settings) };
}
