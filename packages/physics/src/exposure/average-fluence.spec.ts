import { expectReference } from '../../test/expect-reference';
import { averageFluence } from './average-fluence';
import { pulseEnergy } from './pulse-energy';

describe('averageFluence', () => {
  expectReference('pulse energy, peak power, fluence', 'fluence_avg_J_cm2', ({ P_W, f_kHz, d_um }) =>
    averageFluence(pulseEnergy(P_W, f_kHz), d_um),
  );

  it('falls to a quarter on a spot twice as wide', () => {
    expect(averageFluence(1, 100)).toBeCloseTo(averageFluence(1, 50) / 4, 12);
  });

  it('refuses a spot without width', () => {
    expect(() => averageFluence(1, 0)).toThrow('spotDiameterUm must be a finite number above 0, but is 0');
  });
});
