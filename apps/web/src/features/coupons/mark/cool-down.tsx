import { chakra, Flex } from '@chakra-ui/react';
import { useEffect, useId, useState } from 'react';
import { Button } from '../../../components/button';
import { InputFrame } from '../../../components/field';
import { StateShape } from '../../../components/state-mark';
import { formatDuration } from '../../../lib/format';
import { readNumber, typedNumber } from '../../../lib/read-number';

const KEPT_AS = 'proofplate.cool-down-s';
const COOL_DOWN = { what: 'The cool-down', unit: 's', least: 0, most: 3600 };
const TICK_MS = 250;

/** Seconds between two cells, as this device was last told; a reload keeps them. */
export function useCoolDownSetting(): [number, (seconds: number) => void] {
  const [seconds, setSeconds] = useState(readKept);
  const change = (next: number) => {
    setSeconds(next);
    try {
      localStorage.setItem(KEPT_AS, String(next));
    } catch {
      // a browser that keeps nothing still counts down
    }
  };
  return [seconds, change];
}

function readKept(): number {
  try {
    const kept = Number(localStorage.getItem(KEPT_AS));
    return kept >= COOL_DOWN.least && kept <= COOL_DOWN.most ? kept : 0;
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

export type CoolDownSettingProps = { seconds: number; locale: string; onChange: (seconds: number) => void };

/** Read like every number: what cannot be read is refused at the field, and the last wait that could be read stays in force. */
export function CoolDownSetting({ seconds, locale, onChange }: CoolDownSettingProps) {
  const id = useId();
  const [text, setText] = useState(() => typedNumber(seconds, locale));
  const read = readNumber(text, COOL_DOWN, locale);
  const isRefused = 'message' in read;
  const handleChange = (next: string) => {
    setText(next);
    const again = readNumber(next, COOL_DOWN, locale);
    if ('value' in again) onChange(again.value);
  };
  return (
    <div>
      <chakra.label htmlFor={id} display="flex" alignItems="center" gap="2.5">
        Cool-down
        <chakra.span display="block" width="112px">
          <InputFrame size="glove">
            <Seconds
              id={id}
              inputMode="decimal"
              autoComplete="off"
              value={text}
              aria-invalid={isRefused ? true : undefined}
              aria-describedby={isRefused ? `${id}-note` : undefined}
              onChange={(event) => handleChange(event.currentTarget.value)}
            />
            <chakra.span color="fg.muted">s</chakra.span>
          </InputFrame>
        </chakra.span>
      </chakra.label>
      {isRefused && (
        <Flex id={`${id}-note`} mt="1" gap="1.5" maxW="320px" fontSize="sm" lineHeight="sm" color="oxide.fg">
          <chakra.span pt="2px" lineHeight="none">
            <StateShape state="fails" />
          </chakra.span>
          <span>
            {read.message} Until then it is {formatDuration(seconds)}.
          </span>
        </Flex>
      )}
    </div>
  );
}
