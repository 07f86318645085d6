import type { Labels } from '../vocabulary/labelled';
import { type Moved, type Moves, move } from './moves';

export type CouponState = 'planned' | 'marked' | 'inspected' | 'sealed';
export type CouponAction = 'mark' | 'inspect' | 'seal';

export const COUPON_STATE_LABELS: Labels<CouponState> = { planned: 'Planned', marked: 'Marked', inspected: 'Inspected', sealed: 'Sealed' };
export const COUPON_ACTION_LABELS: Labels<CouponAction> = { mark: 'Mark', inspect: 'Finish the inspection', seal: 'Seal' };

const MOVES: Moves<CouponState, CouponAction> = {
  planned: { mark: 'marked' },
  marked: { inspect: 'inspected' },
  inspected: { seal: 'sealed' },
  sealed: {},
};

/** The state after an action, or a refusal in words; a sealed coupon is corrected by linked records only. */
export function nextCouponState(state: CouponState, action: CouponAction): Moved<CouponState> {
  return move(MOVES, state, action, { thing: 'coupon', stateLabel: COUPON_STATE_LABELS[state], actionLabel: COUPON_ACTION_LABELS[action] });
}

/** Only a sealed coupon may be cited as evidence. */
export function isCitable(state: CouponState): boolean {
  return state === 'sealed';
}
