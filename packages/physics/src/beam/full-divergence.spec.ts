import { expectReference } from '../../test/expect-reference';
import { beamParameterProduct } from './beam-parameter-product';
import { focusedSpotDiameter } from './focused-spot-diameter';
import { fullDivergence } from './full-divergence';

describe('fullDivergence', () => {
  expectReference(
    'focused spot, Rayleigh length, depth of focus, divergence, BPP',
    'theta_full_mrad',
    ({ lambda_nm, f_mm, D_1e2_mm, M2 }) => {
      const spotDiameterUm = focusedSpotDiameter({ wavelengthNm: lambda_nm, focalLengthMm: f_mm, beamDiameterMm: D_1e2_mm, m2: M2 });
      return fullDivergence({ spotDiameterUm, wavelengthNm: lambda_nm, m2: M2 });
    },
  );

  it('times the diameter is four times the beam parameter product', () => {
    const waist = { spotDiameterUm: 40, wavelengthNm: 1064, m2: 1.3 };
    const productMmMrad = (fullDivergence(waist) * waist.spotDiameterUm) / 1000;
    expect(productMmMrad).toBeCloseTo(4 * beamParameterProduct(waist.wavelengthNm, waist.m2), 12);
  });

  it('refuses an M² below 1', () => {
    expect(() => fullDivergence({ spotDiameterUm: 40, wavelengthNm: 1064, m2: 0 })).toThrow('m2');
  });
});
