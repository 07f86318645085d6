import fc from 'fast-check';
import { expectReference } from '../../test/expect-reference';
import { rayleighLength } from './rayleigh-length';
import { spotDiameterAtOffset } from './spot-diameter-at-offset';

const positive = fc.double({ min: 0.01, max: 1000, noNaN: true });

describe('spotDiameterAtOffset', () => {
  expectReference('spot diameter out of focus', 'd_um', ({ d0_um, lambda_nm, M2, z_mm }) =>
    spotDiameterAtOffset(d0_um, rayleighLength({ spotDiameterUm: d0_um, wavelengthNm: lambda_nm, m2: M2 }), z_mm),
  );

  it('is the focal spot without an offset', () => {
    expect(spotDiameterAtOffset(40, 0.9, 0)).toBe(40);
  });

  it('is the same above and below the focus, and never smaller than in focus', () => {
    fc.assert(
      fc.property(positive, positive, positive, (spotUm, rayleighMm, offsetMm) => {
        const above = spotDiameterAtOffset(spotUm, rayleighMm, offsetMm);
        expect(spotDiameterAtOffset(spotUm, rayleighMm, -offsetMm)).toBe(above);
        expect(above).toBeGreaterThanOrEqual(spotUm);
      }),
    );
  });

  it('refuses a Rayleigh length of zero', () => {
    expect(() => spotDiameterAtOffset(40, 0, 1)).toThrow('rayleighLengthMm must be a finite number above 0, but is 0');
  });
});
