/** Signing in and out. Tokens travel in httpOnly cookies only and are in no body. */
import { z } from 'zod';

import { instantSchema, personIdSchema, workshopIdSchema } from './ids';
import { roleSchema } from './people';

export const signInBody = z.strictObject({
  mail: z.string().trim().toLowerCase().pipe(z.email('this is not a mail address')).describe('mail address'),
  password: z.string().min(1, 'the password is missing').max(200),
  /** which workshop, for a member of several; without it the first by name */
  workshop: workshopIdSchema.optional(),
});

export const meSchema = z
  .object({
    person: z.object({ id: personIdSchema, code: z.string(), name: z.string(), mail: z.string() }),
    workshop: z.object({ id: workshopIdSchema, name: z.string() }),
    workshops: z.array(z.object({ id: workshopIdSchema, name: z.string() })),
    roles: z.array(roleSchema),
    /** when the access cookie runs out; refresh before it does */
    expiresAt: instantSchema,
  })
  .meta({ id: 'Me' });
export type Me = z.infer<typeof meSchema>;
