/** The form of one row of the route table. */
import type { z } from 'zod';

import type { Role } from './people';
import type { ProblemCode } from './problems';

type ObjectSchema = z.ZodType<object, unknown>;

export interface RouteDef {
  readonly method: 'get' | 'post' | 'delete';
  /** Express form, parameters as `:name` */
  readonly path: string;
  readonly summary: string;
  /** `anyone` needs no session, `member` any role of the workshop */
  readonly who: 'anyone' | 'member' | readonly Role[];
  readonly params?: ObjectSchema;
  readonly query?: ObjectSchema;
  readonly body?: ObjectSchema;
  /** a multipart form with one file in the field `file`, in place of a JSON body */
  readonly upload?: true;
  /** media types of an answer that is not JSON; the handler sends it itself */
  readonly media?: readonly string[];
  readonly status: 200 | 201;
  readonly answer: ObjectSchema;
  /** what it can answer besides the problems that every route has */
  readonly problems: readonly ProblemCode[];
}

/** Checks the form of a row and keeps its exact type. */
export function defineRoute<const R extends RouteDef>(route: R): R {
  return route;
}

type Out<S> = S extends z.ZodType ? z.output<S> : undefined;
type In<S> = S extends z.ZodType ? z.input<S> : undefined;

/** What a handler of the server is given, after validation. */
export type ParamsOf<R extends RouteDef> = Out<R['params']>;
export type QueryOf<R extends RouteDef> = Out<R['query']>;
export type BodyOf<R extends RouteDef> = Out<R['body']>;
/** What a caller sends. */
export type SentBodyOf<R extends RouteDef> = In<R['body']>;
export type SentQueryOf<R extends RouteDef> = In<R['query']>;
/** What a caller gets back. */
export type AnswerOf<R extends RouteDef> = z.output<R['answer']>;

/** Fills the parameters of a route's path; throws on one that is missing, which is a mistake of the caller. */
export function pathOf(route: RouteDef, params: Readonly<Record<string, string | number>> = {}): string {
  return route.path.replace(/:([a-zA-Z]+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined) throw new Error(`${route.path} needs "${name}"`);
    return encodeURIComponent(String(value));
  });
}
