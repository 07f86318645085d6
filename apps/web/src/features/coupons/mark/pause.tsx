import { chakra } from '@chakra-ui/react';
import { useEffect, useState } from 'react';
import { Button } from '../../../components/button';
import { formatDuration } from '../../../lib/format';

export type Pause = { isPaused: boolean; sinceMs: number; begin: () => void; end: () => void };

const TICK_MS = 1000;

/** A break at the machine: nothing can be tapped by a sleeve, and the screen says how long it lasts. */
export function usePause(): Pause {
  const [sinceMs, setSinceMs] = useState<number>();
  return { isPaused: sinceMs !== undefined, sinceMs: sinceMs ?? 0, begin: () => setSinceMs(Date.now()), end: () => setSinceMs(undefined) };
}

export function PausedNotice({ pause }: { pause: Pause }) {
  const [now, setNow] = useState(Date.now);
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), TICK_MS);
    return () => clearInterval(timer);
  }, []);
  return (
    <chakra.section aria-label="Paused" display="grid" gap="4" maxW="640px" py="10" textAlign="center">
      <chakra.p fontSize="5xl" lineHeight="5xl" fontWeight="semibold">
        Paused
      </chakra.p>
      <chakra.p role="timer" fontSize="xl" color="fg.muted">
        for {formatDuration(Math.max(0, (now - pause.sinceMs) / 1000))}
      </chakra.p>
      <chakra.p>Every cell so far is kept. The plate cools meanwhile: a long break can show in the result.</chakra.p>
      <Button kind="primary" size="primaryAct" shape="wide" onClick={pause.end}>
        Go on
      </Button>
    </chakra.section>
  );
}
