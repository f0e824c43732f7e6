/** What a workshop may set. The values are the loosest allowed; a workshop can only be stricter. */
import { z } from 'zod';

export const settingsSchema = z.strictObject({
  format: z.literal(1),
  /** a pair or part reads dead at or below this, AC and DC */
  deadVolts: z.number().positive().max(5).default(5),
  /** a part that can hold more than both of these is discharged first … */
  storedVolts: z.number().positive().max(60).default(60),
  storedJoules: z.number().positive().max(0.35).default(0.35),
  /** … or more than this at any voltage */
  storedJoulesAnyVolts: z.number().positive().max(10).default(10),
  /** "proved dead" lapses after this */
  deadLapseMinutes: z.number().positive().max(30).default(30),
  /** earth path limit, the lead's own resistance on top */
  earthOhms: z.number().positive().max(0.1).default(0.1),
  /** insulation resistance at least this */
  insulationOhmsClassI: z.number().min(1e6).max(1e9).default(1e6),
  insulationOhmsClassII: z.number().min(2e6).max(1e9).default(2e6),
  /** bench supply counts as limited at or below the larger of the two */
  benchLimitedAmps: z.number().positive().max(1).default(1),
  benchLimitedShare: z.number().positive().max(0.2).default(0.2),
  /** live work above either needs a second person present */
  secondPersonVoltsDc: z.number().positive().max(60).default(60),
  secondPersonVoltsAc: z.number().positive().max(25).default(25),
  guardHoldSeconds: z.number().min(2).max(10).default(2),
  /** a countersign is used up after this */
  holdMinutes: z.number().positive().max(30).default(30),
  releaseDays: z.number().positive().max(90).default(90),
  leaseHours: z.number().positive().max(12).default(4),
  clockJumpSeconds: z.number().positive().max(2).default(2),
  /** retries of one exit */
  retries: z.number().int().min(1).max(3).default(3),
  emergencyNumber: z.string().trim().min(1).max(20).default('112'),
});

export type Settings = z.infer<typeof settingsSchema>;

/** The settings of a workshop that has changed nothing. */
export const defaultSettings: Settings = settingsSchema.parse({ format: 1 });
