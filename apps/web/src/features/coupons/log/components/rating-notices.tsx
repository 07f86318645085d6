import { Button } from '../../../../components/button';
import { ProblemNotice } from '../../../../components/problem-notice';
import type { Coupon } from '../../coupons.api';
import type { OwnRatings } from '../use-own-ratings';
import { ConflictDialog } from './conflict-dialog';

/** A refused save: the values before it are back, and it can be sent again. */
export function NotSaved({ coupon, ratings }: { coupon: Coupon; ratings: OwnRatings }) {
  if (ratings.refusal === undefined) return null;
  const { problem, dropped } = ratings.refusal;
  const addresses = coupon.cells.filter(({ id }) => dropped.has(id)).map(({ address }) => address);
  return (
    <ProblemNotice
      what={`${addresses.join(', ')} ${addresses.length === 1 ? 'was' : 'were'} not saved.`}
      safe="The earlier values are back; a typed note is still in its field."
      todo={problem.status === 0 ? 'The server did not answer. Send it again when the connection is back.' : problem.detail}
      actions={<Button onClick={ratings.sendAgain}>Send again</Button>}
    />
  );
}

/** One conflict after the other. */
export function Conflict({ coupon, ratings }: { coupon: Coupon; ratings: OwnRatings }) {
  const [conflict] = ratings.conflicts;
  if (conflict === undefined) return null;
  const address = coupon.cells.find(({ id }) => id === conflict.cellId)?.address ?? '';
  return (
    <ConflictDialog
      key={conflict.cellId}
      address={address}
      conflict={conflict}
      onSettle={(keepsMine) => ratings.settle(conflict, keepsMine)}
    />
  );
}
