import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { timeText, timeWithError } from '../../../lib/time-words';
import { differenceWords, markedWords, remarkWords, whereWords } from '../logged-words';
import type { LoggedTime } from '../marking-time.api';

export type LoggedTimesProps = {
  label: string;
  items: readonly LoggedTime[];
  /** Absent: whoever looks may not correct. */
  onCorrect?: ((time: LoggedTime) => void) | undefined;
};

/** Predicted beside logged, newest first. */
export function LoggedTimes({ label, items, onCorrect }: LoggedTimesProps) {
  const { shop } = useSession();
  const columns = onCorrect === undefined ? columnsOf(shop.timeZone) : [...columnsOf(shop.timeZone), correctColumn(onCorrect)];
  return <DataTable label={label} columns={columns} rows={items} rowKey={({ id }) => id} isHighlighted={({ isOutlier }) => isOutlier} />;
}

const columnsOf = (timeZone: string): readonly Column<LoggedTime>[] => [
  {
    key: 'where',
    header: 'Clocked at',
    onPhone: 'title',
    cell: (time) => (
      <chakra.div py="1.5">
        <b>{whereWords(time)}</b>
        <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted" fontWeight="normal">
          {time.loggedBy}, {formatTime(time.loggedAt, timeZone)}
        </chakra.span>
        {remarkWords(time).map((words) => (
          <chakra.span key={words} display="block" fontSize="sm" lineHeight="sm" color="straw.fg" fontWeight="normal">
            {words}
          </chakra.span>
        ))}
      </chakra.div>
    ),
  },
  { key: 'what', header: 'Marked', cell: markedWords },
  {
    key: 'logged',
    header: 'Logged',
    align: 'end',
    cell: ({ seconds, counts }) => <chakra.span whiteSpace="nowrap">{counts ? timeText(seconds) : <s>{timeText(seconds)}</s>}</chakra.span>,
  },
  {
    key: 'predicted',
    header: 'Predicted',
    align: 'end',
    cell: ({ predicted: { totalS, errorS } }) => (
      <chakra.span whiteSpace="nowrap">{totalS === null ? 'not known' : timeWithError({ totalS, errorS })}</chakra.span>
    ),
  },
  { key: 'difference', header: 'Difference', align: 'end', cell: differenceWords },
];

const correctColumn = (onCorrect: (time: LoggedTime) => void): Column<LoggedTime> => ({
  key: 'correct',
  header: 'Correct',
  isHeaderHidden: true,
  align: 'end',
  cell: (time) => (
    <Button kind="quiet" aria-label={`Correct the time of ${whereWords(time)}, ${timeText(time.seconds)}`} onClick={() => onCorrect(time)}>
      Correct
    </Button>
  ),
});
