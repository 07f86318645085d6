import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { useStatusLine } from '../../../components/status-line';
import { timeText, timeWithError } from '../../../lib/time-words';
import { differenceWords, whereWords } from '../logged-words';
import { type LoggedTime, logCouponTime, useCouponTimes } from '../marking-time.api';
import { ClockTime } from './clock-time';

export type CouponClockProps = {
  coupon: { id: string; code: string };
  /** The cell at hand; absent: all cells. */
  cell?: { id: string; address: string } | undefined;
};

/** The clock of a cell, or of the whole plate, beside its marking. */
export function CouponClock({ coupon, cell }: CouponClockProps) {
  const [isOpen, setIsOpen] = useState(false);
  const what = cell === undefined ? 'all cells' : cell.address;
  return (
    <>
      <Button size="glove" onClick={() => setIsOpen(true)}>
        Clock {what}
      </Button>
      {isOpen && (
        <Dialog title={`Clock ${what}`} onClose={() => setIsOpen(false)}>
          <CouponClockOf coupon={coupon} cell={cell} onLogged={() => setIsOpen(false)} />
        </Dialog>
      )}
    </>
  );
}

function CouponClockOf({ coupon, cell, onLogged }: CouponClockProps & { onLogged: () => void }) {
  const { data: times } = useCouponTimes(coupon.id);
  const announce = useStatusLine();
  const predicted = cell === undefined ? times?.whole : times?.cells.find(({ cellId }) => cellId === cell.id)?.predicted;
  const logged = times?.items.filter(({ address }) => address === (cell?.address ?? null)) ?? [];
  const log = async (seconds: number, idempotencyKey: string) => {
    const body = { seconds, ...(cell === undefined ? {} : { cellId: cell.id }) };
    const kept = await logCouponTime(coupon.id, body, idempotencyKey);
    announce(`${timeText(kept.seconds)} is logged for ${whereWords(kept)}.`);
    onLogged();
  };
  return (
    <chakra.div display="grid" gap="4">
      <p>
        {predicted === undefined || predicted.totalS === null
          ? `The time is not known${predicted?.missingBecause == null ? '' : ` because ${predicted.missingBecause}`}.`
          : `Predicted: about ${timeWithError({ totalS: predicted.totalS, errorS: predicted.errorS })}. Clock the marking alone, without dialling in and without the labels.`}
      </p>
      <ClockTime predictedS={predicted?.totalS ?? null} onLog={log} />
      {logged.map((time) => (
        <LoggedLine key={time.id} time={time} />
      ))}
    </chakra.div>
  );
}

function LoggedLine({ time }: { time: LoggedTime }) {
  return (
    <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
      Logged: {timeText(time.seconds)} by {time.loggedBy}, {differenceWords(time)} against predicted.
    </chakra.p>
  );
}
