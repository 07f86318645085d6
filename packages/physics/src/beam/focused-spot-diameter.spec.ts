import { expectReference } from '../../test/expect-reference';
import { focusedSpotDiameter } from './focused-spot-diameter';

const beam = { wavelengthNm: 1064, focalLengthMm: 160, beamDiameterMm: 10, m2: 1.2 };

describe('focusedSpotDiameter', () => {
  expectReference('focused spot, Rayleigh length, depth of focus, divergence, BPP', 'd0_um', ({ lambda_nm, f_mm, D_1e2_mm, M2 }) =>
    focusedSpotDiameter({ wavelengthNm: lambda_nm, focalLengthMm: f_mm, beamDiameterMm: D_1e2_mm, m2: M2 }),
  );

  it('halves when the beam at the lens is twice as wide', () => {
    expect(focusedSpotDiameter({ ...beam, beamDiameterMm: 20 })).toBeCloseTo(focusedSpotDiameter(beam) / 2, 12);
  });

  it('refuses an M² below 1 and a beam without width', () => {
    expect(() => focusedSpotDiameter({ ...beam, m2: 0.9 })).toThrow('m2 must be a finite number of at least 1, but is 0.9');
    expect(() => focusedSpotDiameter({ ...beam, beamDiameterMm: 0 })).toThrow('beamDiameterMm');
  });
});
