/** Turning what went wrong into the one form of answer that a client and a person understand. */
import type { ErrorRequestHandler } from 'express';
import type { z } from 'zod';

import { PROBLEMS, statusOf } from '@/shared/contract/problems';
import type { Problem, ProblemCode } from '@/shared/contract/problems';

/** Thrown by services; one middleware answers with it. */
export class ProblemError extends Error {
  readonly problem: Problem;

  constructor(code: ProblemCode, say?: string, details: Readonly<Record<string, unknown>> = {}) {
    super(say ?? PROBLEMS[code].say);
    this.name = 'ProblemError';
    this.problem = { ...details, code, say: say ?? PROBLEMS[code].say };
  }
}

/** The faults of an input, each with its place, as a problem that a form can show at the field. */
export function inputProblem(error: z.ZodError): ProblemError {
  const faults = error.issues.slice(0, 50).map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
  const first = faults[0];
  const where = first === undefined || first.path === '' ? 'the input' : `“${first.path}”`;
  const more = faults.length > 1 ? ` (and ${faults.length - 1} more)` : '';
  const say = first === undefined ? undefined : `Check ${where}: ${first.message}${more}.`;
  return new ProblemError('bad-input', say, { faults });
}

const UNIQUE_VIOLATION = '23505';

/** True when `error` is PostgreSQL's refusal of a second row under that unique constraint or index. */
export function isUniqueViolation(error: unknown, constraint: string): boolean {
  return typeof error === 'object' && error !== null && 'code' in error && error.code === UNIQUE_VIOLATION && 'constraint' in error && error.constraint === constraint;
}

/** The last middleware: known problems as they are, anything else as one fixed sentence, with the error in the log alone. */
export const answerProblems: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) {
    next(error);
    return;
  }
  const problem = toProblem(error);
  if (problem.code === 'internal' || problem.code === 'not-ready') req.log.error({ err: error }, problem.say);
  if (problem.code === 'too-many' || problem.code === 'not-ready') res.setHeader('Retry-After', '60');
  res.status(statusOf(problem.code)).type('application/problem+json').send(JSON.stringify(problem));
};

/** What PostgreSQL and its driver say when the database is away, starting or going down (class 08 and 57P0x of its error codes). */
const AWAY = /^(08\d{3}|57P0[123]|ECONN(REFUSED|RESET|ABORTED)|EPIPE|ENOTFOUND|ETIMEDOUT)$/;
const AWAY_SAY = /^(Connection terminated|timeout exceeded when trying to connect|Client has encountered a connection error)/;

function isDatabaseAway(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  return ('code' in error && typeof error.code === 'string' && AWAY.test(error.code)) || AWAY_SAY.test(error.message);
}

function toProblem(error: unknown): Problem {
  if (error instanceof ProblemError) return error.problem;
  if (isDatabaseAway(error)) return new ProblemError('not-ready').problem;
  if (typeof error === 'object' && error !== null && 'status' in error) {
    // What Express and its body parser throw.
    if ('type' in error && error.type === 'entity.too.large') return new ProblemError('too-large').problem;
    if (error.status === 404) return new ProblemError('not-found').problem;
    if (typeof error.status === 'number' && error.status >= 400 && error.status < 500) return new ProblemError('bad-json').problem;
  }
  return new ProblemError('internal').problem;
}
