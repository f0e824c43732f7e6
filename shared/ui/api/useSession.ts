/** Signing in and out. */
import { useQueryClient } from '@tanstack/react-query';

import type { Me } from '@/shared/contract/session';
import type { Answer } from '@/shared/ui/api/answer';
import { client } from '@/shared/ui/api/client';
import { queryKeyOf } from '@/shared/ui/api/queries';
import { forgetRuns } from '@/shared/ui/api/runStore';

export interface Session {
  signIn(input: { mail: string; password: string }): Promise<Answer<Me>>;
  /** What was fetched is forgotten; answers that wait to be sent stay on the device until their restorer signs in again. */
  signOut(): Promise<Answer<unknown>>;
}

/** The two acts of a session; who is signed in comes from `useMe`. */
export function useSession(): Session {
  const queries = useQueryClient();
  return {
    async signIn(input) {
      const answer = await client.call('signIn', { body: input });
      if (answer.kind === 'ok') {
        queries.clear();
        queries.setQueryData(queryKeyOf('me'), answer.data);
      }
      return answer;
    },
    async signOut() {
      const answer = await client.call('signOut', {});
      if (answer.kind === 'ok') {
        queries.clear();
        await forgetRuns();
      }
      return answer;
    },
  };
}
