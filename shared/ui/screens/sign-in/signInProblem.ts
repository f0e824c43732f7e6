/** Why somebody could not sign in, and what to do about it. */
import type { ClientProblem } from '@/shared/ui/api/answer';

export interface SignInProblem {
  happened: string;
  todo: string;
}

/** The server's own sentence, with what helps; it never says which of the two was wrong. */
export function signInProblem({ code, say, retryable }: Pick<ClientProblem, 'code' | 'say' | 'retryable'>): SignInProblem {
  switch (code) {
    case 'sign-in-failed':
      return { happened: say, todo: 'Check both and try again. Capital and small letters differ in the password.' };
    case 'too-many':
      return {
        happened: say,
        todo: 'The door stays shut for a while after several wrong passwords. Ask the keeper of the workshop if you have forgotten yours.',
      };
    case 'no-network':
      return {
        happened: 'The server cannot be reached.',
        todo: 'Check the network, then press “Sign in” again. What you have typed stays.',
      };
    default:
      return {
        happened: say,
        todo: retryable ? 'Try again in a moment.' : 'Load the page again; if it stays so, tell the keeper of the workshop.',
      };
  }
}
