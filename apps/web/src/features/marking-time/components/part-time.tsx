import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Panel } from '../../../components/page';
import { typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { headOverheadsOf } from '../../../lib/time-words';
import { areaTime, readArea } from '../area-time';
import { keepArea, keptArea } from '../kept-area';
import { type SettingTiming, useSettingTiming } from '../marking-time.api';
import { AreaFields, type TypedArea } from './area-fields';
import { TimeLine } from './time-line';

/** How long a part takes with a setting, as soon as its area is typed. */
export function PartTime({ revisionId }: { revisionId: string }) {
  const { data } = useSettingTiming(revisionId);
  return data === undefined ? null : <PartTimeOf key={revisionId} revisionId={revisionId} timing={data} />;
}

function PartTimeOf({ revisionId, timing }: { revisionId: string; timing: SettingTiming }) {
  const { shop } = useSession();
  const [typed, setTyped] = useState<TypedArea>(() => {
    const kept = keptArea(revisionId);
    return { width: typedNumber(kept?.widthMm, shop.locale), height: typedNumber(kept?.heightMm, shop.locale) };
  });
  const area = readArea(typed.width, typed.height, shop.locale);
  const handleChange = (next: TypedArea) => {
    setTyped(next);
    const read = readArea(next.width, next.height, shop.locale);
    if (read !== undefined) keepArea(revisionId, read);
  };
  return (
    <Panel px="5" py="4" aria-labelledby="part-time-title" display="grid" gap="3">
      <chakra.h2 id="part-time-title" fontSize="lg">
        Time for a part
      </chakra.h2>
      {timing.missingBecause === null ? (
        <AreaFields area={typed} onChange={handleChange} />
      ) : (
        <chakra.p color="fg.muted">The time is not known because {timing.missingBecause}.</chakra.p>
      )}
      {timing.missingBecause === null && (
        <chakra.div role="status">
          {area === undefined ? (
            <chakra.p color="fg.muted">Type the marked area of the part.</chakra.p>
          ) : (
            <TimeLine time={areaTime(timing, area)} overheads={headOverheadsOf(timing.ground.overheads)}>
              for this part
            </TimeLine>
          )}
        </chakra.div>
      )}
    </Panel>
  );
}
