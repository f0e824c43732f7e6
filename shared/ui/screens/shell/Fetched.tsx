/** What a page shows of an answer of the server: on its way, refused, or there. */
import { Redirect, usePathname } from 'expo-router';
import type { Href } from 'expo-router';
import type { ReactNode } from 'react';

import type { ApiError, ClientProblem } from '@/shared/ui/api/answer';
import { ErrorState } from '@/shared/ui/components/ErrorState';
import { Loading } from '@/shared/ui/components/Loading';
import { Notice } from '@/shared/ui/components/Notice';
import { doorFor } from '@/shared/ui/screens/shell/doorFor';

/** The part of a query that is needed here. */
export interface FetchedQuery<T> {
  data: T | undefined;
  error: ApiError | null;
  refetch: () => unknown;
}

interface Props<T> {
  query: FetchedQuery<T>;
  /** as "the records" */
  what: string;
  children: (data: T) => ReactNode;
}

/** What a person can do about a problem of fetching. */
export function whatToDo({ code, retryable }: Pick<ClientProblem, 'code' | 'retryable'>): string {
  if (code === 'no-network') return 'Check the network, then try again. What is kept on this device stays.';
  if (code === 'not-found') return 'It may have been entered in another workshop, or the address is wrong.';
  return retryable
    ? 'Try again in a moment. Nothing was changed.'
    : 'Nothing was changed. Load the page again; if it stays so, tell the keeper of the workshop.';
}

/** An answer that has been had once stays in sight when fetching it again fails; an ended session leads to the door. */
export function Fetched<T>({ query, what, children }: Props<T>) {
  const pathname = usePathname();
  const problem = query.error?.problem ?? null;
  const door = doorFor(problem?.code ?? null, pathname, globalThis.location?.search ?? '');
  if (door !== null) return <Redirect href={door as Href} />;
  if (query.data !== undefined) {
    return (
      <>
        {problem ? <Notice live>{`${problem.say} What is shown may be out of date.`}</Notice> : null}
        {children(query.data)}
      </>
    );
  }
  if (problem === null) return <Loading what={what} />;
  return (
    <ErrorState
      happened={problem.say}
      todo={whatToDo(problem)}
      onRetry={problem.code === 'not-found' ? undefined : () => void query.refetch()}
    />
  );
}
