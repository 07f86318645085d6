import fc from 'fast-check';
import { codesOf } from '../vocabulary/labelled';
import { COUPON_ACTION_LABELS, COUPON_STATE_LABELS, type CouponAction, type CouponState, isCitable, nextCouponState } from './coupon-state';

const ORDER: readonly CouponState[] = ['planned', 'marked', 'inspected', 'sealed'];
const ACTIONS: readonly CouponAction[] = ['mark', 'inspect', 'seal'];

describe('nextCouponState', () => {
  it('knows exactly three jumps, each to the next state', () => {
    for (const [index, state] of ORDER.entries()) {
      for (const [step, action] of ACTIONS.entries()) {
        const moved = nextCouponState(state, action);
        if (step === index) expect(moved).toEqual({ kind: 'moved', state: ORDER[index + 1] });
        else expect(moved.kind).toBe('refused');
      }
    }
    expect(codesOf(COUPON_STATE_LABELS)).toEqual(ORDER);
    expect(codesOf(COUPON_ACTION_LABELS)).toEqual(ACTIONS);
  });

  it('in any sequence of actions goes forward one state at a time', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...ACTIONS), { maxLength: 20 }), (actions) => {
        let state: CouponState = 'planned';
        for (const action of actions) {
          const moved = nextCouponState(state, action);
          if (moved.kind === 'refused') continue;
          expect(ORDER.indexOf(moved.state)).toBe(ORDER.indexOf(state) + 1);
          state = moved.state;
        }
      }),
    );
  });

  it('refuses in words', () => {
    expect(nextCouponState('sealed', 'mark')).toEqual({
      kind: 'refused',
      message: '“Mark” is not possible for a coupon that is in the state “Sealed”.',
    });
  });
});

describe('isCitable', () => {
  it('lets only a sealed coupon be cited', () => {
    expect(ORDER.filter(isCitable)).toEqual(['sealed']);
  });
});
