/** People of a workshop and their roles. */
import { z } from 'zod';

import { personIdSchema } from './ids';

export const ROLES = ['restorer', 'senior', 'reviewer', 'keeper'] as const;
export const roleSchema = z.enum(ROLES);
export type Role = z.infer<typeof roleSchema>;

/** A member as the others see it; mail addresses are shown to the keeper alone and are not part of it. */
export const personSchema = z
  .object({
    id: personIdSchema,
    /** short sign used in records, unique in the workshop */
    code: z.string(),
    name: z.string(),
    roles: z.array(roleSchema),
  })
  .meta({ id: 'Person' });
export type Person = z.infer<typeof personSchema>;

export const peopleSchema = z.object({ people: z.array(personSchema) });
