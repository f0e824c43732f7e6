/** Reading from the server, one hook a route. Each fails with `ApiError`, whose problem carries the sentence to show. */
import { queryOptions, useQuery } from '@tanstack/react-query';
import type { UseQueryResult } from '@tanstack/react-query';

import type { RouteName } from '@/shared/contract/routes';
import { unwrap } from '@/shared/ui/api/answer';
import type { ApiError } from '@/shared/ui/api/answer';
import { client } from '@/shared/ui/api/client';
import type { CallAnswer, CallInput } from '@/shared/ui/api/client';

export type Fetched<N extends RouteName> = UseQueryResult<CallAnswer<N>, ApiError>;

interface Options {
  /** false: not yet */
  enabled?: boolean;
  /** fetched when a screen opens and never behind its back */
  once?: boolean;
  /** asked again this often, in milliseconds */
  everyMs?: number;
}

/** Name under which an answer is kept: the route, then what it was asked. */
export function queryKeyOf(name: RouteName, input?: { params?: unknown; query?: unknown }): readonly unknown[] {
  return [name, ...(input?.params === undefined ? [] : [input.params]), ...(input?.query === undefined ? [] : [input.query])];
}

/** How a route that only reads is fetched, for `useQuery` and `useQueries`. */
export function queryOf<N extends RouteName>(name: N, input: CallInput<N>) {
  return queryOptions<CallAnswer<N>, ApiError>({ queryKey: queryKeyOf(name, input), queryFn: () => unwrap(client.call(name, input)) });
}

/** Fetches a route that only reads. */
export function useRoute<N extends RouteName>(
  name: N,
  input: CallInput<N>,
  { enabled = true, everyMs, once = false }: Options = {},
): Fetched<N> {
  return useQuery<CallAnswer<N>, ApiError>({
    ...queryOf(name, input),
    enabled,
    ...(everyMs === undefined ? {} : { refetchInterval: everyMs }),
    ...(once ? { staleTime: Infinity, gcTime: 0 } : {}),
  });
}

/** Who is signed in; `signed-out` as a problem when nobody is. */
export function useMe(): Fetched<'me'> {
  return useRoute('me', {});
}

const BENCH_EVERY_MS = 15_000;

/** My open runs, and those that are offered to me. */
export function useBench(): Fetched<'runs'> {
  return useRoute('runs', { query: { mine: '1', open: '1' } }, { everyMs: BENCH_EVERY_MS });
}

/** Open runs of the whole workshop. */
export function useOpenRuns(enabled = true): Fetched<'runs'> {
  return useRoute('runs', { query: { open: '1' } }, { enabled, everyMs: BENCH_EVERY_MS });
}

/** Everything that this device needs to go on with a run, as it was when its screen was opened; what comes later comes through the outbox. */
export function useRun(run: string): Fetched<'run'> {
  return useRoute('run', { params: { run } }, { once: true });
}

const HOLDS_EVERY_MS = 3_000;

/** Countersigns that are wanted; only for seniors. */
export function useHolds(enabled = true): Fetched<'holds'> {
  return useRoute('holds', {}, { enabled, everyMs: HOLDS_EVERY_MS });
}

/** Machines of the workshop. */
export function useMachines(): Fetched<'machines'> {
  return useRoute('machines', {});
}

/** One machine with its profile, runs and releases. */
export function useMachine(machine: string): Fetched<'machine'> {
  return useRoute('machine', { params: { machine } });
}

/** Fault trees and their versions. */
export function useTrees(): Fetched<'trees'> {
  return useRoute('trees', {});
}

/** One version of a tree with its callees. */
export function useTreeVersion(tree: string, version: number): Fetched<'treeVersion'> {
  return useRoute('treeVersion', { params: { tree, version } });
}

/** Instruments of the workshop. */
export function useInstruments(): Fetched<'instruments'> {
  return useRoute('instruments', {});
}

/** Members of the workshop. */
export function usePeople(): Fetched<'people'> {
  return useRoute('people', {});
}

/** Settings of the workshop. */
export function useSettings(): Fetched<'settings'> {
  return useRoute('settings', {});
}

/** Records, all or of one state. */
export function useRecords(query: CallInput<'records'>['query'] = {}): Fetched<'records'> {
  return useRoute('records', { query });
}

/** One record. */
export function useRecord(record: string): Fetched<'record'> {
  return useRoute('record', { params: { record } });
}
