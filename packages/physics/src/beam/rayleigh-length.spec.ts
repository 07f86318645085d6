import { expectReference } from '../../test/expect-reference';
import { rayleighLength } from './rayleigh-length';

describe('rayleighLength', () => {
  expectReference('spot diameter out of focus', 'zR_mm', ({ d0_um, lambda_nm, M2 }) =>
    rayleighLength({ spotDiameterUm: d0_um, wavelengthNm: lambda_nm, m2: M2 }),
  );

  it('is 1.678 mm for the printed example w0 25 µm, 1064 nm, M² 1.1', () => {
    expect(rayleighLength({ spotDiameterUm: 50, wavelengthNm: 1064, m2: 1.1 })).toBeCloseTo(1.67763, 5);
  });

  it('gives a depth of 101.5 µm for a 7.1 µm spot at 780 nm, where one printed page says 20.3 µm', () => {
    expect(2 * rayleighLength({ spotDiameterUm: 7.1, wavelengthNm: 780, m2: 1 })).toBeCloseTo(0.1015, 4);
  });

  it('refuses a wavelength that is not a number', () => {
    expect(() => rayleighLength({ spotDiameterUm: 50, wavelengthNm: Number.NaN, m2: 1 })).toThrow('wavelengthNm');
  });
});
