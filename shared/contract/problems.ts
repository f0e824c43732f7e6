/** The one error table: what can go wrong in an answer of the server, with its status and whether to try again. */
import { z } from 'zod';

interface ProblemKind {
  readonly status: 400 | 401 | 403 | 404 | 409 | 413 | 416 | 422 | 429 | 500 | 503;
  /** true where the same request may succeed later without a change by a person */
  readonly retryable: boolean;
  /** what a person reads when the server has nothing more exact to say */
  readonly say: string;
}

export const PROBLEMS = {
  'bad-json': { status: 400, retryable: false, say: 'The request is not valid JSON.' },
  'not-json': { status: 400, retryable: false, say: 'The request must be sent as JSON.' },
  'sign-in-failed': { status: 401, retryable: false, say: 'Mail address and password do not fit together.' },
  'signed-out': { status: 401, retryable: false, say: 'You are not signed in. Sign in to go on.' },
  'session-expired': { status: 401, retryable: true, say: 'Your session has run out. Sign in again to go on.' },
  'cross-site': { status: 403, retryable: false, say: 'The request came from another site and was refused.' },
  'role-missing': { status: 403, retryable: false, say: 'Your role in this workshop does not allow this.' },
  'own-run': { status: 403, retryable: false, say: 'This is your own run. Another person has to do this.' },
  'not-your-run': { status: 403, retryable: false, say: 'Only the restorer of this run can do this.' },
  'handed-over': { status: 403, retryable: false, say: 'You have handed this run over. Only its restorer of now can do this.' },
  'countersigned-run': { status: 403, retryable: false, say: 'You countersigned in this run, so another reviewer has to decide on it.' },
  'not-found': { status: 404, retryable: false, say: 'There is nothing here, or you may not see it.' },
  'machine-busy': { status: 409, retryable: false, say: 'A run is open on this machine. Close it first.' },
  'id-taken': { status: 409, retryable: false, say: 'This id is taken by other content.' },
  'out-of-sequence': { status: 409, retryable: true, say: 'The record has moved on. Take over what the server has, then send again.' },
  'wrong-state': { status: 409, retryable: false, say: 'The record is in another state, so this cannot be done now.' },
  'not-offered': { status: 409, retryable: false, say: 'This run is not offered to you, or the offer was taken back.' },
  'other-engine': { status: 409, retryable: false, say: 'This run was begun under rules that this server no longer runs. Make the bench safe; a senior has to close the run.' },
  'no-hold': { status: 409, retryable: false, say: 'No countersign is awaited here any more.' },
  'photo-missing': { status: 409, retryable: true, say: 'A photo of this entry has not reached the server. Send the photo, then the entry again.' },
  'too-large': { status: 413, retryable: false, say: 'The request is too large.' },
  'bad-range': { status: 416, retryable: false, say: 'The file has no such part.' },
  'bad-file': { status: 422, retryable: false, say: 'This file cannot be kept.' },
  'bad-input': { status: 422, retryable: false, say: 'Something in the request does not fit.' },
  'weak-password': { status: 422, retryable: false, say: 'This password is too weak.' },
  'wrong-password': { status: 422, retryable: false, say: 'The password is not right. Nothing was signed.' },
  refused: { status: 422, retryable: false, say: 'A house rule refuses this step. The run is as it was.' },
  'not-startable': { status: 422, retryable: false, say: 'This run cannot start.' },
  instrument: { status: 422, retryable: false, say: 'This instrument cannot be used for the reading.' },
  'too-many': { status: 429, retryable: true, say: 'Too many tries. Wait a moment, then try again.' },
  internal: { status: 500, retryable: true, say: 'Something broke on the server. Nothing was written; try again.' },
  'not-ready': { status: 503, retryable: true, say: 'The server is not ready. Try again in a moment.' },
} as const satisfies Record<string, ProblemKind>;

export type ProblemCode = keyof typeof PROBLEMS;
export const PROBLEM_CODES = Object.keys(PROBLEMS) as [ProblemCode, ...ProblemCode[]];

/** The body of every answer that is not a success. */
export const problemSchema = z
  .looseObject({
    code: z.enum(PROBLEM_CODES),
    say: z.string().min(1).describe('a sentence that a person understands'),
    /** every fault of the input, not only the first */
    faults: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
    /** the house rule that refused, such as `H7` */
    rule: z.string().nullable().optional(),
    /** what the server holds of the run, after `out-of-sequence` */
    head: z.object({ seq: z.number().int(), hash: z.string() }).optional(),
  })
  .meta({ id: 'Problem' });

export type Problem = z.infer<typeof problemSchema>;

/** Status of a problem code. */
export function statusOf(code: ProblemCode): number {
  return PROBLEMS[code].status;
}

/** True where the same request may succeed later as it is. */
export function isRetryable(code: ProblemCode): boolean {
  return PROBLEMS[code].retryable;
}
