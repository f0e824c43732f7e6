/** What a call of the server comes to, in one form: data, or a problem with a sentence that a person understands. */
import type { ProblemCode } from '@/shared/contract/problems';

/** Beside the server's own codes: no way to the server, or an answer that this page does not understand. */
export type ClientProblemCode = ProblemCode | 'no-network' | 'bad-answer';

export interface ClientProblem {
  readonly kind: 'problem';
  readonly code: ClientProblemCode;
  readonly say: string;
  /** true where the same request may succeed later without a change by a person */
  readonly retryable: boolean;
  /** the house rule that refused, such as `H7` */
  readonly rule: string | null;
  /** every fault of the input with its place */
  readonly faults: readonly { readonly path: string; readonly message: string }[];
  /** the whole body of the problem */
  readonly details: Readonly<Record<string, unknown>>;
}

export type Answer<T> = { readonly kind: 'ok'; readonly data: T } | ClientProblem;

/** A problem thrown for TanStack Query, which knows failures as errors only. */
export class ApiError extends Error {
  readonly problem: ClientProblem;

  constructor(problem: ClientProblem) {
    super(problem.say);
    this.name = 'ApiError';
    this.problem = problem;
  }
}

/** The data of an answer; throws `ApiError` for a problem. */
export async function unwrap<T>(answer: Promise<Answer<T>>): Promise<T> {
  const got = await answer;
  if (got.kind === 'problem') throw new ApiError(got);
  return got.data;
}
