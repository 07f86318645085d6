import { expectReference } from '../../test/expect-reference';
import { depthForFluenceLoss } from './depth-for-fluence-loss';
import { fluenceRatioAtOffset } from './fluence-ratio-at-offset';
import { rayleighLength } from './rayleigh-length';

describe('depthForFluenceLoss', () => {
  expectReference(
    'depth of focus for an allowed spot growth p, or an allowed fluence loss q',
    'total_depth_fluence_mm',
    ({ d0_um, lambda_nm, M2, q }) => depthForFluenceLoss(rayleighLength({ spotDiameterUm: d0_um, wavelengthNm: lambda_nm, m2: M2 }), q),
  );

  it('ends where the fluence has fallen by the share asked for', () => {
    expect(fluenceRatioAtOffset(0.9, depthForFluenceLoss(0.9, 0.2) / 2)).toBeCloseTo(0.8, 12);
  });

  it('refuses a loss of everything', () => {
    expect(() => depthForFluenceLoss(0.9, 1)).toThrow('loss must be below 1, but is 1');
  });
});
