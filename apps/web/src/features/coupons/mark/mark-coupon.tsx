import type { ReactNode } from 'react';
import { ButtonLink } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { paths } from '../../../lib/paths';
import { couponMark } from '../coupon-words';
import { type Coupon, type CouponCell, useCautionsFor } from '../coupons.api';
import { FinishMarking } from './finish-marking';
import { MarkCells } from './mark-cells';
import { MarkLabels } from './mark-labels';
import { currentCell, inRunOrder, lastDone } from './marking-order';
import { type CouponOnPage, useMarking } from './use-marking';

export type MarkCouponProps = {
  coupon: Coupon;
  page: CouponOnPage;
  locale: string;
  /** The clock of a cell, or of all cells. */
  clock: (cell?: CouponCell) => ReactNode;
  onFinished: (coupon: Coupon) => void;
};

/** At the machine, gloves on: labels, then every cell in run order, then the plate is marked. */
export function MarkCoupon({ coupon, page, locale, clock, onFinished }: MarkCouponProps) {
  const marking = useMarking(coupon, page);
  const { material, finish, effect, machine } = coupon;
  const cautions = useCautionsFor({ materialId: material.id, finishId: finish.id, effectId: effect.id, machineId: machine.id });
  if (coupon.state !== 'planned') {
    return (
      <EmptyState
        kind="none-match"
        title={`${coupon.code} is ${couponMark(coupon.state).word.toLowerCase()}`}
        actions={
          <ButtonLink kind="primary" to={paths.coupon(coupon.code)}>
            Open {coupon.code}
          </ButtonLink>
        }
      >
        There is nothing left to mark on this plate.
      </EmptyState>
    );
  }
  if (!coupon.allowedActions.includes('mark')) {
    return (
      <EmptyState kind="no-right" title="Your role does not mark coupons">
        Ask an operator of the shop to mark it.
      </EmptyState>
    );
  }
  if (coupon.markingStartedAt === null)
    return <MarkLabels coupon={coupon} cautions={cautions} onStarted={(started) => page.change(() => started)} />;
  const ordered = inRunOrder(coupon);
  const current = currentCell(ordered);
  if (current !== undefined)
    return (
      <MarkCells
        coupon={coupon}
        ordered={ordered}
        current={current}
        cautions={cautions}
        marking={marking}
        locale={locale}
        clock={clock(current)}
      />
    );
  const last = lastDone(ordered);
  return (
    <FinishMarking
      coupon={coupon}
      clock={clock()}
      onFinished={onFinished}
      onUndo={last === undefined ? undefined : () => void marking.undo(last)}
    />
  );
}
