import { type CouponState, roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type CouponActionName =
  | 'mark'
  | 'photograph'
  | 'record-criteria'
  | 'rate'
  | 'measure'
  | 'inspect'
  | 'seal'
  | 'correct'
  | 'draft-recipe'
  | 'plan-next';

const ALWAYS: readonly CouponActionName[] = ['plan-next'];
const BY_STATE: Readonly<Record<CouponState, readonly CouponActionName[]>> = {
  planned: ['mark', 'record-criteria'],
  marked: ['photograph', 'record-criteria', 'rate', 'measure', 'inspect', 'draft-recipe'],
  inspected: ['photograph', 'rate', 'measure', 'seal', 'draft-recipe'],
  sealed: ['correct', 'draft-recipe'],
};

/** What the member may do with a coupon. A coupon of equal cells proves a setting that is there already, so none is drafted from it. */
export function couponActions(
  actor: Pick<Actor, 'role'>,
  { state, purpose }: { readonly state: CouponState; readonly purpose: string },
): CouponActionName[] {
  if (!roleAtLeast(actor.role, 'operator')) return [];
  return [...BY_STATE[state], ...ALWAYS].filter((action) => action !== 'draft-recipe' || purpose !== 'confirmation');
}

/** What the member may do with the spot that a coupon's craters give: it becomes the machine's, so whoever may change the machine may. */
export function craterFitActions(actor: Pick<Actor, 'role'>): 'save-spot'[] {
  return roleAtLeast(actor.role, 'lead') ? ['save-spot'] : [];
}
