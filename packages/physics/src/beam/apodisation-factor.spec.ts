import { apodisationFactor } from './apodisation-factor';

describe('apodisationFactor', () => {
  it.each([
    [20, 1.27],
    [15, 1.41],
    [12.5, 1.56],
    [10, 1.83],
    [9, 1.99],
    [7.5, 2.32],
  ])('gives the printed factor for an aperture of %d mm and a beam of 10 mm', (apertureMm, printed) => {
    expect(Math.abs(apodisationFactor(apertureMm, 10) - printed)).toBeLessThan(0.005);
  });

  it('never falls as the aperture closes, and stays 4/π where nothing is cut', () => {
    let before = apodisationFactor(100, 10);
    expect(before).toBe(4 / Math.PI);
    for (let apertureMm = 21; apertureMm >= 7.5; apertureMm -= 0.1) {
      const factor = apodisationFactor(apertureMm, 10);
      expect(factor).toBeGreaterThanOrEqual(before - 1e-12);
      before = factor;
    }
  });

  it('refuses an aperture that the printed table does not reach', () => {
    expect(() => apodisationFactor(5, 10)).toThrow('apertureMm must be at least 0.75 of the beam diameter of 10, but is 5');
    expect(() => apodisationFactor(0, 10)).toThrow('apertureMm must be a finite number above 0, but is 0');
  });
});
