import { chakra } from '@chakra-ui/react';
import { useEffect, useId, useState } from 'react';
import { Button } from '../../../components/button';
import { InputFrame } from '../../../components/field';
import { formatDuration } from '../../../lib/format';

const KEPT_AS = 'proofplate.cool-down-s';
const LONGEST_S = 3600;
const TICK_MS = 250;

/** Seconds between two cells, as this device was last told; a reload keeps them. */
export function useCoolDownSetting(): [number, (seconds: number) => void] {
  const [seconds, setSeconds] = useState(readKept);
  const change = (next: number) => {
    const within = Math.min(LONGEST_S, Math.max(0, Math.round(next)));
    setSeconds(within);
    try {
      localStorage.setItem(KEPT_AS, String(within));
    } catch {
      // a browser that keeps nothing still counts down
    }
  };
  return [seconds, change];
}

function readKept(): number {
  try {
    const kept = Number(localStorage.getItem(KEPT_AS));
    return Number.isInteger(kept) && kept >= 0 && kept <= LONGEST_S ? kept : 0;
  } catch {
    return 0;
  }
}

/** Whole seconds left until a moment, counted by the clock, so that a sleeping screen loses none. */
export function useSecondsLeft(untilMs: number | undefined): number {
  const [now, setNow] = useState(Date.now);
  useEffect(() => {
    if (untilMs === undefined) return undefined;
    setNow(Date.now());
    const timer = setInterval(() => setNow(Date.now()), TICK_MS);
    return () => clearInterval(timer);
  }, [untilMs]);
  return untilMs === undefined ? 0 : Math.max(0, Math.ceil((untilMs - now) / 1000));
}

/** The wait between two cells. It reminds and never blocks: whoever stands there knows better. */
export function CoolDown({ secondsLeft, onSkip }: { secondsLeft: number; onSkip: () => void }) {
  if (secondsLeft === 0) return null;
  return (
    <chakra.div
      display="flex"
      alignItems="center"
      justifyContent="space-between"
      gap="3"
      px="4"
      minHeight="glove"
      bg="straw.subtle"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      <chakra.span role="timer" aria-label="Time left to cool">
        Cool down, <b>{formatDuration(secondsLeft)}</b> left
      </chakra.span>
      <Button size="glove" kind="quiet" onClick={onSkip}>
        Go on
      </Button>
    </chakra.div>
  );
}

const Seconds = chakra('input', {
  base: { width: '4ch', bg: 'transparent', textAlign: 'right', outline: 'none !important', alignSelf: 'stretch' },
});

export function CoolDownSetting({ seconds, onChange }: { seconds: number; onChange: (seconds: number) => void }) {
  const id = useId();
  return (
    <chakra.label htmlFor={id} display="flex" alignItems="center" gap="2.5">
      Cool-down
      <chakra.span display="block" width="112px">
        <InputFrame size="glove">
          <Seconds
            id={id}
            inputMode="numeric"
            autoComplete="off"
            value={String(seconds)}
            onChange={(event) => onChange(Number(event.currentTarget.value.replace(/\D/g, '')))}
          />
          <chakra.span color="fg.muted">s</chakra.span>
        </InputFrame>
      </chakra.span>
    </chakra.label>
  );
}
