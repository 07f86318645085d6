import { useEffect, useState } from 'react';

const TICK_MS = 100;
const MS_PER_S = 1000;

export type Clock = {
  readonly isRunning: boolean;
  readonly seconds: number;
  readonly start: () => void;
  /** Seconds at this moment, to the tenth; the clock stands still afterwards. */
  readonly stop: () => number;
};

/** A stopwatch by the device's clock, so that a sleeping screen loses no time. */
export function useClock(): Clock {
  const [startedAt, setStartedAt] = useState<number>();
  const [now, setNow] = useState(0);
  useEffect(() => {
    if (startedAt === undefined) return undefined;
    const timer = setInterval(() => setNow(performance.now()), TICK_MS);
    return () => clearInterval(timer);
  }, [startedAt]);
  const seconds = startedAt === undefined ? 0 : Math.max(0, now - startedAt) / MS_PER_S;
  return {
    isRunning: startedAt !== undefined,
    seconds,
    start: () => {
      setNow(performance.now());
      setStartedAt(performance.now());
    },
    stop: () => {
      const stopped = startedAt === undefined ? 0 : (performance.now() - startedAt) / MS_PER_S;
      setStartedAt(undefined);
      return Math.max(0.1, Math.round(stopped * 10) / 10);
    },
  };
}
