import { expectReference } from '../../test/expect-reference';
import { averageFluence } from './average-fluence';
import { peakFluence } from './peak-fluence';
import { pulseEnergy } from './pulse-energy';

describe('peakFluence', () => {
  expectReference('pulse energy, peak power, fluence', 'fluence_peak_J_cm2', ({ P_W, f_kHz, d_um }) =>
    peakFluence(pulseEnergy(P_W, f_kHz), d_um),
  );

  it('integrates over the Gaussian spot to the pulse energy', () => {
    const radiusUm = 25;
    const peakJPerCm2 = peakFluence(1, 2 * radiusUm);
    let energyMj = 0;
    for (let r = 0.05; r < 100; r += 0.1) {
      const ringCm2 = 2 * Math.PI * r * 0.1 * 1e-8;
      energyMj += peakJPerCm2 * Math.exp((-2 * r ** 2) / radiusUm ** 2) * ringCm2 * 1000;
    }
    expect(energyMj).toBeCloseTo(1, 5);
  });

  it('is twice the average fluence: 101.86 and 50.93 J/cm² for 1 mJ on 50 µm', () => {
    expect(peakFluence(1, 50)).toBeCloseTo(101.859164, 6);
    expect(averageFluence(1, 50)).toBeCloseTo(50.929582, 6);
  });

  it('refuses a negative spot', () => {
    expect(() => peakFluence(1, -50)).toThrow('spotDiameterUm must be a finite number above 0, but is -50');
  });
});
