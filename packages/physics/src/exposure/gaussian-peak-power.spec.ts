import { expectReference } from '../../test/expect-reference';
import { gaussianPeakPower } from './gaussian-peak-power';
import { pulseEnergy } from './pulse-energy';
import { rectangularPeakPower } from './rectangular-peak-power';

describe('gaussianPeakPower', () => {
  expectReference('pulse energy, peak power, fluence', 'peak_power_gauss_kW', ({ P_W, f_kHz, tau_ns }) =>
    gaussianPeakPower(pulseEnergy(P_W, f_kHz), tau_ns),
  );

  it('holds the pulse energy: the Gaussian over time integrates to it', () => {
    const peakKw = gaussianPeakPower(1, 100);
    let energyMj = 0;
    for (let timeNs = -400; timeNs <= 400; timeNs += 1) energyMj += (peakKw * Math.exp(-4 * Math.LN2 * (timeNs / 100) ** 2)) / 1000;
    expect(energyMj).toBeCloseTo(1, 9);
  });

  it('is 0.939437 of the rectangular peak power, the other one in print', () => {
    expect(gaussianPeakPower(1, 100) / rectangularPeakPower(1, 100)).toBeCloseTo(0.939437, 6);
  });

  it('refuses a negative energy', () => {
    expect(() => gaussianPeakPower(-1, 100)).toThrow('pulseEnergyMj must be a finite number of at least 0, but is -1');
  });
});
