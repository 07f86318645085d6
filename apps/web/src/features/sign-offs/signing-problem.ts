import type { UnansweredWords } from '../../components/form';
import { ProblemError } from '../../lib/api';
import { revalidate } from '../../lib/swr';

type Act = 'signed' | 'withdrawn' | 'sent back' | 'submitted' | 'recalled';

/** What became of an act that was refused. It was not done, and the words say so first. */
export function explainSigning(problem: ProblemError, act: Act): { what: string; todo: string } {
  return { what: `Not ${act}. ${problem.title}.`, todo: problem.detail };
}

/** Only the server's answer makes a signature: without it nothing is shown as signed. */
export function unansweredSigning(act: Act): UnansweredWords {
  return {
    what: `Not ${act}, as far as this page knows: no answer came from the server.`,
    safe: 'What you typed is still here.',
    todo: 'Press the button again when the connection is back. If the first try did arrive, it counts once.',
  };
}

/** Carries out an act; when the record has moved on meanwhile, its present state is read before the refusal is shown. */
export async function signedAct<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof ProblemError && (error.status === 409 || error.status === 412)) {
      await revalidate('/api/recipes', '/api/revisions', '/api/sign-offs');
    }
    throw error;
  }
}
