/** The settings of the workshop. */
import { z } from 'zod';

import { settingsDocument } from './documents';
import { hashSchema } from './ids';

export const workshopSettingsSchema = z.object({ settings: settingsDocument, hash: hashSchema });
