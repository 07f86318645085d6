import { COUPON_STATE_LABELS, type CouponState } from '@proofplate/recipe-model';
import type { MarkState } from '../../components/state-mark';
import type { CouponSummary } from './coupons.api';

const SHAPES: Readonly<Record<CouponState, MarkState>> = { planned: 'draft', marked: 'inReview', inspected: 'passes', sealed: 'approved' };

/** State of a coupon as word and shape. */
export const couponMark = (state: CouponState): { shape: MarkState; word: string } => ({
  shape: SHAPES[state],
  word: COUPON_STATE_LABELS[state],
});

/** "Bead blasted" within a line; names such as "F160" stay. */
export function lowerFirst(words: string): string {
  return /^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;
}

export const groundWords = ({ material, finish }: Pick<CouponSummary, 'material' | 'finish'>): string =>
  `${material.name}, ${lowerFirst(finish.name)}`;
