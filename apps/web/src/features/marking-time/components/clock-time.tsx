import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { TextField } from '../../../components/field';
import { ProblemNotice } from '../../../components/problem-notice';
import { ProblemError } from '../../../lib/api';
import { formatPercentChange, formatQuantity } from '../../../lib/format';
import { useIdempotencyKey } from '../../../lib/idempotency-key';
import { typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { timeText } from '../../../lib/time-words';
import { readClock } from '../read-clock';
import { useClock } from '../use-clock';

export type ClockTimeProps = {
  /** Seconds that are predicted; null: nobody knows. */
  predictedS: number | null;
  /** Says at its own fields what is missing and answers false; absent: nothing else is asked. */
  isReady?: () => boolean;
  onLog: (seconds: number, idempotencyKey: string) => Promise<unknown>;
};

/** Two taps: start, then stop and log. Or the time as the machine's control shows it, typed. */
export function ClockTime({ predictedS, isReady = () => true, onLog }: ClockTimeProps) {
  const { shop } = useSession();
  const clock = useClock();
  const [typed, setTyped] = useState('');
  const [error, setError] = useState<string>();
  const { problem, isBusy, send } = useSending(onLog);
  const read = readClock(typed, shop.locale);
  const log = async (seconds: number) => {
    if (!isReady()) return;
    if (await send(seconds)) setTyped('');
  };
  const handleStop = (isLogged: boolean) => {
    const seconds = clock.stop();
    setTyped(typedNumber(seconds, shop.locale));
    setError(undefined);
    if (isLogged) void log(seconds);
  };
  const handleLog = () => {
    setError('message' in read ? read.message : undefined);
    if ('value' in read) void log(read.value);
  };
  return (
    <chakra.form
      noValidate
      display="grid"
      gap="3"
      onSubmit={(event) => {
        event.preventDefault();
        handleLog();
      }}
    >
      {clock.isRunning ? (
        <>
          <chakra.div role="timer" aria-label="Clock" fontSize="5xl" lineHeight="5xl" fontWeight="semibold">
            {formatQuantity(clock.seconds, 's', { decimals: 1 })}
          </chakra.div>
          <Button kind="primary" size="primaryAct" shape="wide" onClick={() => handleStop(true)}>
            Stop and log
          </Button>
          <Button size="glove" shape="wide" onClick={() => handleStop(false)}>
            Stop only
          </Button>
        </>
      ) : (
        <>
          <Button size="primaryAct" shape="wide" isBusy={isBusy} onClick={clock.start}>
            Start the clock
          </Button>
          <TextField
            name="clocked"
            label="Or type the time"
            size="glove"
            inputMode="text"
            autoComplete="off"
            help={compared(read, predictedS) ?? 'Seconds, or minutes and seconds: 130 or 2:10.'}
            error={error}
            value={typed}
            onChange={(event) => {
              setTyped(event.currentTarget.value);
              setError(undefined);
            }}
          />
          <Button size="glove" type="submit" isBusy={isBusy}>
            Log this time
          </Button>
        </>
      )}
      {problem !== undefined && <Refusal problem={problem} />}
    </chakra.form>
  );
}

function useSending(onLog: ClockTimeProps['onLog']) {
  const key = useIdempotencyKey();
  const [problem, setProblem] = useState<ProblemError>();
  const [isBusy, setIsBusy] = useState(false);
  const send = async (seconds: number) => {
    setProblem(undefined);
    setIsBusy(true);
    try {
      await onLog(seconds, key.current());
      key.renew();
      return true;
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      if (error.status !== 0 && error.status < 500) key.renew();
      setProblem(error);
      return false;
    } finally {
      setIsBusy(false);
    }
  };
  return { problem, isBusy, send };
}

function Refusal({ problem: { status, title, detail, errors } }: { problem: ProblemError }) {
  if (status === 0)
    return (
      <ProblemNotice what="No answer came from the server." safe="The time is still in the field." todo="Log it again: it is kept once." />
    );
  return (
    <ProblemNotice
      what={`${title}.`}
      safe="The time is still in the field."
      todo={errors.length === 0 ? detail : errors.map((one) => one.detail).join(' ')}
    />
  );
}

function compared(read: { value: number } | { message: string }, predictedS: number | null): string | undefined {
  if (predictedS === null || 'message' in read) return undefined;
  return `${timeText(read.value)}: ${formatPercentChange(read.value / predictedS - 1, { decimals: 1 })} against predicted ${timeText(predictedS)}.`;
}
