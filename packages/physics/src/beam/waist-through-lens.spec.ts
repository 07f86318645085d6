import { expectReferences } from '../../test/expect-reference';
import { focusedSpotDiameter } from './focused-spot-diameter';
import { waistThroughLens } from './waist-through-lens';

const beam = { waistRadiusUm: 5000, wavelengthNm: 1064, m2: 1.2, focalLengthMm: 160, waistPositionMm: 0 };

describe('waistThroughLens', () => {
  expectReferences<Readonly<Record<string, number>>>('waist transformed by a thin lens', ({ lambda_nm, w0_um, f_mm, s_mm, M2 }) => {
    const image = waistThroughLens({ waistRadiusUm: w0_um, wavelengthNm: lambda_nm, m2: M2, focalLengthMm: f_mm, waistPositionMm: s_mm });
    return {
      zR1_mm: image.inputRayleighLengthMm,
      w0_image_um: image.waistRadiusUm,
      zR_image_mm: image.rayleighLengthMm,
      image_distance_mm: image.distanceMm,
    };
  });

  it('agrees with the focused spot of a collimated beam', () => {
    const spotUm = focusedSpotDiameter({ wavelengthNm: 1064, focalLengthMm: 160, beamDiameterMm: 10, m2: 1.2 });
    expect(2 * waistThroughLens(beam).waistRadiusUm).toBeCloseTo(spotUm, 3);
  });

  it('images a waist in the front focal plane into the back one', () => {
    expect(waistThroughLens({ ...beam, waistPositionMm: -160 }).distanceMm).toBe(160);
  });

  it('refuses a lens without focal length', () => {
    expect(() => waistThroughLens({ ...beam, focalLengthMm: 0 })).toThrow('focalLengthMm must be a finite number above 0, but is 0');
  });
});
