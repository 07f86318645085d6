import { expectReference } from '../../test/expect-reference';
import { pulseEnergy } from './pulse-energy';

describe('pulseEnergy', () => {
  expectReference('pulse energy, peak power, fluence', 'pulse_energy_mJ', ({ P_W, f_kHz }) => pulseEnergy(P_W, f_kHz));

  it('is truly zero at no power', () => {
    expect(pulseEnergy(0, 20)).toBe(0);
  });

  it('refuses a frequency of zero, which is no pulsed mode', () => {
    expect(() => pulseEnergy(20, 0)).toThrow('frequencyKhz must be a finite number above 0, but is 0');
    expect(() => pulseEnergy(-1, 20)).toThrow('powerW must be a finite number of at least 0, but is -1');
  });
});
