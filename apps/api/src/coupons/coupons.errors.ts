import { ConflictError, NotFoundError } from '../common/errors/domain-error';

export class CouponNotFoundError extends NotFoundError {
  constructor() {
    super('This coupon is not in the shop. Go back to Coupons and choose again.');
  }
}

/** An act that the coupon’s state does not allow. */
export class CouponStateError extends ConflictError {
  override readonly code = 'coupon-state';
  override readonly title = 'The coupon is past this, or not there yet';
}
