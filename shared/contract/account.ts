/** The own account: sessions and password. */
import { z } from 'zod';

import { instantSchema } from './ids';

export const sessionIdSchema = z.uuid().describe('a session');

export const ownSessionSchema = z
  .object({
    id: sessionIdSchema,
    device: z.string().describe('what the browser calls itself; may be empty'),
    since: instantSchema,
    lastSeen: instantSchema.describe('when the session was last renewed'),
    current: z.boolean().describe('the session of this request'),
  })
  .meta({ id: 'OwnSession' });
export type OwnSession = z.infer<typeof ownSessionSchema>;

export const ownSessionsSchema = z.object({ sessions: z.array(ownSessionSchema) });
export const sessionParams = z.strictObject({ session: sessionIdSchema });

/** bcrypt counts no more, and a shorter one is guessed whatever it is made of. */
export const PASSWORD_LEAST = 10;
export const PASSWORD_MOST_BYTES = 72;

/** Bytes of a text in UTF-8. */
const utf8Bytes = (text: string): number => [...text].reduce((sum, letter) => sum + utf8Of(letter.codePointAt(0) ?? 0), 0);
const utf8Of = (point: number): number => (point < 0x80 ? 1 : point < 0x800 ? 2 : point < 0x10000 ? 3 : 4);

export const newPasswordSchema = z
  .string()
  .min(PASSWORD_LEAST, `at least ${PASSWORD_LEAST} characters`)
  .refine((text) => utf8Bytes(text) <= PASSWORD_MOST_BYTES, `at most ${PASSWORD_MOST_BYTES} bytes: a shorter one counts whole`);

export const changePasswordBody = z.strictObject({ password: z.string().min(1, 'the password is missing').max(200), next: newPasswordSchema });
