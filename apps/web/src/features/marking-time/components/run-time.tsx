import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Panel } from '../../../components/page';
import { useStatusLine } from '../../../components/status-line';
import { messageOf, typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { headOverheadsOf, timeText } from '../../../lib/time-words';
import { areaTime, readArea, readHeight, readWidth } from '../area-time';
import { keepArea, keptArea } from '../kept-area';
import { logRunTime, type RunTimes, useRunTimes } from '../marking-time.api';
import { AreaFields, type TypedArea } from './area-fields';
import { ClockTime } from './clock-time';
import { LoggedTimes } from './logged-times';
import { TimeLine } from './time-line';

export type RunTimeProps = { run: { id: string; code: string; revisionId: string; isOpen: boolean } };

/** How long a piece of the run takes, and how long it took. */
export function RunTime({ run }: RunTimeProps) {
  const { data } = useRunTimes(run.id);
  if (data === undefined) return null;
  return <RunTimeOf key={run.id} run={run} times={data} />;
}

function RunTimeOf({ run, times }: RunTimeProps & { times: RunTimes }) {
  const { shop } = useSession();
  const announce = useStatusLine();
  const [typed, setTyped] = useState(() => startArea(run.revisionId, times, shop.locale));
  const [isAsked, setIsAsked] = useState(false);
  const { timing, partArea, items } = times;
  const area = readArea(typed.width, typed.height, shop.locale);
  const predicted = area === undefined ? undefined : areaTime(timing, area);
  const log = async (seconds: number, idempotencyKey: string) => {
    if (area === undefined) return;
    keepArea(run.revisionId, area);
    const logged = await logRunTime(run.id, { ...area, seconds }, idempotencyKey);
    setIsAsked(false);
    announce(`${timeText(logged.seconds)} is logged for ${run.code}.`);
  };
  const isReady = () => {
    setIsAsked(true);
    return area !== undefined;
  };
  if (!run.isOpen && items.length === 0 && timing.missingBecause !== null) return null;
  return (
    <Panel px="5" py="4" aria-labelledby="run-time-title" display="grid" gap="4">
      <h2 id="run-time-title">Marking time</h2>
      {timing.missingBecause === null ? (
        <chakra.div
          display="grid"
          gap="4"
          alignItems="start"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'repeat(2, minmax(0, 1fr))' }}
        >
          <chakra.div display="grid" gap="3">
            <AreaFields
              area={typed}
              onChange={setTyped}
              errors={isAsked ? errorsOf(typed, shop.locale) : {}}
              {...(partArea === null ? {} : { help: 'From the part set-up of this run.' })}
            />
            {predicted === undefined ? (
              <chakra.p color="fg.muted">Type the marked area of the part.</chakra.p>
            ) : (
              <TimeLine time={predicted} overheads={headOverheadsOf(timing.ground.overheads)}>
                for this part
              </TimeLine>
            )}
          </chakra.div>
          <ClockTime predictedS={predicted?.totalS ?? null} isReady={isReady} onLog={log} />
        </chakra.div>
      ) : (
        <chakra.p color="fg.muted">The time is not known because {timing.missingBecause}.</chakra.p>
      )}
      {items.length > 0 && <LoggedTimes label={`Logged times of ${run.code}`} items={items} />}
    </Panel>
  );
}

/** The part that was set up, else what was clocked last, else what was typed for this setting. */
function startArea(revisionId: string, { partArea, items }: RunTimes, locale: string): TypedArea {
  const area = partArea ?? items[0]?.areas[0] ?? keptArea(revisionId);
  const tidy = (side: number | undefined) => typedNumber(side === undefined ? undefined : Number(side.toFixed(2)), locale);
  return { width: tidy(area?.widthMm), height: tidy(area?.heightMm) };
}

function errorsOf({ width, height }: TypedArea, locale: string) {
  const [ofWidth, ofHeight] = [messageOf(readWidth(width, locale)), messageOf(readHeight(height, locale))];
  return { width: ofWidth === true ? undefined : ofWidth, height: ofHeight === true ? undefined : ofHeight };
}
