/** The one way from this page to the server: typed by the route table, never throwing on a refusal. */
import type { z } from 'zod';

import type { AnswerOf, RouteDef } from '@/shared/contract/defineRoute';
import { pathOf } from '@/shared/contract/defineRoute';
import { isRetryable, problemSchema } from '@/shared/contract/problems';
import { routes } from '@/shared/contract/routes';
import type { RouteName } from '@/shared/contract/routes';
import type { Answer, ClientProblem, ClientProblemCode } from '@/shared/ui/api/answer';

type Part<R extends RouteDef, K extends 'params' | 'query' | 'body'> = R[K] extends z.ZodType
  ? { [P in K]: z.input<R[K]> }
  : { [P in K]?: undefined };
/** What a call of that route needs. */
export type CallInput<N extends RouteName> = Part<(typeof routes)[N], 'params'> &
  Part<(typeof routes)[N], 'query'> &
  Part<(typeof routes)[N], 'body'>;
export type CallAnswer<N extends RouteName> = AnswerOf<(typeof routes)[N]>;

export interface Client {
  /** Calls a route. Refusals and a missing network come back as a problem. */
  call<N extends RouteName>(name: N, input: CallInput<N>): Promise<Answer<CallAnswer<N>>>;
  /** Sends one file to a route that takes a form. */
  upload<N extends RouteName>(name: N, input: CallInput<N>, file: Blob): Promise<Answer<CallAnswer<N>>>;
}

/** A request that hangs this long counts as no network. */
const PATIENCE_MS = 20_000;
/** A photo over a weak network takes longer. */
const UPLOAD_PATIENCE_MS = 120_000;

const NO_NETWORK = 'The server cannot be reached. Check the network; nothing that you have entered is lost.';
const BAD_ANSWER = 'The server answered in a way that this page does not understand. Load the page again.';

const problem = (code: ClientProblemCode, say: string, retryable: boolean, details: Record<string, unknown> = {}): ClientProblem => ({
  kind: 'problem',
  code,
  say,
  retryable,
  rule: null,
  faults: [],
  details,
});

/**
 * Makes a client.
 * @param send how a request leaves; `fetch` outside of tests
 */
export function createClient(send: typeof fetch): Client {
  let refreshing: Promise<boolean> | null = null;

  const once = async (route: RouteDef, input: { params?: unknown; query?: unknown; body?: unknown }, file?: Blob): Promise<Answer<unknown>> => {
    const path = pathOf(route, (input.params ?? {}) as Record<string, string>);
    const query = new URLSearchParams((input.query ?? {}) as Record<string, string>).toString();
    let response: Response;
    let text: string;
    const form = file === undefined ? undefined : new FormData();
    if (form !== undefined && file !== undefined) form.append('file', file, 'photo.jpg');
    try {
      response = await send(query === '' ? path : `${path}?${query}`, {
        method: route.method.toUpperCase(),
        credentials: 'same-origin',
        headers: { accept: 'application/json', ...(input.body === undefined ? {} : { 'content-type': 'application/json' }) },
        ...(input.body === undefined ? {} : { body: JSON.stringify(input.body) }),
        ...(form === undefined ? {} : { body: form }),
        signal: AbortSignal.timeout(form === undefined ? PATIENCE_MS : UPLOAD_PATIENCE_MS),
      });
      text = await response.text();
    } catch {
      return problem('no-network', NO_NETWORK, true);
    }
    return response.ok ? readAnswer(route, text) : readProblem(response.status, text);
  };

  // one renewal serves every call that met the same expired session
  const refresh = (): Promise<boolean> => {
    refreshing ??= once(routes.refreshSession, {})
      .then((answer) => answer.kind === 'ok')
      .finally(() => {
        refreshing = null;
      });
    return refreshing;
  };

  const twice = async (name: RouteName, input: { params?: unknown; query?: unknown; body?: unknown }, file?: Blob): Promise<Answer<unknown>> => {
    const route: RouteDef = routes[name];
    const first = await once(route, input, file);
    const ended = first.kind === 'problem' && (first.code === 'session-expired' || first.code === 'signed-out') && route.who !== 'anyone';
    return ended && (await refresh()) ? once(route, input, file) : first;
  };

  // the type of an answer is that of its route, which `readAnswer` has checked
  return {
    call: async (name, input) => (await twice(name, input as object)) as Answer<CallAnswer<typeof name>>,
    upload: async (name, input, file) => (await twice(name, input as object, file)) as Answer<CallAnswer<typeof name>>,
  };
}

function readAnswer(route: RouteDef, text: string): Answer<unknown> {
  const parsed = route.answer.safeParse(parseJson(text));
  return parsed.success
    ? { kind: 'ok', data: parsed.data }
    : problem('bad-answer', BAD_ANSWER, false, { issues: parsed.error.issues.slice(0, 5) });
}

function readProblem(status: number, text: string): ClientProblem {
  const parsed = problemSchema.safeParse(parseJson(text));
  if (parsed.success) {
    const { code, say, rule, faults } = parsed.data;
    return { kind: 'problem', code, say, retryable: isRetryable(code), rule: rule ?? null, faults: faults ?? [], details: parsed.data };
  }
  // a proxy answers for a server that is away
  return status === 502 || status === 503 || status === 504
    ? problem('no-network', NO_NETWORK, true)
    : problem('bad-answer', BAD_ANSWER, false, { status });
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return undefined;
  }
}

/** The page's client. */
export const client: Client = createClient((...args) => fetch(...args));
