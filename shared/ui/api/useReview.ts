/** The acts of a review. Each carries the id of the entry that it becomes, so that sending it twice is harmless. */
import { useQueryClient } from '@tanstack/react-query';

import type { RouteName } from '@/shared/contract/routes';
import type { Answer } from '@/shared/ui/api/answer';
import { client } from '@/shared/ui/api/client';
import type { CallAnswer, CallInput } from '@/shared/ui/api/client';

export interface Review {
  submit(body: CallInput<'submit'>['body']): Promise<Answer<CallAnswer<'submit'>>>;
  addFinding(body: CallInput<'addFinding'>['body']): Promise<Answer<CallAnswer<'addFinding'>>>;
  returnRecord(body: CallInput<'returnRecord'>['body']): Promise<Answer<CallAnswer<'returnRecord'>>>;
  reply(body: CallInput<'reply'>['body']): Promise<Answer<CallAnswer<'reply'>>>;
  accept(body: CallInput<'accept'>['body']): Promise<Answer<CallAnswer<'accept'>>>;
  /** the signed file as the server makes it */
  exportFile(): Promise<Answer<CallAnswer<'exportRecord'>>>;
}

/** What a review changes on other pages. */
const TOUCHED: readonly RouteName[] = ['record', 'records', 'run', 'runs', 'machine', 'machines'];

/** Acts on one record; what is shown of it is fetched again after each, also after one that was refused because the page was stale. */
export function useReview(record: string): Review {
  const queries = useQueryClient();
  const acted = async <T>(asked: Promise<Answer<T>>): Promise<Answer<T>> => {
    const answer = await asked;
    if (answer.kind === 'ok' || answer.code === 'wrong-state')
      await Promise.all(TOUCHED.map((name) => queries.invalidateQueries({ queryKey: [name] })));
    return answer;
  };
  const params = { record };
  return {
    submit: (body) => acted(client.call('submit', { params: { run: record }, body })),
    addFinding: (body) => acted(client.call('addFinding', { params, body })),
    returnRecord: (body) => acted(client.call('returnRecord', { params, body })),
    reply: (body) => acted(client.call('reply', { params, body })),
    accept: (body) => acted(client.call('accept', { params, body })),
    exportFile: () => client.call('exportRecord', { params }),
  };
}
