import { expectReference } from '../../test/expect-reference';
import { gaussianPeakPower } from './gaussian-peak-power';
import { peakIrradiance } from './peak-irradiance';
import { pulseEnergy } from './pulse-energy';

describe('peakIrradiance', () => {
  expectReference('pulse energy, peak power, fluence', 'irradiance_peak_GW_cm2', ({ P_W, f_kHz, tau_ns, d_um }) =>
    peakIrradiance(gaussianPeakPower(pulseEnergy(P_W, f_kHz), tau_ns), d_um),
  );

  it('grows with the power', () => {
    expect(peakIrradiance(20, 50)).toBeCloseTo(2 * peakIrradiance(10, 50), 12);
  });

  it('refuses a power that is not a number', () => {
    expect(() => peakIrradiance(Number.NaN, 50)).toThrow('peakPowerKw must be a finite number of at least 0, but is NaN');
  });
});
