import { expectReference } from '../../test/expect-reference';
import { fluenceRatioAtOffset } from './fluence-ratio-at-offset';
import { rayleighLength } from './rayleigh-length';

describe('fluenceRatioAtOffset', () => {
  expectReference('spot diameter out of focus', 'fluence_ratio', ({ d0_um, lambda_nm, M2, z_mm }) =>
    fluenceRatioAtOffset(rayleighLength({ spotDiameterUm: d0_um, wavelengthNm: lambda_nm, m2: M2 }), z_mm),
  );

  it('is one half at one Rayleigh length', () => {
    expect(fluenceRatioAtOffset(0.9, -0.9)).toBe(0.5);
  });

  it('refuses an offset that is not finite', () => {
    expect(() => fluenceRatioAtOffset(1, Number.POSITIVE_INFINITY)).toThrow('focusOffsetMm');
  });
});
