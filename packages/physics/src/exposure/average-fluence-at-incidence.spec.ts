import { expectReference } from '../../test/expect-reference';
import { averageFluence } from './average-fluence';
import { averageFluenceAtIncidence } from './average-fluence-at-incidence';
import { pulseEnergy } from './pulse-energy';

const W_PER_MW = 1e-3;
const MJ_PER_J = 1e3;

describe('averageFluenceAtIncidence', () => {
  expectReference(
    'average fluence at oblique incidence',
    'H_mJ_cm2',
    ({ P_mW, f_kHz, d_um, theta_deg }) => averageFluenceAtIncidence(pulseEnergy(P_mW * W_PER_MW, f_kHz), d_um, theta_deg) * MJ_PER_J,
  );

  it('is the plain average fluence when the beam meets the surface straight', () => {
    expect(averageFluenceAtIncidence(1, 50, 0)).toBe(averageFluence(1, 50));
  });

  it('refuses a grazing beam', () => {
    expect(() => averageFluenceAtIncidence(1, 50, 90)).toThrow('incidenceAngleDeg must be below 90, but is 90');
  });
});
