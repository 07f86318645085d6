import type { CouponState } from '@proofplate/recipe-model';
import { CouponSealedError } from '../photos/photos.errors';
import { CriteriaFirstError, CriteriaFixedError } from './coupon-inspection.errors';
import { CouponStateError } from './coupons.errors';

type InspectedCoupon = { readonly state: CouponState; readonly criteriaRecordedAt: Date | null };

/** Ratings and measurements belong to a marked plate whose criteria are on record. */
export function requireOpenForResults({ state, criteriaRecordedAt }: InspectedCoupon): void {
  if (state === 'sealed') throw new CouponSealedError();
  if (state === 'planned') throw new CouponStateError('The plate is not marked yet. Mark it, then judge its cells.');
  if (criteriaRecordedAt === null) throw new CriteriaFirstError();
}

/** Criteria may be recorded, and recorded anew, until the first result. */
export function requireOpenForCriteria({ state }: InspectedCoupon, hasResults: boolean): void {
  if (state === 'sealed') throw new CouponSealedError();
  if (hasResults || state === 'inspected') throw new CriteriaFixedError();
}

/** A correction stands beside what can no longer be changed. */
export function requireSealed({ state }: InspectedCoupon): void {
  if (state !== 'sealed') throw new CouponStateError('The coupon is not sealed, so change the rating or measurement itself.');
}
