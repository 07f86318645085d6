import { chakra } from '@chakra-ui/react';
import type { HeadOverheads } from '@proofplate/recipe-model';
import { useState } from 'react';
import { type Fact, FactList } from '../../../components/fact-list';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { TextLink } from '../../../components/text-link';
import { asSentence, formatQuantity } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { basisWords, headOverheadsOf, timeText } from '../../../lib/time-words';
import { CorrectTime } from '../forms/correct-time';
import { type LoggedTime, type MachineTimes, useMachineTimes } from '../marking-time.api';
import { LoggedTimes } from './logged-times';
import { TimePlot } from './time-plot';

/** What the scan head takes beside its lines, fitted from the times that people logged. */
export function MachineTime({ machine }: { machine: { id: string; name: string } }) {
  const { data, error, mutate } = useMachineTimes(machine.id);
  return (
    <chakra.section aria-labelledby="marking-time-title">
      <h2 id="marking-time-title">Marking time</h2>
      {data === undefined && error === undefined && <SkeletonBlock height="240px" label="Loading the marking times" />}
      {data === undefined && error !== undefined && <ReadProblem problem={error} onRetry={() => void mutate()} />}
      {data !== undefined && <Times machine={machine} times={data} />}
    </chakra.section>
  );
}

function Times({ machine, times: { ground, items } }: { machine: { id: string; name: string }; times: MachineTimes }) {
  const [correcting, setCorrecting] = useState<LoggedTime>();
  const announce = useStatusLine();
  const overheads = headOverheadsOf(ground.overheads);
  return (
    <chakra.div mt="2" display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
      <Panel p="5" display="grid" gap="4">
        <chakra.p>
          Times are worked out {asSentence(overheads.basis === 'not known' ? `not at all: ${overheads.because}` : basisWords(overheads))}
        </chakra.p>
        {overheads.basis === 'fitted' && <FactList facts={factsOf(overheads)} />}
        {overheads.basis === 'fitted' && overheads.scanMissingBecause !== null && (
          <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
            Time per scan: {asSentence(overheads.scanMissingBecause)}
          </chakra.p>
        )}
        <TimePlot items={items} />
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          {items.length === 0
            ? 'Nobody has logged a time yet. Clock a piece on the page of its run, or a cell while a coupon is marked.'
            : 'On the dashed line logged and predicted are the same. A cross does not count.'}{' '}
          <TextLink to={paths.science('marking-time')}>How it is worked out</TextLink>
        </chakra.p>
      </Panel>
      {items.length > 0 && <LoggedTimes label={`Logged times of ${machine.name}`} items={items} onCorrect={setCorrecting} />}
      {correcting !== undefined && (
        <CorrectTime
          machineId={machine.id}
          time={correcting}
          onClose={() => setCorrecting(undefined)}
          onDone={(words) => {
            setCorrecting(undefined);
            announce(words);
          }}
        />
      )}
    </chakra.div>
  );
}

function factsOf({
  n,
  lineMs,
  lineStandardErrorMs,
  scanMs,
  scanStandardErrorMs,
  spreadS,
  jumpSpeedMmPerS,
}: Extract<HeadOverheads, { basis: 'fitted' }>): Fact[] {
  const withError = (value: number, error: number) =>
    `${formatQuantity(value, 'ms', { significantDigits: 3 })} ± ${formatQuantity(error, 'ms', { significantDigits: 2 })}`;
  return [
    { label: 'Time per line beside its beam-on time', value: withError(lineMs, lineStandardErrorMs) },
    {
      label: 'Time per scan',
      value: scanMs === null || scanStandardErrorMs === null ? 'not known' : withError(scanMs, scanStandardErrorMs),
    },
    { label: 'Logged times that count', value: String(n) },
    { label: 'Spread of logged less predicted', value: `± ${timeText(spreadS)}` },
    { label: 'Jump speed of the profile', value: formatQuantity(jumpSpeedMmPerS, 'mm/s') },
  ];
}
