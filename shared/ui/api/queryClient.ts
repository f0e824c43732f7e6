/** Server state of the page: what is fetched is shared by all screens and fetched again when it may be stale. */
import { QueryClient } from '@tanstack/react-query';

import { ApiError } from '@/shared/ui/api/answer';

const FRESH_MS = 5_000;
const MOST_TRIES = 2;

/** Makes the store of fetched answers; one a page, one a test. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: FRESH_MS,
        // the server may be on this very machine: a browser's word "offline" says nothing about it
        networkMode: 'always',
        retry: (count, error) =>
          error instanceof ApiError && error.problem.retryable && error.problem.code !== 'session-expired' && count < MOST_TRIES,
      },
      mutations: { networkMode: 'always', retry: false },
    },
  });
}
