/** The settings of the workshop. */
import { z } from 'zod';

import { settingsSchema } from '@/flows/document/settings';

import { hashSchema } from './ids';

export const workshopSettingsSchema = z.object({ settings: settingsSchema, hash: hashSchema });
