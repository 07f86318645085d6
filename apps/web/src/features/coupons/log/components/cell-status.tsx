import { chakra } from '@chakra-ui/react';
import { Button } from '../../../../components/button';
import { formatClock, formatDate } from '../../../../lib/format';
import type { CellRating, OwnRating } from '../log.api';

export type CellStatusProps = {
  own: OwnRating;
  stored: CellRating | undefined;
  isSkipped: boolean;
  timeZone: string;
  onUndo: (() => void) | undefined;
};

/** "rated 5 by you, 09:24", and the way back. */
export function CellStatus({ own, stored, isSkipped, timeZone, onUndo }: CellStatusProps) {
  const isStored = stored !== undefined && stored.rating === own.rating;
  const rated = own.rating === null ? 'not rated by you' : `rated ${own.rating} by you`;
  return (
    <>
      <chakra.span role="status">
        {isSkipped ? 'skipped when the plate was marked' : rated}
        {own.rating !== null && (isStored ? `, ${when(stored.ratedAt, timeZone)}` : ', being saved')}
      </chakra.span>
      {onUndo !== undefined && (
        <Button kind="quiet" fontSize="sm" minHeight={{ base: 'touch', lg: '28px' }} px="2" ml="1" onClick={onUndo}>
          Undo
        </Button>
      )}
    </>
  );
}

/** The clock for today, the day otherwise. */
function when(time: string, timeZone: string): string {
  const isToday = formatDate(time, timeZone) === formatDate(new Date(), timeZone);
  return isToday ? formatClock(time, timeZone) : formatDate(time, timeZone);
}
