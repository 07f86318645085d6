import { useCallback, useRef, useState } from 'react';
import { ProblemError } from '../../lib/api';
import { newIdempotencyKey } from '../../lib/idempotency-key';

/**
 * An act of one tap: busy while it runs, its refusal in words, and one key for all tries of the same act, so that a second tap after a
 * lost answer does nothing twice.
 */
export function useAct<Answer>(onDone: (answer: Answer) => void) {
  const [busyWith, setBusyWith] = useState<string>();
  const [problem, setProblem] = useState<ProblemError>();
  const keys = useRef(new Map<string, string>());
  const run = useCallback(
    async (name: string, act: (idempotencyKey: string) => Promise<Answer>) => {
      setBusyWith(name);
      setProblem(undefined);
      const key = keys.current.get(name) ?? newIdempotencyKey();
      keys.current.set(name, key);
      try {
        onDone(await act(key));
        keys.current.delete(name);
      } catch (error) {
        if (!(error instanceof ProblemError)) throw error;
        if (error.status !== 0 && error.status < 500) keys.current.delete(name);
        setProblem(error);
      } finally {
        setBusyWith(undefined);
      }
    },
    [onDone],
  );
  return { run, busyWith, problem };
}
