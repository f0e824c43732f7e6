/** One act of a review on its way: its id, whether it runs, and what went wrong. */
import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';

import type { Answer, ClientProblem } from '@/shared/ui/api/answer';

export interface Act {
  /** of the entry that it becomes; the same for each try, so that none is written twice */
  id: string;
  problem: ClientProblem | null;
  /** sends it; closes the dialog when it is written */
  send: (call: () => Promise<Answer<unknown>>) => Promise<ClientProblem | null>;
}

/** `onDone` is called once it is written. */
export function useAct(onDone: () => void): Act {
  const [id] = useState(() => uuidv7());
  const [problem, setProblem] = useState<ClientProblem | null>(null);
  return {
    id,
    problem,
    send: async (call) => {
      setProblem(null);
      const answer = await call();
      if (answer.kind === 'ok') {
        onDone();
        return null;
      }
      setProblem(answer);
      return answer;
    },
  };
}
