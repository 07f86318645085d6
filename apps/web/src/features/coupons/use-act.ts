import { useState } from 'react';
import { ProblemError } from '../../lib/api';
import { useIdempotencyKey } from '../../lib/idempotency-key';

/** An act that is carried out once, whatever the connection does. */
export function useAct() {
  const key = useIdempotencyKey();
  const [isBusy, setIsBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemError>();
  const run = async (work: (idempotencyKey: string) => Promise<void>) => {
    setIsBusy(true);
    setProblem(undefined);
    try {
      await work(key.current());
      key.renew();
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      if (error.status !== 0 && error.status < 500) key.renew();
      setProblem(error);
    } finally {
      setIsBusy(false);
    }
  };
  return { run, isBusy, problem };
}
