import { expectReference } from '../../test/expect-reference';
import { focusedSpotDiameter } from './focused-spot-diameter';
import { truncatedSpotDiameter } from './truncated-spot-diameter';

const beam = { wavelengthNm: 1064, focalLengthMm: 160, beamDiameterMm: 10, m2: 1.2 };

describe('truncatedSpotDiameter', () => {
  expectReference('focused spot with truncation (apodisation) factor', 'd0_um', ({ lambda_nm, f_mm, D_1e2_mm, M2, APO }) =>
    truncatedSpotDiameter({ wavelengthNm: lambda_nm, focalLengthMm: f_mm, beamDiameterMm: D_1e2_mm, m2: M2 }, APO),
  );

  it('equals the Gaussian spot at 4/π', () => {
    expect(truncatedSpotDiameter(beam, 4 / Math.PI)).toBeCloseTo(focusedSpotDiameter(beam), 12);
  });

  it('refuses a factor of zero', () => {
    expect(() => truncatedSpotDiameter(beam, 0)).toThrow('apodisationFactor must be a finite number above 0, but is 0');
  });
});
