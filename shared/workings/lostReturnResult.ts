/** The form of what the lost-return sheet answers; SI, nothing rounded. */
import { z } from 'zod';

/** From best to worst. */
export const VERDICTS = ['harmless', 'out of tolerance', 'destructive'] as const;

const verdict = z.enum(VERDICTS);
const named = z.strictObject({ name: z.string(), volts: z.number() });

const opening = z.strictObject({
  /** Returns that are open; none for the network as it stands. */
  opens: z.array(z.string()),
  verdict,
  /** The sentence that a step shows. */
  sentence: z.string(),
  /** At the supply, worst first. */
  reversedRails: z.array(named),
  diodes: z.array(
    z.strictObject({
      name: z.string(),
      mostAmps: z.number(),
      ratedAmps: z.number().nullable(),
      /** Null where its rating is not given. */
      overRated: z.boolean().nullable(),
    }),
  ),
  /** Rails that limit in the worst case. */
  limiting: z.array(z.string()),
  /** Boards that were, or would be, exposed: those on the reversed or the negative rail first. */
  exposedBoards: z.array(
    z.strictObject({
      name: z.string(),
      volts: z.number(),
      nominalVolts: z.number(),
      how: z.enum(['reversed', 'over', 'hangs on a reversed rail']),
    }),
  ),
  worstCase: z.strictObject({
    rails: z.array(z.strictObject({ name: z.string(), state: z.enum(['on', 'off', 'limit']), volts: z.number(), amps: z.number() })),
    nodes: z.array(named),
  }),
});

const suspect = z.strictObject({
  name: z.string(),
  kind: z.enum(['return', 'feed']),
  /** Ohms that fit the readings best. */
  ohms: z.number(),
  /** Ohms that it has when good. */
  goodOhms: z.number(),
  /** How far readings and network are then apart, r.m.s. */
  leftVolts: z.number(),
});

export const lostReturnResult = z.strictObject({
  /** The worst of all openings. */
  verdict,
  /** With every return in place. */
  closed: opening,
  /** Each return, then each pair. */
  openings: z.array(opening),
  /** Singles before pairs; null when all are harmless. */
  worst: opening.nullable(),
  solvedCases: z.number(),
  /** Largest share by which the power given and the heat differ in a case. */
  powerImbalance: z.number(),
  /** What the readings say; null without readings. */
  fault: z
    .strictObject({
      says: z.enum(['nothing amiss', 'one wire', 'one of several', 'no single wire']),
      /** How far the readings are from good wires throughout, r.m.s. */
      asItStandsVolts: z.number(),
      /** Wires that explain the readings, best first. */
      suspects: z.array(suspect),
    })
    .nullable(),
});

export type LostReturnResult = z.output<typeof lostReturnResult>;
export type OpeningResult = z.output<typeof opening>;
export type OpeningVerdict = z.output<typeof verdict>;
export type ExposedBoard = OpeningResult['exposedBoards'][number];
export type WireSuspect = z.output<typeof suspect>;
export type ReturnFault = NonNullable<LostReturnResult['fault']>;
