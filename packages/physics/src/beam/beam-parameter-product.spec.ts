import { expectReference } from '../../test/expect-reference';
import { beamParameterProduct } from './beam-parameter-product';

describe('beamParameterProduct', () => {
  expectReference('beam parameter product', 'bpp_mm_mrad', ({ lambda_nm, M2 }) => beamParameterProduct(lambda_nm, M2));

  it('is 0.338682 mm·mrad for a perfect 1064 nm beam: radius × half angle', () => {
    expect(beamParameterProduct(1064, 1)).toBeCloseTo(0.338682, 6);
  });

  it('refuses a negative wavelength', () => {
    expect(() => beamParameterProduct(-1064, 1)).toThrow('wavelengthNm must be a finite number above 0, but is -1064');
  });
});
