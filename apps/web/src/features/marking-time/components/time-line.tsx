import { chakra } from '@chakra-ui/react';
import type { HeadOverheads, MarkTime } from '@proofplate/recipe-model';
import type { ReactNode } from 'react';
import { asSentence } from '../../../lib/format';
import { basisWords, timeWithError } from '../../../lib/time-words';

export type TimeLineProps = { time: MarkTime; overheads: HeadOverheads; children: ReactNode };

/** A predicted time with what it rests on, or why there is none. `children` name what is marked. */
export function TimeLine({ time, overheads, children }: TimeLineProps) {
  if (time.totalS === null) return <chakra.p color="fg.muted">The time is not known because {asSentence(time.missingBecause)}</chakra.p>;
  return (
    <div>
      <chakra.p fontSize="xl" lineHeight="title">
        about <b>{timeWithError(time)}</b> {children}
      </chakra.p>
      <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
        {asSentence(basisWords(overheads).replace(/^w/, 'W'))}
      </chakra.p>
    </div>
  );
}
