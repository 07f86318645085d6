import { expectReference } from '../../test/expect-reference';
import { gaussianPeakPower } from '../exposure/gaussian-peak-power';
import { peakIrradiance } from '../exposure/peak-irradiance';
import { smallestDiameterForIrradiance } from './smallest-diameter-for-irradiance';

const MJ_PER_J = 1000;

describe('smallestDiameterForIrradiance', () => {
  expectReference('smallest beam diameter under an irradiance limit', 'diameter_mm', ({ E_J, tau_FWHM_ns, I_limit_W_cm2 }) =>
    smallestDiameterForIrradiance(gaussianPeakPower(E_J * MJ_PER_J, tau_FWHM_ns), I_limit_W_cm2),
  );

  it('gives the diameter at which the peak irradiance equals the limit', () => {
    const diameterMm = smallestDiameterForIrradiance(10, 1e9);
    expect(peakIrradiance(10, diameterMm * 1000)).toBeCloseTo(1, 10);
  });

  it('refuses a limit of zero', () => {
    expect(() => smallestDiameterForIrradiance(10, 0)).toThrow('irradianceLimitWPerCm2 must be a finite number above 0, but is 0');
  });
});
