import { expectReference } from '../../test/expect-reference';
import { dutyCycle } from './duty-cycle';

describe('dutyCycle', () => {
  expectReference('pulse energy, peak power, fluence', 'duty', ({ tau_ns, f_kHz }) => dutyCycle(tau_ns, f_kHz));

  it('is 1 when the pulses follow without a gap', () => {
    expect(dutyCycle(500, 2000)).toBeCloseTo(1, 12);
  });

  it('refuses a width of zero', () => {
    expect(() => dutyCycle(0, 20)).toThrow('pulseWidthNs must be a finite number above 0, but is 0');
  });
});
