import { expectReference } from '../../test/expect-reference';
import { lineEnergy } from './line-energy';
import { pulseEnergy } from './pulse-energy';
import { pulsePitch } from './pulse-pitch';

describe('lineEnergy', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'line_energy_J_mm', ({ P_W, v_mm_s }) =>
    lineEnergy(P_W, v_mm_s),
  );

  it('is pulse energy over pitch', () => {
    expect(lineEnergy(20, 200)).toBeCloseTo(pulseEnergy(20, 40) / pulsePitch(200, 40), 12);
  });

  it('refuses a beam that stands still', () => {
    expect(() => lineEnergy(20, 0)).toThrow('speedMmPerS must be a finite number above 0, but is 0');
  });
});
