import { expectReference } from '../../test/expect-reference';
import { pulseEnergy } from './pulse-energy';
import { rectangularPeakPower } from './rectangular-peak-power';

describe('rectangularPeakPower', () => {
  expectReference('pulse energy, peak power, fluence', 'peak_power_rect_kW', ({ P_W, f_kHz, tau_ns }) =>
    rectangularPeakPower(pulseEnergy(P_W, f_kHz), tau_ns),
  );

  it('is 1 MW for 10 nJ in 10 fs', () => {
    expect(rectangularPeakPower(10e-6, 10e-6)).toBeCloseTo(1000, 9);
  });

  it('refuses a pulse without width', () => {
    expect(() => rectangularPeakPower(1, 0)).toThrow('pulseWidthNs must be a finite number above 0, but is 0');
  });
});
