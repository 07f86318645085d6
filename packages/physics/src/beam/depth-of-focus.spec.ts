import { expectReference } from '../../test/expect-reference';
import { depthOfFocus } from './depth-of-focus';
import { focusedSpotDiameter } from './focused-spot-diameter';
import { rayleighLength } from './rayleigh-length';

describe('depthOfFocus', () => {
  expectReference('focused spot, Rayleigh length, depth of focus, divergence, BPP', 'dof_2zR_mm', ({ lambda_nm, f_mm, D_1e2_mm, M2 }) => {
    const spotDiameterUm = focusedSpotDiameter({ wavelengthNm: lambda_nm, focalLengthMm: f_mm, beamDiameterMm: D_1e2_mm, m2: M2 });
    return depthOfFocus(rayleighLength({ spotDiameterUm, wavelengthNm: lambda_nm, m2: M2 }));
  });

  it('refuses a negative Rayleigh length', () => {
    expect(() => depthOfFocus(-1)).toThrow('rayleighLengthMm must be a finite number above 0, but is -1');
  });
});
