import { useCallback, useRef, useState } from 'react';
import { ProblemError } from '../../lib/api';
import { newIdempotencyKey } from '../../lib/idempotency-key';
import { revalidate } from '../../lib/swr';

/**
 * An act of one tap: busy while it runs, its refusal in words, and one key for all tries of the same act, so that a second tap after a
 * lost answer does nothing twice. A refusal is of the version that it was tried on: once that has changed, it says nothing any more.
 */
export function useAct<Answer>(onDone: (answer: Answer) => void, version: number) {
  const [busyWith, setBusyWith] = useState<string>();
  const [refusal, setRefusal] = useState<{ problem: ProblemError; version: number }>();
  const keys = useRef(new Map<string, string>());
  const run = useCallback(
    async (name: string, act: (idempotencyKey: string) => Promise<Answer>) => {
      setBusyWith(name);
      setRefusal(undefined);
      const key = keys.current.get(name) ?? newIdempotencyKey();
      keys.current.set(name, key);
      try {
        onDone(await act(key));
        keys.current.delete(name);
      } catch (error) {
        if (!(error instanceof ProblemError)) throw error;
        if (error.status !== 0 && error.status < 500) keys.current.delete(name);
        setRefusal({ problem: error, version });
        // What refused it may have happened since the page was read.
        if (error.status === 409) void revalidate('/api/runs/');
      } finally {
        setBusyWith(undefined);
      }
    },
    [onDone, version],
  );
  return { run, busyWith, problem: refusal?.version === version ? refusal.problem : undefined };
}
