import { requireAtLeast } from './require-at-least';
import { requireFinite } from './require-finite';
import { requirePositive } from './require-positive';
import { requireWhole } from './require-whole';

describe('argument checks', () => {
  it('accept what is in range', () => {
    expect(() => requireFinite({ focusOffsetMm: -2 })).not.toThrow();
    expect(() => requirePositive({ speedMmPerS: 1e-6 })).not.toThrow();
    expect(() => requireAtLeast(1, { m2: 1 })).not.toThrow();
    expect(() => requireWhole({ passes: 3 })).not.toThrow();
  });

  it('name the argument and its value', () => {
    expect(() => requireFinite({ focusOffsetMm: Number.NaN })).toThrow(new RangeError('focusOffsetMm must be a finite number, but is NaN'));
    expect(() => requirePositive({ wavelengthNm: 1064, speedMmPerS: 0 })).toThrow('speedMmPerS must be a finite number above 0, but is 0');
    expect(() => requireAtLeast(1, { m2: 0.42 })).toThrow('m2 must be a finite number of at least 1, but is 0.42');
    expect(() => requireWhole({ passes: 1.5 })).toThrow('passes must be a whole number of at least 1, but is 1.5');
  });

  it('refuse infinity everywhere', () => {
    const infinite = { value: Number.POSITIVE_INFINITY };
    for (const check of [requireFinite, requirePositive, requireWhole]) expect(() => check(infinite)).toThrow(RangeError);
    expect(() => requireAtLeast(0, infinite)).toThrow(RangeError);
  });
});
