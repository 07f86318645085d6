import { expectReference } from '../../test/expect-reference';
import { depthForSpotGrowth } from './depth-for-spot-growth';
import { rayleighLength } from './rayleigh-length';
import { spotDiameterAtOffset } from './spot-diameter-at-offset';

describe('depthForSpotGrowth', () => {
  expectReference(
    'depth of focus for an allowed spot growth p, or an allowed fluence loss q',
    'total_depth_growth_mm',
    ({ d0_um, lambda_nm, M2, p }) => depthForSpotGrowth(rayleighLength({ spotDiameterUm: d0_um, wavelengthNm: lambda_nm, m2: M2 }), p),
  );

  it('ends where the spot has grown by the share asked for', () => {
    expect(spotDiameterAtOffset(40, 0.9, depthForSpotGrowth(0.9, 0.05) / 2)).toBeCloseTo(42, 12);
  });

  it('refuses no growth at all', () => {
    expect(() => depthForSpotGrowth(0.9, 0)).toThrow('growth must be a finite number above 0, but is 0');
  });
});
