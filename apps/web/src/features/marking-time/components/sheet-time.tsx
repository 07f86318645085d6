import { asSentence } from '../../../lib/format';
import { basisWords, headOverheadsOf, timeText } from '../../../lib/time-words';
import { areaTime } from '../area-time';
import { keptArea } from '../kept-area';
import { sizeWords } from '../logged-words';
import { useRunTimes, useSettingTiming } from '../marking-time.api';

/** A part of this size says enough where nobody typed one. */
const EXAMPLE = { widthMm: 10, heightMm: 10 };

/** The time of a part in one printed line: of the area typed last for the setting, else of a square. */
export function SheetTime({ revisionId }: { revisionId: string }) {
  const { data } = useSettingTiming(revisionId);
  if (data === undefined) return null;
  return <SheetTimeLine timing={data} areaMm={keptArea(revisionId) ?? EXAMPLE} />;
}

/** The time of the artwork that was set up for a run. */
export function PartSheetTime({ runId }: { runId: string }) {
  const { data } = useRunTimes(runId);
  if (data === undefined || data.partArea === null) return null;
  return <SheetTimeLine timing={data.timing} areaMm={data.partArea} />;
}

type SheetTimeLineProps = { timing: Parameters<typeof areaTime>[0]; areaMm: typeof EXAMPLE };

function SheetTimeLine({ timing, areaMm }: SheetTimeLineProps) {
  const time = areaTime(timing, areaMm);
  const size = sizeWords(areaMm);
  if (time.totalS === null) return <>Time not known because {asSentence(time.missingBecause)}</>;
  return (
    <>
      <b>Time</b> about {timeText(time.totalS)} for {size}, {asSentence(basisWords(headOverheadsOf(timing.ground.overheads)))}
    </>
  );
}
