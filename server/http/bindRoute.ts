/** Binding a row of the route table to its handler: session, role, parameters, query and body are checked in this order, then it runs. */
import type { Request, Response, Router } from 'express';
import type { z } from 'zod';

import type { AnswerOf, BodyOf, ParamsOf, QueryOf, RouteDef } from '@/shared/contract/defineRoute';

import type { Parts } from '../parts';
import { inputProblem, ProblemError } from '../problems';
import { wantSession } from '../session/access';
import type { SignedIn } from '../session/access';
import { inputSay } from './inputSay';
import { readBody } from './readBody';

export interface Call<R extends RouteDef> {
  readonly who: R['who'] extends 'anyone' ? null : SignedIn;
  readonly params: ParamsOf<R>;
  readonly query: QueryOf<R>;
  readonly body: BodyOf<R>;
  readonly req: Request;
  readonly res: Response;
}

/** Adds `route` to `router`. What the handler returns is the answer; what it throws becomes a problem. */
export function bindRoute<const R extends RouteDef>(router: Router, parts: Parts, route: R, handle: (call: Call<R>) => Promise<AnswerOf<R>>): void {
  router[route.method](route.path, async (req: Request, res: Response) => {
    const who = route.who === 'anyone' ? null : await wantSession(parts, req);
    if (who !== null && route.who !== 'member' && route.who !== 'anyone') wantRole(who, route.who);
    const params = route.params === undefined ? undefined : read(route.params, req.params, () => new ProblemError('not-found'));
    const query = route.query === undefined ? undefined : read(route.query, req.query, inputProblem);
    const body = route.body === undefined ? undefined : read(route.body, await readBody(req, res), inputProblem);
    const answer = await handle({ who, params, query, body, req, res } as unknown as Call<R>);
    if (route.media !== undefined) return; // the handler has sent it
    // An answer that does not fit the contract is a fault of the server; it must not leave unnoticed while it is made.
    const sent = parts.config.checkAnswers ? route.answer.parse(answer) : answer;
    res.setHeader('Cache-Control', 'no-store');
    res.status(route.status).json(sent);
  });
}

function wantRole(who: SignedIn, wanted: readonly string[]): void {
  if (who.roles.some((role) => wanted.includes(role))) return;
  throw new ProblemError('role-missing', `This needs the role ${wanted.join(' or ')}; you have ${who.roles.join(', ') || 'none'} in this workshop.`);
}

function read(schema: z.ZodType, value: unknown, problem: (error: z.ZodError) => ProblemError): unknown {
  const parsed = schema.safeParse(value, { error: inputSay });
  if (!parsed.success) throw problem(parsed.error);
  return parsed.data;
}
